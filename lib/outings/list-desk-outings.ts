import { z } from "zod";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { outingStates } from "./outing";
import { mayPlanOutings } from "./outing-policy";
import { listOutingsBetween } from "./outing-store";
import { outingView } from "./outing-view";

/** Every outing in every state, for the desk. */
export const listDeskOutings = defineQuery({
  input: z.object({}),
  load: (conn, _actor, _input, now) => ({ outings: listOutingsBetween(conn, "0000", "9999", outingStates, now) }),
  allow: (actor) => mayPlanOutings(actor),
  run: ({ found: { outings }, now }) => ok(outings.map((outing) => outingView(outing, now))),
});
