import { isSystem } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { attachCheckoutSchema } from "./payment-schema";
import { attachSession, findPayment } from "./payment-store";

/** Remembers the page that the payment service opened for a payment. */
export const attachCheckout = defineCommand({
  input: attachCheckoutSchema,
  load: (conn, _actor, input) => findPayment(conn, { id: input.paymentId }),
  allow: (actor) => isSystem(actor, "payments"),
  run: ({ conn, found: payment, input }) => {
    attachSession(conn, payment.id, input.sessionId, input.url);
    return ok({ url: input.url });
  },
});
