import { abandonPayment } from "@/lib/payments/payment-store";
import { personIdOf } from "@/lib/shared/actor";
import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { isLive } from "./registration";
import { mayChangeRegistration } from "./registration-policy";
import { withdrawSchema } from "./registration-schema";
import { findOwnRegistration } from "./registration-store";
import { giveUpSeat } from "./seat-store";
import { settleSeats } from "./settle-seats";

/** Gives the seat back; whoever has waited longest is offered it in the same breath. */
export const withdraw = defineCommand({
  input: withdrawSchema,
  load: (conn, actor, input, now) => findOwnRegistration(conn, personIdOf(actor) ?? "", input.registrationId, now),
  allow: (actor, registration) => mayChangeRegistration(actor, registration),
  run: ({ conn, now, found: registration }) => {
    const { outing } = registration;
    if (registration.state === "withdrawn") return ok({ registrationId: registration.id });
    if (!isLive(registration.state)) return conflict("not-live", "This registration has ended already.");
    if (outing.endsAt <= now) return conflict("over", "This outing is over. Call us if something has to be put right.");
    giveUpSeat(conn, now, registration.id);
    if (registration.payment?.state === "pending") abandonPayment(conn, registration.payment.id);
    settleSeats(conn, now, outing);
    return ok({ registrationId: registration.id });
  },
});
