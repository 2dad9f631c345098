import type Stripe from "stripe";
import type { RefundRecord } from "./records";

export function makeRefund(refund: RefundRecord) {
  return {
    id: refund.id,
    object: "refund",
    amount: refund.amount,
    balance_transaction: null,
    charge: refund.chargeId,
    created: refund.created,
    currency: refund.currency,
    customer: null,
    customer_account: null,
    metadata: refund.metadata,
    payment_intent: refund.paymentIntentId,
    payment_method: null,
    reason: refund.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: "succeeded",
    transfer_reversal: null,
  } satisfies Stripe.Refund;
}
