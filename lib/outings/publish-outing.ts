import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mayPlanOutings } from "./outing-policy";
import { slugSchema } from "./outing-schema";
import { findOuting, setOutingState } from "./outing-store";

/** Opens a draft, or one that was closed, for registration. */
export const publishOuting = defineCommand({
  input: slugSchema,
  load: (conn, _actor, { slug }, now) => findOuting(conn, { slug }, now),
  allow: (actor) => mayPlanOutings(actor),
  run: ({ conn, now, found: outing }) => {
    if (outing.state === "open") return ok({ title: outing.title });
    if (outing.state !== "draft" && outing.state !== "closed") {
      return conflict("not-open-again", `An outing that is ${outing.state} is not opened again. Plan a new one.`);
    }
    if (outing.startsAt <= now) {
      return conflict("in-the-past", "This outing's date has passed. Change the date first, then publish it.");
    }
    setOutingState(conn, now, outing.id, "open");
    return ok({ title: outing.title });
  },
});
