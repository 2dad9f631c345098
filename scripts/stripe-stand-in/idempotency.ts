import { createHash } from "node:crypto";
import { idempotencyMisuse, invalidRequest } from "./api-error";
import type { RememberedReply } from "./records";
import type { StandIn } from "./stand-in";

// From memory of Stripe's page on idempotent requests: a key has up to 255 characters and lives for 24 hours.
const LONGEST_KEY = 255;
const KEY_LIFE_SECONDS = 24 * 60 * 60;

/** The same text for the same call, whatever the order of its parameters. */
export function fingerprintOf(path: string, body: string): string {
  const fields = [...new URLSearchParams(body)].map((pair) => JSON.stringify(pair)).sort();
  return createHash("sha256").update(`${path}\n${fields.join("\n")}`).digest("hex");
}

/**
 * The reply this key was answered with before, if any.
 * @throws ApiError (400, idempotency_error) when the key was used for another call
 */
export function recallReply(standIn: StandIn, key: string, fingerprint: string): RememberedReply | null {
  if (key.length > LONGEST_KEY) throw invalidRequest("An idempotency key can have up to 255 characters.");
  const remembered = standIn.store.rememberedReplies.get(key);
  if (remembered === undefined) return null;
  if (remembered.created + KEY_LIFE_SECONDS <= standIn.clock.seconds()) return null;
  if (remembered.fingerprint !== fingerprint) throw idempotencyMisuse(key);
  return remembered;
}
