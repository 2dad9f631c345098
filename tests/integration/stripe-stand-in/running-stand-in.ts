import { createServer } from "node:http";
import Stripe from "stripe";
import { onTestFinished } from "vitest";
import { startStripeStandIn } from "../../../scripts/stripe-stand-in/start";
import type { StripeStandInOptions } from "../../../scripts/stripe-stand-in/start";

export const KEY = "sk_test_stand_in";
export const WEBHOOK_SECRET = "whsec_stand_in";

export type Received = { body: string; signature: string };

/** A real receiver on a free port: keeps what it is sent and answers each time the next of the given statuses. */
export async function startReceiver(statuses: number[] = []) {
  const received: Received[] = [];
  const server = createServer((request, response) => {
    const chunks: Buffer[] = [];
    request.on("data", (chunk: Buffer) => chunks.push(chunk));
    request.on("end", () => {
      const signature = String(request.headers["stripe-signature"]);
      received.push({ body: Buffer.concat(chunks).toString("utf8"), signature });
      response.writeHead(statuses.shift() ?? 200).end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  onTestFinished(() => {
    server.closeAllConnections();
    server.close();
  });
  const address = server.address();
  if (typeof address !== "object" || address === null) throw new Error("The receiver has no port.");
  return { url: `http://127.0.0.1:${address.port}/webhook`, received };
}

/** The stand-in on a free port, a receiver for its webhooks, and the official client pointed at it. */
export async function startWithReceiver(options: StripeStandInOptions & { receiverStatuses?: number[] } = {}) {
  const { receiverStatuses, ...standInOptions } = options;
  const receiver = await startReceiver(receiverStatuses);
  const standIn = await startStripeStandIn({
    webhookUrl: receiver.url,
    retryDelaysMs: [1, 1],
    ...standInOptions,
  });
  onTestFinished(() => standIn.close());
  const control = (path: string, fields: Record<string, string> = {}) =>
    fetch(`${standIn.url}/_stand-in/${path}`, { method: "POST", body: new URLSearchParams(fields) });
  return { standIn, receiver, stripe: client(standIn.port), control };
}

export function client(port: number, key = KEY, maxNetworkRetries = 0): Stripe {
  return new Stripe(key, { host: "127.0.0.1", port, protocol: "http", maxNetworkRetries, telemetry: false });
}

type SessionParams = Stripe.Checkout.SessionCreateParams;

export function lineItem(name: string, cents: number, quantity = 1): Stripe.Checkout.SessionCreateParams.LineItem {
  return { quantity, price_data: { currency: "usd", unit_amount: cents, product_data: { name } } };
}

export function sessionParams(changes: SessionParams = {}): SessionParams {
  return {
    mode: "payment",
    line_items: [lineItem("Heron Spit, evening listening", 2500)],
    success_url: "http://127.0.0.1:3000/family/paid?session={CHECKOUT_SESSION_ID}",
    cancel_url: "http://127.0.0.1:3000/family/unpaid",
    ...changes,
  };
}

/** Presses a button on the hosted page, as a browser without JavaScript does. */
export function press(pageUrl: string | null, answer: "pay" | "decline" | "back"): Promise<Response> {
  return fetch(pageUrl ?? "", { method: "POST", body: new URLSearchParams({ answer }), redirect: "manual" });
}

export async function paidIntentId(stripe: Stripe, changes: SessionParams = {}): Promise<string> {
  const open = await stripe.checkout.sessions.create(sessionParams(changes));
  await press(open.url, "pay");
  const paid = await stripe.checkout.sessions.retrieve(open.id);
  return String(paid.payment_intent);
}
