import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { outingView } from "./outing-view";
import { rangeSchema } from "./outing-schema";
import { listOutingsBetween } from "./outing-store";

/** The public outings that touch a range of time, earliest first: the list and the month grid both read this. */
export const listOutings = defineQuery({
  input: rangeSchema,
  load: (conn, _actor, { from, to }, now) => ({
    outings: listOutingsBetween(
      conn,
      new Date(from).toISOString(),
      new Date(to).toISOString(),
      ["open", "closed", "called off", "done"],
      now,
    ),
  }),
  allow: () => true,
  run: ({ found: { outings }, now }) => ok(outings.map((outing) => outingView(outing, now))),
});
