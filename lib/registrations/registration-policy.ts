import { hasRole, isStaff, type Actor } from "@/lib/shared/actor";
import { mayChangeProfile } from "@/lib/families/family-policy";
import type { Participant } from "@/lib/families/participant";

export function mayRegister(actor: Actor, participant: Participant): boolean {
  return mayChangeProfile(actor, participant);
}

type Facts = { participant: Participant };

export function mayChangeRegistration(actor: Actor, { participant }: Facts): boolean {
  return mayChangeProfile(actor, participant);
}

/** Leaders of the day and staff; access ends three days after the outing. */
export function maySeeRoster(actor: Actor, facts: { leaderIds: string[]; endsAt: string }, now: string): boolean {
  if (isStaff(actor)) return true;
  const lastMoment = new Date(Date.parse(facts.endsAt) + 3 * 86_400_000).toISOString();
  return hasRole(actor, "leader") && facts.leaderIds.includes(actor.personId) && now <= lastMoment;
}
