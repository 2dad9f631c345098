import { hasRole, type Actor } from "@/lib/shared/actor";
import type { Participant } from "./participant";

export function mayKeepFamily(actor: Actor): boolean {
  return hasRole(actor, "guardian");
}

export function mayChangeProfile(actor: Actor, participant: Participant): boolean {
  return hasRole(actor, "guardian") && participant.guardianIds.includes(actor.personId);
}
