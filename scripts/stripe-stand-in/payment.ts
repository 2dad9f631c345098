import { newId } from "./ids";
import { NO_REQUEST } from "./make-event";
import { makePaymentIntent } from "./make-payment-intent";
import { makeSession } from "./make-session";
import type { ChargeRecord, PaymentIntentRecord, SessionRecord } from "./records";
import { tell } from "./stand-in";
import type { StandIn } from "./stand-in";

/** Someone pressed Pay on an open session: it is complete and paid from here on. */
export function pay(standIn: StandIn, session: SessionRecord): void {
  const intent = intentOf(standIn, session);
  const charge = tryToCharge(standIn, session, intent, "succeeded");
  intent.status = "succeeded";
  intent.paymentMethodId = charge.paymentMethodId;
  session.status = "complete";
  const object = makeSession(session, standIn.publicUrl);
  tell(standIn, { type: "checkout.session.completed", data: { object } }, NO_REQUEST);
  standIn.store.save();
}

/** Someone pressed Decline: the payment fails and the session stays open for another try. */
export function decline(standIn: StandIn, session: SessionRecord): void {
  const intent = intentOf(standIn, session);
  tryToCharge(standIn, session, intent, "failed");
  const object = makePaymentIntent(intent);
  tell(standIn, { type: "payment_intent.payment_failed", data: { object } }, NO_REQUEST);
  standIn.store.save();
}

/** Whether the last try to pay this session failed. */
export function wasDeclined(standIn: StandIn, session: SessionRecord): boolean {
  const intent = standIn.store.paymentIntents.get(session.paymentIntentId ?? "");
  return intent?.status === "requires_payment_method" && intent.latestChargeId !== null;
}

function intentOf(standIn: StandIn, session: SessionRecord): PaymentIntentRecord {
  const present = standIn.store.paymentIntents.get(session.paymentIntentId ?? "");
  if (present !== undefined) return present;
  const intent: PaymentIntentRecord = {
    id: newId("pi"),
    created: standIn.clock.seconds(),
    amount: session.amountTotal,
    currency: session.currency,
    status: "requires_payment_method",
    canceledAt: null,
    description: session.paymentDescription,
    metadata: session.paymentIntentMetadata,
    paymentMethodId: null,
    latestChargeId: null,
  };
  standIn.store.paymentIntents.set(intent.id, intent);
  session.paymentIntentId = intent.id;
  return intent;
}

function tryToCharge(
  standIn: StandIn,
  session: SessionRecord,
  intent: PaymentIntentRecord,
  status: ChargeRecord["status"],
): ChargeRecord {
  const charge: ChargeRecord = {
    id: newId("ch"),
    created: standIn.clock.seconds(),
    paymentIntentId: intent.id,
    paymentMethodId: newId("pm"),
    amount: intent.amount,
    amountRefunded: 0,
    currency: intent.currency,
    status,
    email: session.customerEmail,
    description: intent.description,
    metadata: intent.metadata,
  };
  standIn.store.charges.set(charge.id, charge);
  intent.latestChargeId = charge.id;
  return charge;
}
