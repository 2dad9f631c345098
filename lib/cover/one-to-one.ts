import type { StandingAdult } from "./adult-standing";
import type { CoverAdult, CoverPerson } from "./cover";
import type { CoverPolicy } from "./cover-policy";

/** Needs an adult's arm all the time. Someone in a chair that is pushed is led by whoever pushes. */
export function needsGuideThroughout(person: CoverPerson): boolean {
  return person.guide === "throughout" && person.wheels !== "pushed";
}

export function needsChairPushed(person: CoverPerson): boolean {
  return person.wheels === "pushed";
}

/** Needs an adult to guide all the time or to push. */
export function needsHands(person: CoverPerson): boolean {
  return person.guide === "throughout" || needsChairPushed(person);
}

/** Needs an adult whom no second person can have as well: to support constantly, to guide, or to push. */
export function needsOwnAdult(person: CoverPerson): boolean {
  return person.supportLevel === "constant" || needsHands(person);
}

/** Whether this person's adult looks after nobody else. */
export function takesWholeAdult(person: CoverPerson, policy: CoverPolicy): boolean {
  return person.supportLevel === "constant" || (policy.handsOnTakesWholeAdult.applies && needsHands(person));
}

export function isGuardianOf(adult: CoverAdult, person: CoverPerson): boolean {
  return person.guardianStaysId === adult.id || adult.guardianOf.includes(person.id);
}

export function guidesOnSide(adult: CoverAdult, side: CoverPerson["guideSide"]): boolean {
  const { guideSides } = adult.capabilities;
  return side === "either" ? guideSides.length > 0 : guideSides.includes(side);
}

/**
 * Whether an adult has the skills for all that this person needs at once. Behind a chair there is no arm to hold,
 * so for a person in a pushed chair any guide will do (common practice, no published source).
 */
export function hasSkillsFor(adult: CoverAdult, person: CoverPerson): boolean {
  if (needsChairPushed(person) && !adult.capabilities.pushChair) return false;
  if (person.guide !== "throughout") return true;
  return guidesOnSide(adult, needsChairPushed(person) ? "either" : person.guideSide);
}

/** Whether an adult may look after this person at all: counts in full, or is their own guardian. */
export function mayLookAfter({ adult, standing }: StandingAdult, person: CoverPerson): boolean {
  if (standing.standing === "counts") return true;
  return standing.standing === "own-child-only" && isGuardianOf(adult, person);
}

export function canBeOwnAdultOf(candidate: StandingAdult, person: CoverPerson): boolean {
  return mayLookAfter(candidate, person) && hasSkillsFor(candidate.adult, person);
}
