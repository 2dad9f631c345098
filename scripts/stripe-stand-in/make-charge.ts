import type Stripe from "stripe";
import { DECLINE_MESSAGE } from "./make-payment-intent";
import type { ChargeRecord } from "./records";

export function makeCharge(charge: ChargeRecord) {
  const succeeded = charge.status === "succeeded";
  return {
    id: charge.id,
    object: "charge",
    amount: charge.amount,
    amount_captured: succeeded ? charge.amount : 0,
    amount_refunded: charge.amountRefunded,
    application: null,
    application_fee: null,
    application_fee_amount: null,
    balance_transaction: null,
    billing_details: { address: null, email: charge.email, name: null, phone: null, tax_id: null },
    calculated_statement_descriptor: null,
    captured: succeeded,
    created: charge.created,
    currency: charge.currency,
    customer: null,
    description: charge.description,
    disputed: false,
    failure_balance_transaction: null,
    failure_code: succeeded ? null : "card_declined",
    failure_message: succeeded ? null : DECLINE_MESSAGE,
    fraud_details: {},
    livemode: false,
    metadata: charge.metadata,
    on_behalf_of: null,
    outcome: outcomeOf(succeeded),
    paid: succeeded,
    payment_intent: charge.paymentIntentId,
    payment_method: charge.paymentMethodId,
    // No card is ever named here, so none is made up.
    payment_method_details: null,
    receipt_email: null,
    receipt_number: null,
    receipt_url: null,
    refunded: succeeded && charge.amountRefunded === charge.amount,
    review: null,
    shipping: null,
    source: null,
    source_transfer: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: charge.status,
    transfer_data: null,
    transfer_group: null,
  } satisfies Stripe.Charge;
}

function outcomeOf(succeeded: boolean) {
  return {
    advice_code: null,
    network_advice_code: null,
    network_decline_code: null,
    network_status: succeeded ? "approved_by_network" : "declined_by_network",
    reason: succeeded ? null : "generic_decline",
    seller_message: succeeded ? "Payment complete." : "The bank did not return any further details with this decline.",
    type: succeeded ? "authorized" : "issuer_declined",
  } satisfies Stripe.Charge.Outcome;
}
