import { randomBytes } from "node:crypto";

/** A new identifier in Stripe's manner: the kind in front, then 24 letters and digits. */
export function newId(prefix: string): string {
  return `${prefix}_${randomBytes(12).toString("hex")}`;
}
