import { z } from "zod";

/** A list as a form sends it: nothing, one value or several. */
export function listOf<Item extends z.ZodType>(item: Item) {
  return z.preprocess((raw) => (raw === undefined || raw === "" ? [] : Array.isArray(raw) ? raw : [raw]), z.array(item));
}

/** A box that is ticked ("yes") or not sent at all. */
export const ticked = z
  .union([z.literal("yes"), z.literal("on"), z.literal("")])
  .optional()
  .transform((value) => value === "yes" || value === "on");
