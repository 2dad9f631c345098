import { z } from "zod";
import { isSignedIn, personIdOf } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { findPerson } from "./person-store";

export const showMe = defineQuery({
  input: z.object({}),
  load: (conn, actor) => findPerson(conn, personIdOf(actor) ?? ""),
  allow: (actor, person) => isSignedIn(actor) && actor.personId === person.id,
  run: ({ found: person }) => ok(person),
});
