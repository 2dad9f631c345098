import { invalidRequest, noSuch } from "./api-error";
import { newId } from "./ids";
import { NO_REQUEST } from "./make-event";
import type { Cause } from "./make-event";
import { makeSession } from "./make-session";
import type { CreateSessionParams } from "./params";
import type { LineItemRecord, SessionRecord } from "./records";
import { tell } from "./stand-in";
import type { StandIn } from "./stand-in";

// 30 minutes to 24 hours, 24 hours when not given: the pinned client's text on SessionCreateParams.expires_at.
const SHORTEST_LIFE_SECONDS = 30 * 60;
const LONGEST_LIFE_SECONDS = 24 * 60 * 60;
// "The minimum amount is $0.50 US … up to eight digits": the pinned client's text on PaymentIntent.amount.
const LEAST_AMOUNT_CENTS = 50;
const GREATEST_AMOUNT_CENTS = 99_999_999;

/** @throws ApiError (400) when the amount, the currencies or the lifetime are outside Stripe's rules */
export function createSession(standIn: StandIn, params: CreateSessionParams): SessionRecord {
  const now = standIn.clock.seconds();
  const lineItems = params.line_items.map(toLineItem);
  const session: SessionRecord = {
    id: newId("cs_test"),
    created: now,
    expiresAt: expiryOf(params, now),
    status: "open",
    currency: currencyOf(params),
    amountTotal: amountOf(lineItems),
    lineItems,
    successUrl: params.success_url,
    cancelUrl: params.cancel_url ?? null,
    clientReferenceId: params.client_reference_id ?? null,
    customerEmail: params.customer_email ?? null,
    metadata: params.metadata ?? {},
    paymentIntentMetadata: params.payment_intent_data?.metadata ?? {},
    paymentDescription: params.payment_intent_data?.description ?? null,
    // Stripe makes the payment intent when someone first tries to pay, not before.
    paymentIntentId: null,
  };
  standIn.store.sessions.set(session.id, session);
  return session;
}

/** @throws ApiError: 404 for an unknown session, 400 for one that is not open */
export function expireOpenSession(standIn: StandIn, id: string, cause: Cause): SessionRecord {
  const session = getSession(standIn, id);
  if (session.status !== "open") {
    throw invalidRequest(
      'Only Checkout Sessions with a status in ["open"] can be expired. ' +
        `This Checkout Session has a status of \`${session.status}\`.`,
    );
  }
  expire(standIn, session, cause);
  return session;
}

/** Expires every session whose time is over. Runs before each request and now and then by itself. */
export function expireSessionsThatAreDue(standIn: StandIn): void {
  const now = standIn.clock.seconds();
  const due = [...standIn.store.sessions.values()].filter(
    (session) => session.status === "open" && session.expiresAt <= now,
  );
  if (due.length === 0) return;
  for (const session of due) expire(standIn, session, NO_REQUEST);
  standIn.store.save();
}

/** @throws ApiError (404) */
export function getSession(standIn: StandIn, id: string): SessionRecord {
  const session = standIn.store.sessions.get(id);
  if (session === undefined) throw noSuch("checkout.session", id, "session");
  return session;
}

function expire(standIn: StandIn, session: SessionRecord, cause: Cause): void {
  session.status = "expired";
  const intent = standIn.store.paymentIntents.get(session.paymentIntentId ?? "");
  if (intent !== undefined) {
    intent.status = "canceled";
    intent.canceledAt = standIn.clock.seconds();
  }
  const object = makeSession(session, standIn.publicUrl);
  tell(standIn, { type: "checkout.session.expired", data: { object } }, cause);
}

function toLineItem({ quantity, price_data: price }: CreateSessionParams["line_items"][number]): LineItemRecord {
  return {
    id: newId("li"),
    priceId: newId("price"),
    productId: newId("prod"),
    name: price.product_data.name,
    description: price.product_data.description ?? null,
    unitAmount: price.unit_amount,
    quantity,
  };
}

function expiryOf(params: CreateSessionParams, now: number): number {
  const expiresAt = params.expires_at ?? now + LONGEST_LIFE_SECONDS;
  if (expiresAt < now + SHORTEST_LIFE_SECONDS) {
    throw invalidRequest(
      "The `expires_at` timestamp must be at least 30 minutes from Checkout Session creation.",
      { param: "expires_at" },
    );
  }
  if (expiresAt > now + LONGEST_LIFE_SECONDS) {
    throw invalidRequest(
      "The `expires_at` timestamp must be less than 24 hours from Checkout Session creation.",
      { param: "expires_at" },
    );
  }
  return expiresAt;
}

function currencyOf(params: CreateSessionParams): string {
  const currencies = new Set(params.line_items.map((item) => item.price_data.currency));
  const [currency, another] = currencies;
  if (currency === undefined || another !== undefined) {
    throw invalidRequest("All line items of one Checkout Session must have the same currency.", {
      param: "line_items",
    });
  }
  return currency;
}

function amountOf(lineItems: readonly LineItemRecord[]): number {
  const amount = lineItems.reduce((sum, item) => sum + item.unitAmount * item.quantity, 0);
  if (amount < LEAST_AMOUNT_CENTS) {
    throw invalidRequest("The Checkout Session's total amount due must add up to at least $0.50 usd", {
      code: "amount_too_small",
    });
  }
  if (amount > GREATEST_AMOUNT_CENTS) {
    throw invalidRequest("The Checkout Session's total amount due must be no more than $999,999.99", {
      code: "amount_too_large",
    });
  }
  return amount;
}
