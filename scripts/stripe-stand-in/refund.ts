import { invalidRequest, noSuch } from "./api-error";
import { newId } from "./ids";
import { makeCharge } from "./make-charge";
import type { Cause } from "./make-event";
import { money } from "./money";
import type { CreateRefundParams } from "./params";
import type { ChargeRecord, RefundRecord } from "./records";
import { tell } from "./stand-in";
import type { StandIn } from "./stand-in";

/**
 * Gives back part of a payment, or all that is left of it when no amount is named.
 * @throws ApiError: 404 for an unknown payment, 400 when there is nothing to refund or less than asked
 */
export function createRefund(standIn: StandIn, params: CreateRefundParams, cause: Cause): RefundRecord {
  const charge = chargeToRefund(standIn, params);
  const amount = amountToRefund(charge, params.amount);
  const refund: RefundRecord = {
    id: newId("re"),
    created: standIn.clock.seconds(),
    chargeId: charge.id,
    paymentIntentId: charge.paymentIntentId,
    amount,
    currency: charge.currency,
    reason: params.reason ?? null,
    metadata: params.metadata ?? {},
  };
  standIn.store.refunds.set(refund.id, refund);
  const before = makeCharge(charge);
  charge.amountRefunded += amount;
  const object = makeCharge(charge);
  const previous = { amount_refunded: before.amount_refunded, refunded: before.refunded };
  tell(standIn, { type: "charge.refunded", data: { object, previous_attributes: previous } }, cause);
  return refund;
}

function chargeToRefund(standIn: StandIn, params: CreateRefundParams): ChargeRecord {
  const { payment_intent: intentId, charge: chargeId } = params;
  const charge = intentId === undefined ? chargeById(standIn, chargeId ?? "") : chargeOfIntent(standIn, intentId);
  if (intentId !== undefined && chargeId !== undefined && charge.id !== chargeId) {
    throw invalidRequest("The charge does not belong to the payment intent.", { param: "charge" });
  }
  if (charge.status !== "succeeded") throw nothingToRefund(charge.paymentIntentId);
  return charge;
}

function chargeById(standIn: StandIn, id: string): ChargeRecord {
  const charge = standIn.store.charges.get(id);
  if (charge === undefined) throw noSuch("charge", id, "charge");
  return charge;
}

function chargeOfIntent(standIn: StandIn, id: string): ChargeRecord {
  const intent = standIn.store.paymentIntents.get(id);
  if (intent === undefined) throw noSuch("payment_intent", id, "payment_intent");
  if (intent.latestChargeId === null) throw nothingToRefund(id);
  return chargeById(standIn, intent.latestChargeId);
}

function nothingToRefund(intentId: string) {
  return invalidRequest(`This PaymentIntent (${intentId}) does not have a successful charge to refund.`, {
    param: "payment_intent",
  });
}

function amountToRefund(charge: ChargeRecord, asked: number | undefined): number {
  const left = charge.amount - charge.amountRefunded;
  if (left === 0) {
    throw invalidRequest(`Charge ${charge.id} has already been refunded.`, { code: "charge_already_refunded" });
  }
  if (asked !== undefined && asked > left) {
    const [wanted, rest] = [money(asked, charge.currency), money(left, charge.currency)];
    throw invalidRequest(`Refund amount (${wanted}) is greater than unrefunded amount on charge (${rest})`, {
      param: "amount",
    });
  }
  return asked ?? left;
}
