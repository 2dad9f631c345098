import { createHmac } from "node:crypto";

/**
 * The value of `Stripe-Signature`: the second of signing, and the HMAC SHA-256 (hex) of "second.body" under the
 * endpoint's secret. The pinned client's `webhooks.constructEvent` is what it has to satisfy.
 */
export function signWebhook(body: string, secret: string, atSeconds: number): string {
  const signature = createHmac("sha256", secret).update(`${atSeconds}.${body}`, "utf8").digest("hex");
  return `t=${atSeconds},v1=${signature}`;
}
