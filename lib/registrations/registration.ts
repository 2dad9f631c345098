import { minutesLater } from "@/lib/shared/dates";

export type RegistrationState = "held" | "waiting" | "confirmed" | "withdrawn" | "turned away";

/** A seat is held this long while the form is finished; starting to pay holds it for at least this long again. */
export const holdMinutes = 45;
/** A payment page may stay open at most this long: Stripe's shortest is 30 minutes. */
export const checkoutMinutes = 31;
/** Who comes up from the waiting list has two days to take the seat, or until the outing begins. */
export const offerMinutes = 48 * 60;

/** When a hold that begins now ends: never after the outing begins. */
export function holdEnd(now: string, startsAt: string): string {
  const end = minutesLater(now, holdMinutes);
  return end < startsAt ? end : startsAt;
}

export const guardianPlans = ["drops off", "stays", "helps"] as const;
export type GuardianPlan = (typeof guardianPlans)[number];

export type Step = "needs" | "waiver" | "fee";

/** What is left before a held seat is confirmed, in the order a family does it. */
export function stepsLeft(registration: { hasNeeds: boolean; signed: boolean; feeSettled: boolean }): Step[] {
  const left: Step[] = [];
  if (!registration.hasNeeds) left.push("needs");
  if (!registration.signed) left.push("waiver");
  if (!registration.feeSettled) left.push("fee");
  return left;
}

export function isLive(state: RegistrationState): boolean {
  return state === "held" || state === "waiting" || state === "confirmed";
}
