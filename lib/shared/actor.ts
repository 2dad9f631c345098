/** Who is asking. Authorization reads only this and the facts it is given. */

export const roles = ["guardian", "chaperone", "leader", "coordinator", "admin"] as const;
export type Role = (typeof roles)[number];

export type SignedIn = { kind: "person"; personId: string; name: string; email: string; roles: readonly Role[] };
/** The program itself, when a signed message from the payment service or the clock asks. */
export type System = { kind: "system"; what: "payments" | "clock" };
export type Actor = { kind: "visitor" } | SignedIn | System;

export const visitor: Actor = { kind: "visitor" };

export const payments: System = { kind: "system", what: "payments" };
export const theClock: System = { kind: "system", what: "clock" };

export function isSystem(actor: Actor, what: System["what"]): boolean {
  return actor.kind === "system" && actor.what === what;
}

export function isSignedIn(actor: Actor): actor is SignedIn {
  return actor.kind === "person";
}

export function hasRole(actor: Actor, ...wanted: Role[]): actor is SignedIn {
  return actor.kind === "person" && wanted.some((role) => actor.roles.includes(role));
}

/** Coordinators and admins: the people who work at the desk. */
export function isStaff(actor: Actor): boolean {
  return hasRole(actor, "coordinator", "admin");
}

export function personIdOf(actor: Actor): string | null {
  return actor.kind === "person" ? actor.personId : null;
}
