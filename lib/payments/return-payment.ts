import { z } from "zod";
import { isStaff } from "@/lib/shared/actor";
import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { findPayment, listMoneyToReturn, notePaymentReturned } from "./payment-store";

/** Staff note that they gave money back at the payment service; it then buys no seat any more. */
export const returnPayment = defineCommand({
  input: z.object({ paymentId: z.string().min(1).max(60) }),
  load: (conn, _actor, input) => findPayment(conn, { id: input.paymentId }),
  allow: (actor) => isStaff(actor),
  run: ({ conn, found: payment }) => {
    if (!listMoneyToReturn(conn).some((one) => one.paymentId === payment.id)) {
      return conflict("nothing-to-return", "This payment is not one to be given back, or it has been noted already.");
    }
    notePaymentReturned(conn, payment.id);
    return ok({});
  },
});
