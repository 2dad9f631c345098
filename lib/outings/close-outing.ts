import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mayPlanOutings } from "./outing-policy";
import { slugSchema } from "./outing-schema";
import { findOuting, setOutingState } from "./outing-store";

/** Ends registration; who has a seat keeps it. */
export const closeOuting = defineCommand({
  input: slugSchema,
  load: (conn, _actor, { slug }, now) => findOuting(conn, { slug }, now),
  allow: (actor) => mayPlanOutings(actor),
  run: ({ conn, now, found: outing }) => {
    if (outing.state !== "open") return conflict("not-open", "Registration for this outing is not open.");
    setOutingState(conn, now, outing.id, "closed");
    return ok({ title: outing.title });
  },
});
