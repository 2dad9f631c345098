import { mayChangeRegistration } from "@/lib/registrations/registration-policy";
import { registrationIdSchema } from "@/lib/registrations/registration-schema";
import { findOwnRegistration } from "@/lib/registrations/registration-store";
import { personIdOf } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";

/** Which checkout a registration is waiting for, so that the payment service can be asked about it. */
export const showCheckout = defineQuery({
  input: registrationIdSchema,
  load: (conn, actor, input, now) => findOwnRegistration(conn, personIdOf(actor) ?? "", input.registrationId, now),
  allow: (actor, registration) => mayChangeRegistration(actor, registration),
  run: ({ found: { payment } }) =>
    ok({ sessionId: payment?.state === "pending" ? payment.checkoutSessionId : null, settled: payment?.state === "settled" }),
});
