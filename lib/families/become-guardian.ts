import { z } from "zod";
import { giveRole } from "@/lib/people/person-store";
import { isSignedIn } from "@/lib/shared/actor";
import { forbidden, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { findHouseholdOf, insertHousehold } from "./household-store";

/** Somebody with an account, a chaperone say, who wants to register children of their own. */
export const becomeGuardian = defineCommand({
  input: z.object({}),
  load: () => ({}),
  allow: (actor) => isSignedIn(actor),
  run: ({ conn, now, actor }) => {
    if (!isSignedIn(actor)) return forbidden();
    giveRole(conn, actor.personId, "guardian");
    if (findHouseholdOf(conn, actor.personId) === null) insertHousehold(conn, now, actor.personId);
    return ok({});
  },
});
