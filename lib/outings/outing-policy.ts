import { isStaff, type Actor } from "@/lib/shared/actor";
import { isPublic, type Outing } from "./outing";

export function maySeeOuting(actor: Actor, outing: Outing): boolean {
  return isPublic(outing) || isStaff(actor);
}

export function mayPlanOutings(actor: Actor): boolean {
  return isStaff(actor);
}
