import { createHash, randomBytes } from "node:crypto";

/** An opaque id: 120 random bits in URL-safe text. Nothing can be read from it or guessed. */
export function newId(): string {
  return randomBytes(15).toString("base64url");
}

/** A secret for a link in a mail: 256 random bits. Only its hash is stored. */
export function newSecret(): string {
  return randomBytes(32).toString("base64url");
}

/** SHA-256 as lower-case hex, of text (as UTF-8) or of bytes. */
export function sha256(content: string | Uint8Array): string {
  return createHash("sha256").update(content).digest("hex");
}
