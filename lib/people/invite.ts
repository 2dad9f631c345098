import { insertHelperRecord } from "@/lib/helpers/helper-store";
import { isSignedIn } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mailInvitation } from "./mail-links";
import { mayInvite } from "./person-policy";
import { inviteSchema } from "./person-schema";
import { findPersonByEmail, giveRole, insertPerson } from "./person-store";

/** Invites staff, leaders and chaperones. Somebody who has an account already gets the role and keeps the account. */
export const invite = defineCommand({
  input: inviteSchema,
  load: (conn, _actor, input) => ({ known: findPersonByEmail(conn, input.email) }),
  allow: (actor, _found, input) => mayInvite(actor, input.role),
  run: ({ conn, now, actor, found: { known }, input }) => {
    const person = known ?? { id: insertPerson(conn, now, input), name: input.name, email: input.email };
    giveRole(conn, person.id, input.role);
    if (input.role === "chaperone" || input.role === "leader") insertHelperRecord(conn, now, person.id);
    const from = isSignedIn(actor) ? actor.name : "";
    mailInvitation(conn, now, { person, role: input.role, from });
    return ok({ name: person.name, email: person.email, role: input.role });
  },
});
