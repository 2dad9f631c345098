import { z } from "zod";
import { hasRole, roles } from "@/lib/shared/actor";
import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { endSessionsOf, findPerson, listPeopleWithRoles, takeRole as removeRole } from "./person-store";

/** Takes a role from somebody and signs them out everywhere, so that nothing stays open in a tab. */
export const takeRole = defineCommand({
  input: z.object({ personId: z.string().min(1, "Choose a person.").max(60), role: z.enum(roles, "Choose a role.") }),
  load: (conn, _actor, input) => findPerson(conn, input.personId),
  allow: (actor) => hasRole(actor, "admin"),
  run: ({ conn, found: person, input: { role } }) => {
    if (!person.roles.includes(role)) return conflict("no-such-role", `${person.name} is no ${role}.`);
    const admins = listPeopleWithRoles(conn).filter((one) => one.roles.includes("admin"));
    if (role === "admin" && admins.length === 1) {
      return conflict("last-admin", `${person.name} is the last admin. Make somebody else an admin first.`);
    }
    removeRole(conn, person.id, role);
    endSessionsOf(conn, person.id);
    return ok({ name: person.name, role });
  },
});
