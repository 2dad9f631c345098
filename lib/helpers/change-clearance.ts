import { findPerson } from "@/lib/people/person-store";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { maySetClearance } from "./helper-policy";
import { clearanceSchema } from "./helper-schema";
import { setClearance } from "./helper-store";

/** Staff note the last day of somebody's clearance; nothing of what was found is kept here. */
export const changeClearance = defineCommand({
  input: clearanceSchema,
  load: (conn, _actor, input) => findPerson(conn, input.personId),
  allow: (actor) => maySetClearance(actor),
  run: ({ conn, now, found: person, input }) => {
    setClearance(conn, now, person.id, input.clearedUntil);
    return ok({ name: person.name, clearedUntil: input.clearedUntil });
  },
});
