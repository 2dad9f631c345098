import type Stripe from "stripe";

/** What happened, with the object as it was at that moment. */
export type Happening =
  | Pick<Stripe.CheckoutSessionCompletedEvent, "type" | "data">
  | Pick<Stripe.CheckoutSessionExpiredEvent, "type" | "data">
  | Pick<Stripe.PaymentIntentPaymentFailedEvent, "type" | "data">
  | Pick<Stripe.ChargeRefundedEvent, "type" | "data">;

// The version the pinned client asks for; an event says which version its object is written in.
const API_VERSION = "2026-10-28.endive" satisfies typeof Stripe.API_VERSION;

export type Cause = { requestId: string | null; idempotencyKey: string | null };

export const NO_REQUEST: Cause = { requestId: null, idempotencyKey: null };

export function makeEvent(id: string, createdSeconds: number, happening: Happening, cause: Cause): Stripe.Event {
  return {
    id,
    object: "event",
    api_version: API_VERSION,
    created: createdSeconds,
    livemode: false,
    pending_webhooks: 1,
    request: { id: cause.requestId, idempotency_key: cause.idempotencyKey },
    ...happening,
  };
}
