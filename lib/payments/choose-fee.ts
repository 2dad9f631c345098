import { checkoutMinutes } from "@/lib/registrations/registration";
import { mayChangeRegistration } from "@/lib/registrations/registration-policy";
import { findOwnRegistration, type Registration } from "@/lib/registrations/registration-store";
import { extendHold } from "@/lib/registrations/seat-store";
import { broughtUpToNow, confirmIfComplete } from "@/lib/registrations/settle-seats";
import type { Connection } from "@/db/connection";
import { personIdOf } from "@/lib/shared/actor";
import { minutesLater } from "@/lib/shared/dates";
import { centsFromTyped } from "@/lib/shared/money";
import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { chooseFeeSchema } from "./payment-schema";
import { abandonPayment, insertPayment } from "./payment-store";

/** What the door does next: nothing, go to a payment page that is open already, or open one for this payment. */
export type FeeAnswer =
  | { kind: "settled"; registrationId: string }
  | { kind: "open page"; registrationId: string; url: string }
  | { kind: "new page"; registrationId: string; payment: CheckoutWanted; replacesSession: string | null };

export type CheckoutWanted = {
  id: string;
  registrationId: string;
  amountCents: number;
  currency: string;
  title: string;
  expiresAt: string;
};

/** The suggested fee, another amount, or a no-fee place. Choosing again replaces a payment that was not made. */
export const chooseFee = defineCommand({
  input: chooseFeeSchema,
  load: (conn, actor, input, now) => findOwnRegistration(conn, personIdOf(actor) ?? "", input.registrationId, now),
  allow: (actor, registration) => mayChangeRegistration(actor, registration),
  run: ({ conn, now, found, input }) => {
    const registration = broughtUpToNow(conn, now, found);
    if (registration.feeSettled) return ok<FeeAnswer>({ kind: "settled", registrationId: registration.id });
    if (registration.state !== "held") {
      return conflict("not-held", "No seat is held for this registration now. Go back to the outing's page to register again.");
    }
    const { suggestedFeeCents, currency, title, state } = registration.outing;
    if (state === "called off") return conflict("called-off", "This outing is called off, so there is nothing to pay.");
    const amountCents =
      input.choice === "no fee" ? 0 : input.choice === "suggested" ? suggestedFeeCents : (centsFromTyped(input.otherAmount) ?? 0);
    const pending = registration.payment;
    const stillOpen = pending !== null && minutesLater(pending.createdAt, checkoutMinutes - 5) > now;
    if (pending?.checkoutUrl && stillOpen && pending.amountCents === amountCents) {
      return ok<FeeAnswer>({ kind: "open page", registrationId: registration.id, url: pending.checkoutUrl });
    }
    if (pending) abandonPayment(conn, pending.id);
    const id = insertPayment(conn, now, { registrationId: registration.id, amountCents, currency });
    if (amountCents === 0) {
      confirmIfComplete(conn, now, registration.id);
      return ok<FeeAnswer>({ kind: "settled", registrationId: registration.id });
    }
    const expiresAt = holdWhilePaying(conn, now, registration);
    return ok<FeeAnswer>({
      kind: "new page",
      registrationId: registration.id,
      payment: { id, registrationId: registration.id, amountCents, currency, title, expiresAt },
      replacesSession: pending?.checkoutSessionId ?? null,
    });
  },
});

/** The payment page closes before the seat is given up, so that nobody pays for a seat they have lost. */
function holdWhilePaying(conn: Connection, now: string, registration: Registration): string {
  const expiresAt = minutesLater(now, checkoutMinutes);
  extendHold(conn, now, registration.id, minutesLater(expiresAt, 5), registration.outing.startsAt);
  return expiresAt;
}
