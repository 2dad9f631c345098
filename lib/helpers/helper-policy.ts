import { hasRole, isStaff, type Actor } from "@/lib/shared/actor";
import type { HelperAnswer } from "./helper";

export function mayAskHelpers(actor: Actor): boolean {
  return isStaff(actor);
}

export function mayHelp(actor: Actor): boolean {
  return hasRole(actor, "chaperone", "leader");
}

export function mayAnswer(actor: Actor, asked: HelperAnswer): boolean {
  return actor.kind === "person" && actor.personId === asked.personId;
}

/** People say themselves what they can do; only staff say until when somebody is cleared. */
export function maySetClearance(actor: Actor): boolean {
  return isStaff(actor);
}
