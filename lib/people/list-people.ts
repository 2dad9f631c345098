import { z } from "zod";
import { listHelperRecords } from "@/lib/helpers/helper-store";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { listPeopleWithRoles } from "./person-store";
import { maySeePeople } from "./person-policy";

/** Everybody with an account, for the desk, with what an adult who helps can do and until when they are cleared. */
export const listPeople = defineQuery({
  input: z.object({}),
  load: (conn) => ({ people: listPeopleWithRoles(conn), records: listHelperRecords(conn) }),
  allow: (actor) => maySeePeople(actor),
  run: ({ found: { people, records } }) =>
    ok(
      people.map((person) => ({
        id: person.id,
        name: person.name,
        email: person.email,
        roles: person.roles,
        emailConfirmed: person.emailConfirmed,
        helper: records.find((record) => record.personId === person.id) ?? null,
      })),
    ),
});
