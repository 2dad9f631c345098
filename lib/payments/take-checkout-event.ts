import { findOuting } from "@/lib/outings/outing-store";
import { findRegistration } from "@/lib/registrations/registration-store";
import { holdEnd } from "@/lib/registrations/registration";
import { holdSeat, joinQueue } from "@/lib/registrations/seat-store";
import { confirmIfComplete, settleSeats } from "@/lib/registrations/settle-seats";
import type { Connection } from "@/db/connection";
import { isSystem } from "@/lib/shared/actor";
import { log } from "@/lib/shared/log";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { checkoutPaidSchema } from "./payment-schema";
import { findPayment, hasSettledPayment, noteEvent, noteExtraPayment, settlePayment } from "./payment-store";

export type EventAnswer = "settled" | "seen before" | "not ours" | "other amount" | "paid twice" | "withdrawn";

/** A checkout was paid: settles the payment once, however often and whenever this is told. */
export const takeCheckoutEvent = defineCommand({
  input: checkoutPaidSchema,
  load: (conn, _actor, input) => ({ payment: findPayment(conn, { checkout_session_id: input.sessionId }) }),
  allow: (actor) => isSystem(actor, "payments"),
  run: ({ conn, now, input, found: { payment } }) => {
    if (!noteEvent(conn, now, { id: input.eventId, type: input.eventType })) return ok<EventAnswer>("seen before");
    if (!payment) return ok<EventAnswer>("not ours");
    if (payment.state === "settled" || payment.state === "returned") return ok<EventAnswer>("seen before");
    if (payment.amount_cents !== input.amountCents || payment.currency !== input.currency) {
      log.error({ paymentId: payment.id, told: input.amountCents, asked: payment.amount_cents }, "a payment came with another amount");
      noteExtraPayment(conn, now, payment.id, input.paymentIntentId);
      return ok<EventAnswer>("other amount");
    }
    if (hasSettledPayment(conn, payment.registration_id)) {
      noteExtraPayment(conn, now, payment.id, input.paymentIntentId);
      return ok<EventAnswer>("paid twice");
    }
    if (payment.state === "abandoned" && findRegistration(conn, payment.registration_id, now)?.state === "withdrawn") {
      // The family gave the seat back before the message came: the money is returned, the child not brought back.
      noteExtraPayment(conn, now, payment.id, input.paymentIntentId);
      return ok<EventAnswer>("withdrawn");
    }
    settlePayment(conn, now, payment.id, input.paymentIntentId);
    seatForPayment(conn, now, payment.registration_id);
    return ok<EventAnswer>("settled");
  },
});

/** Money that comes after the hold ran out still buys a seat if one is free, or the next one that is. */
function seatForPayment(conn: Connection, now: string, registrationId: string): void {
  if (confirmIfComplete(conn, now, registrationId)) return;
  const registration = findRegistration(conn, registrationId, now);
  if (registration?.state !== "withdrawn") return;
  const outing = findOuting(conn, { id: registration.outing.id }, now);
  if (!outing || outing.state === "called off" || outing.endsAt <= now) return;
  settleSeats(conn, now, outing);
  if (holdSeat(conn, now, outing.id, registrationId, holdEnd(now, outing.startsAt))) {
    confirmIfComplete(conn, now, registrationId);
    return;
  }
  joinQueue(conn, now, registrationId);
}
