import { isSignedIn, personIdOf } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { readingSchema } from "./person-schema";
import { findPerson, setReading } from "./person-store";

/** Everybody says once how they read; papers come that way by default. */
export const changeReading = defineCommand({
  input: readingSchema,
  load: (conn, actor) => findPerson(conn, personIdOf(actor) ?? ""),
  allow: (actor, person) => isSignedIn(actor) && actor.personId === person.id,
  run: ({ conn, found: person, input }) => {
    setReading(conn, person.id, input.readingFormat, input.textSizePt);
    return ok({ readingFormat: input.readingFormat });
  },
});
