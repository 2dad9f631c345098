import Stripe from "stripe";
import { publicAddress } from "@/lib/shared/addresses";
import { env, type Env } from "@/lib/shared/env";
import { log } from "@/lib/shared/log";
import type { CheckoutWanted } from "./choose-fee";

/** The payment service. Its shapes end here: what leaves this file is ours. */
export type CheckoutPaid = {
  eventId: string;
  eventType: string;
  sessionId: string;
  paymentIntentId: string | null;
  amountCents: number;
  currency: string;
};

export type Gateway = ReturnType<typeof createGateway>;

export function createGateway(settings: Pick<Env, "STRIPE_SECRET_KEY" | "STRIPE_WEBHOOK_SECRET" | "STRIPE_API_URL">) {
  const stripe = new Stripe(settings.STRIPE_SECRET_KEY, { ...addressOf(settings.STRIPE_API_URL), maxNetworkRetries: 1, timeout: 10_000, telemetry: false });
  return {
    openCheckout: (wanted: CheckoutWanted) => openCheckout(stripe, wanted),
    closeCheckout: (sessionId: string) => closeCheckout(stripe, sessionId),
    lookUp: (sessionId: string) => lookUp(stripe, sessionId),
    readEvent: (body: string, signature: string) => readEvent(stripe, settings.STRIPE_WEBHOOK_SECRET, body, signature),
  };
}

let current: Gateway | undefined;

export function gateway(): Gateway {
  current ??= createGateway(env());
  return current;
}

function addressOf(apiUrl: string | undefined): { host?: string; port?: string; protocol?: "http" | "https" } {
  if (apiUrl === undefined) return {};
  const url = new URL(apiUrl);
  return { host: url.hostname, port: url.port, protocol: url.protocol === "http:" ? "http" : "https" };
}

/** Opens a hosted page for a payment; null when the service cannot be reached or does not answer as it should. */
async function openCheckout(stripe: Stripe, wanted: CheckoutWanted): Promise<{ sessionId: string; url: string } | null> {
  const back = publicAddress(`/family/registrations/${wanted.registrationId}`);
  try {
    const session = await stripe.checkout.sessions.create(
      {
        mode: "payment",
        client_reference_id: wanted.registrationId,
        line_items: [
          { quantity: 1, price_data: { currency: wanted.currency, unit_amount: wanted.amountCents, product_data: { name: wanted.title } } },
        ],
        success_url: `${back}/fee/thank-you`,
        cancel_url: `${back}/fee`,
        expires_at: Math.floor(Date.parse(wanted.expiresAt) / 1000),
        metadata: { payment: wanted.id },
        payment_intent_data: { metadata: { payment: wanted.id } },
      },
      { idempotencyKey: `checkout-${wanted.id}` },
    );
    return session.url ? { sessionId: session.id, url: session.url } : null;
  } catch (error) {
    return unreachable(error, "could not open a checkout");
  }
}

/** Closes a page that was replaced by another amount. If that fails, a second payment is noticed and given back. */
async function closeCheckout(stripe: Stripe, sessionId: string): Promise<void> {
  try {
    await stripe.checkout.sessions.expire(sessionId);
  } catch (error) {
    unreachable(error, "could not close a checkout");
  }
}

/** Asks the service itself whether a checkout was paid, for when its message is late. */
async function lookUp(stripe: Stripe, sessionId: string): Promise<CheckoutPaid | "not paid" | null> {
  try {
    const session = await stripe.checkout.sessions.retrieve(sessionId, { expand: ["payment_intent"] });
    if (session.payment_status !== "paid") return "not paid";
    return paidFrom(session, { id: `looked-up-${session.id}`, type: "looked up" });
  } catch (error) {
    return unreachable(error, "could not look up a checkout");
  }
}

/** Reads a webhook. "bad signature" is what anybody can send; null is an event that asks nothing of us. */
function readEvent(stripe: Stripe, secret: string, body: string, signature: string): CheckoutPaid | "bad signature" | null {
  let event: Stripe.Event;
  try {
    event = stripe.webhooks.constructEvent(body, signature, secret);
  } catch (error) {
    unreachable(error, "refused a webhook");
    return "bad signature";
  }
  if (event.type !== "checkout.session.completed" && event.type !== "checkout.session.async_payment_succeeded") return null;
  const session = event.data.object;
  return session.payment_status === "paid" ? paidFrom(session, event) : null;
}

function paidFrom(session: Stripe.Checkout.Session, event: { id: string; type: string }): CheckoutPaid {
  const intent = session.payment_intent;
  return {
    eventId: event.id,
    eventType: event.type,
    sessionId: session.id,
    paymentIntentId: typeof intent === "string" ? intent : (intent?.id ?? null),
    amountCents: session.amount_total ?? 0,
    currency: session.currency ?? "",
  };
}

function unreachable(error: unknown, what: string): null {
  log.warn({ problem: error instanceof Error ? error.message : String(error) }, what);
  return null;
}
