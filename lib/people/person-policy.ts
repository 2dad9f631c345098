import { hasRole, isStaff, type Actor, type Role } from "@/lib/shared/actor";

/** Only an admin makes another admin or coordinator; coordinators invite the people of a day. */
export function mayInvite(actor: Actor, role: Role): boolean {
  return hasRole(actor, "admin") || (isStaff(actor) && (role === "chaperone" || role === "leader"));
}

export function maySeePeople(actor: Actor): boolean {
  return isStaff(actor);
}
