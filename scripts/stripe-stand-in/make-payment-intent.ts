import type Stripe from "stripe";
import type { PaymentIntentRecord } from "./records";

export const DECLINE_MESSAGE = "Your card was declined.";

export function makePaymentIntent(intent: PaymentIntentRecord) {
  const succeeded = intent.status === "succeeded";
  return {
    id: intent.id,
    object: "payment_intent",
    allowed_payment_method_types: null,
    amount: intent.amount,
    amount_capturable: 0,
    amount_details: { tip: {} },
    amount_received: succeeded ? intent.amount : 0,
    application: null,
    application_fee_amount: null,
    automatic_payment_methods: null,
    canceled_at: intent.canceledAt,
    cancellation_reason: intent.canceledAt === null ? null : "expired",
    capture_method: "automatic_async",
    client_secret: `${intent.id}_secret_stand_in`,
    confirmation_method: "automatic",
    created: intent.created,
    currency: intent.currency,
    customer: null,
    customer_account: null,
    description: intent.description,
    excluded_payment_method_types: null,
    last_payment_error: succeeded ? null : lastPaymentError(intent),
    latest_charge: intent.latestChargeId,
    livemode: false,
    managed_payments: null,
    metadata: intent.metadata,
    next_action: null,
    on_behalf_of: null,
    payment_method: succeeded ? intent.paymentMethodId : null,
    payment_method_configuration_details: null,
    payment_method_options: { card: cardOptions },
    payment_method_types: ["card"],
    payment_record: null,
    processing: null,
    receipt_email: null,
    review: null,
    setup_future_usage: null,
    shipping: null,
    source: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: intent.status,
    transfer_data: null,
    transfer_group: null,
  } satisfies Stripe.PaymentIntent;
}

const cardOptions = {
  installments: null,
  mandate_options: null,
  network: null,
  request_three_d_secure: "automatic",
} satisfies Stripe.PaymentIntent.PaymentMethodOptions.Card;

function lastPaymentError(intent: PaymentIntentRecord): Stripe.PaymentIntent.LastPaymentError | null {
  if (intent.latestChargeId === null) return null;
  return {
    type: "card_error",
    charge: intent.latestChargeId,
    code: "card_declined",
    decline_code: "generic_decline",
    message: DECLINE_MESSAGE,
  };
}
