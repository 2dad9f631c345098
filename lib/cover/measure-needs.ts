import type { StandingAdult } from "./adult-standing";
import type { CoverPerson, CoverQuestion, Shortage } from "./cover";
import type { AgeBand, CoverPolicy } from "./cover-policy";
import { ageBandFor, participantsPerAdultFor } from "./cover-policy";
import type { Fraction } from "./fraction";
import { ceilFraction, compareFractions, fraction, sumFractions } from "./fraction";
import type { Choices, Matching } from "./matching";
import { adultsToBeHad, freed, largestMatching, matchedCount, NONE, tooFewAdultsFor } from "./matching";
import {
  canBeOwnAdultOf,
  guidesOnSide,
  isGuardianOf,
  mayLookAfter,
  needsChairPushed,
  needsGuideThroughout,
  needsHands,
  needsOwnAdult,
  takesWholeAdult,
} from "./one-to-one";

/** Those who are there at one time. A day is one of these; a day in segments will be several. */
export type Muster = {
  people: readonly CoverPerson[];
  adults: readonly StandingAdult[];
  policy: CoverPolicy;
};

/**
 * How many of these people can each have an adult of their own. `choices` are positions among the adults of the
 * muster, `matching` is a largest one.
 */
export type OwnAdults = {
  people: readonly CoverPerson[];
  choices: Choices;
  matching: Matching;
  needed: number;
  have: number;
  short: number;
};

export type Needs = {
  muster: Muster;
  adultsWhoCount: number;
  /** Adults beyond the guardians who each have one person and nobody else. */
  wholeAdults: number;
  /** People looked after by those who count and are not used one to one. */
  sharedPeople: readonly CoverPerson[];
  byAge: { needed: number; short: number; bands: { band: AgeBand; people: number; adults: number }[] };
  bySupport: { needed: number; short: number; load: Fraction; sharedAdults: number };
  withoutBand: readonly CoverPerson[];
  guides: OwnAdults;
  chairs: OwnAdults;
  /** Guides and chairs at once. */
  hands: OwnAdults;
  /** Those in constant support as well. */
  together: OwnAdults;
  families: { needed: number; have: number; short: number };
  firstAiders: { needed: number; have: number; short: number };
  shortage: Shortage;
};

function choicesOf(people: readonly CoverPerson[], adults: readonly StandingAdult[]): Choices {
  return people.map((person) =>
    [...adults.keys()].filter((at) => {
      const candidate = adults[at];
      return candidate !== undefined && canBeOwnAdultOf(candidate, person);
    }),
  );
}

function isOnlyGuardian(candidate: StandingAdult | undefined): boolean {
  return candidate?.standing.standing === "own-child-only";
}

/**
 * A largest matching that also uses as many as it can of the guardians who count for nobody else. Matching those
 * first is enough: a path that adds a person never frees an adult.
 */
function guardiansFirst(choices: Choices, adults: readonly StandingAdult[]): Matching {
  const guardiansOnly = choices.map((options) => options.filter((at) => isOnlyGuardian(adults[at])));
  return largestMatching(choices, adults.length, largestMatching(guardiansOnly, adults.length));
}

function ownAdultsFrom(people: readonly CoverPerson[], choices: Choices, matching: Matching): OwnAdults {
  const have = matchedCount(matching);
  return { people, choices, matching, needed: people.length, have, short: people.length - have };
}

/** The same question about some of the people only. */
function amongThem(own: OwnAdults, isAsked: (person: CoverPerson) => boolean, start?: Matching): OwnAdults {
  const people = own.people.filter(isAsked);
  const choices = own.choices.filter((_, at) => defined(own.people, [at]).some(isAsked));
  return ownAdultsFrom(people, choices, largestMatching(choices, own.matching.personOf.length, start));
}

function defined<Item>(items: readonly Item[], positions: readonly number[]): Item[] {
  return positions.flatMap((at) => {
    const item = items[at];
    return item === undefined ? [] : [item];
  });
}

/** The people whose choices together are too few, and all of those choices; null when each can have an adult. */
export function tooFewAmong(own: OwnAdults, { adults }: Muster) {
  const tooFew = tooFewAdultsFor(own.choices, own.matching);
  return tooFew && { people: defined(own.people, tooFew.people), adults: defined(adults, tooFew.adults) };
}

/** The exact number of adults these people use up: the sum of 1/n over all of them. */
export function supportLoad(people: readonly CoverPerson[], policy: CoverPolicy): Fraction {
  const peopleByRatio = new Map<number, number>();
  for (const person of people) {
    const ratio = participantsPerAdultFor(policy, person);
    peopleByRatio.set(ratio, (peopleByRatio.get(ratio) ?? 0) + 1);
  }
  return sumFractions([...peopleByRatio].map(([ratio, count]) => fraction(count, ratio)));
}

/**
 * People, other than those with an adult of their own, whom a guardian who counts for nobody else looks after:
 * their own children, as long as together they need no more than that one adult.
 */
function withOwnGuardian(
  shared: readonly CoverPerson[],
  freeGuardians: readonly StandingAdult[],
  policy: CoverPolicy,
): Set<CoverPerson> {
  const taken = new Set<CoverPerson>();
  for (const { adult } of freeGuardians) {
    const theirs: CoverPerson[] = [];
    for (const person of shared) {
      if (taken.has(person) || !isGuardianOf(adult, person)) continue;
      if (compareFractions(supportLoad([...theirs, person], policy), fraction(1)) > 0) continue;
      theirs.push(person);
      taken.add(person);
    }
  }
  return taken;
}

function adultsByAge({ people, policy }: Muster): Needs["byAge"]["bands"] {
  const inBand = new Map<AgeBand, number>();
  for (const person of people) {
    const band = ageBandFor(policy, person.ageYears);
    if (band) inBand.set(band, (inBand.get(band) ?? 0) + 1);
  }
  return [...inBand]
    .map(([band, count]) => ({
      band,
      people: count,
      adults: Math.ceil(count / band.participantsPerAdult),
    }))
    .toSorted((a, b) => a.band.fromAge - b.band.fromAge);
}

function shortOf(needed: number, have: number): { needed: number; have: number; short: number } {
  return { needed, have, short: Math.max(0, needed - have) };
}

function familiesOf(counting: readonly StandingAdult[]): number {
  return new Set(counting.map(({ adult }) => adult.familyId ?? `alone:${adult.id}`)).size;
}

function firstAidersAmong(adults: readonly StandingAdult[]): number {
  return adults.filter(
    ({ adult, standing }) =>
      adult.capabilities.firstAid && (standing.standing === "counts" || standing.standing === "roles-only"),
  ).length;
}

/**
 * Who wants a guide at times, and for whom none would be free while everyone who needs an adult of their own keeps
 * one. That several could want the same free guide at once is left to the leader.
 */
export function guideAtTimes({ muster, together }: Needs): { people: CoverPerson[]; without: CoverPerson[] } {
  const { choices, matching } = together;
  const ownAdultOf = new Map(together.people.map((person, at) => [person, matching.adultOf[at] ?? NONE]));
  const toBeHad = adultsToBeHad(choices, matching);
  const wanting = muster.people.filter((person) => person.guide === "at-times" && !needsChairPushed(person));
  const without = wanting.filter((person) => {
    const options = [...muster.adults.keys()].filter((at) => {
      const candidate = muster.adults[at];
      if (candidate === undefined || !mayLookAfter(candidate, person)) return false;
      return guidesOnSide(candidate.adult, person.guideSide);
    });
    if (options.includes(ownAdultOf.get(person) ?? NONE)) return false;
    return !options.some((at) => toBeHad.has(at));
  });
  return { people: wanting, without };
}

/** Who is looked after how: one to one, by a guardian who counts for nobody else, or shared by the rest. */
function splitPeople({ people, adults, policy }: Muster, own: OwnAdults) {
  const usedGuardians = new Set<StandingAdult>();
  own.people.forEach((person, at) => {
    const candidate = adults[own.matching.adultOf[at] ?? NONE];
    if (candidate && isOnlyGuardian(candidate) && takesWholeAdult(person, policy)) usedGuardians.add(candidate);
  });
  const freeGuardians = adults.filter((each) => isOnlyGuardian(each) && !usedGuardians.has(each));
  const whole = people.filter((person) => takesWholeAdult(person, policy));
  const others = people.filter((person) => !takesWholeAdult(person, policy));
  const withGuardian = withOwnGuardian(others, freeGuardians, policy);
  return {
    wholeAdults: whole.length - usedGuardians.size,
    sharedPeople: others.filter((person) => !withGuardian.has(person)),
  };
}

/**
 * The fewest adults to add. Those missing to guide or push (`handsShort`, never fewer than the guides and the
 * pushers apart, since nobody is in both sets) count as adults once they come, so only the rest is asked for.
 */
function shortageFrom(measured: {
  guides: number;
  chairs: number;
  handsShort: number;
  ownShort: number;
  headcountShort: number;
  familiesShort: number;
  firstAidersShort: number;
}): Shortage {
  const { guides, chairs, handsShort } = measured;
  const adults = Math.max(0, measured.headcountShort - handsShort, measured.ownShort - handsShort);
  return {
    guides,
    chairPushers: chairs,
    oneToOneAdults: handsShort - guides - chairs,
    adults,
    unrelatedAdults: Math.max(0, measured.familiesShort - handsShort - adults),
    firstAiders: measured.firstAidersShort,
  };
}

/**
 * Counts what the people need and what the adults give, with no words. The method:
 * - by age, each band is rounded up by itself and the bands are added, over everyone who comes and every adult who
 *   counts, as the published ratios are meant;
 * - by support, whoever needs constant support, a guide all the time or a chair pushed has one adult, fully used;
 *   the others use 1/n of an adult each, n the stricter of support level and age band, summed exactly and rounded
 *   up once, never fewer than the policy's minimum;
 * - a guardian who does not count for others meets the support needs of their own children only.
 * Method: common practice, no published source; the figures' sources are in the policy.
 */
export function measureNeeds(muster: Muster): Needs {
  const ownPeople = muster.people.filter(needsOwnAdult);
  const choices = choicesOf(ownPeople, muster.adults);
  return measureWith(muster, ownAdultsFrom(ownPeople, choices, guardiansFirst(choices, muster.adults)));
}

/**
 * Counts again with some adults replaced, each at the position given. Only their part of the choices is worked
 * out anew, which is what makes asking about every adult in turn quick.
 */
export function measureAgain(before: Needs, replaced: ReadonlyMap<number, StandingAdult>): Needs {
  const { people: ownPeople, choices: choicesBefore } = before.together;
  const adults = before.muster.adults.map((each, at) => replaced.get(at) ?? each);
  const choices = ownPeople.map((person, at) => {
    const kept = (choicesBefore[at] ?? []).filter((adult) => !replaced.has(adult));
    for (const [position, candidate] of replaced) if (canBeOwnAdultOf(candidate, person)) kept.push(position);
    return kept;
  });
  // The guardians of a largest matching are as many as can be, still, unless one of them comes or goes.
  const changed = [...replaced.keys()].flatMap((at) => [before.muster.adults[at], adults[at]]);
  const matching = changed.some(isOnlyGuardian)
    ? guardiansFirst(choices, adults)
    : largestMatching(choices, adults.length, freed(before.together.matching, replaced.keys()));
  const start = (own: OwnAdults) => freed(own.matching, replaced.keys());
  return measureWith({ ...before.muster, adults }, ownAdultsFrom(ownPeople, choices, matching), {
    guides: start(before.guides),
    chairs: start(before.chairs),
    hands: start(before.hands),
  });
}

type Starts = { guides?: Matching; chairs?: Matching; hands?: Matching };

function measureWith(muster: Muster, together: OwnAdults, starts: Starts = {}): Needs {
  const { people, adults, policy } = muster;
  const split = splitPeople(muster, together);
  const guides = amongThem(together, needsGuideThroughout, starts.guides);
  const chairs = amongThem(together, needsChairPushed, starts.chairs);
  const hands = amongThem(together, needsHands, starts.hands);

  const counting = adults.filter(({ standing }) => standing.counts);
  const minimum = policy.minimumAdults.unrelatedAdults;
  const bands = adultsByAge(muster);
  const load = supportLoad(split.sharedPeople, policy);
  const sharedAdults = Math.max(minimum, ceilFraction(load));
  const byAge = shortOf(bands.reduce((sum, band) => sum + band.adults, 0), counting.length);
  const bySupport = shortOf(split.wholeAdults + sharedAdults, counting.length);
  const families = shortOf(minimum, familiesOf(counting));
  const firstAiders = shortOf(policy.roleNeeds.firstAiders.adults, firstAidersAmong(adults));

  return {
    muster,
    ...split,
    adultsWhoCount: counting.length,
    byAge: { ...byAge, bands },
    bySupport: { ...bySupport, load, sharedAdults },
    withoutBand: people.filter((person) => ageBandFor(policy, person.ageYears) === undefined),
    guides,
    chairs,
    hands,
    together,
    families,
    firstAiders,
    shortage: shortageFrom({
      guides: guides.short,
      chairs: chairs.short,
      handsShort: hands.short,
      ownShort: together.short,
      headcountShort: Math.max(byAge.short, bySupport.short),
      familiesShort: families.short,
      firstAidersShort: firstAiders.short,
    }),
  };
}

/** Whether the guides and the pushers, enough apart, are wanted for several people at once. */
export function isShortOnlyTogether(needs: Needs): boolean {
  return needs.together.short > needs.guides.short + needs.chairs.short;
}

/** The questions that the numbers alone leave unanswered. */
export function questionsShort(needs: Needs): Set<CoverQuestion> {
  const short = new Set<CoverQuestion>();
  if (needs.byAge.short > 0 || needs.withoutBand.length > 0) short.add("supervision");
  if (needs.bySupport.short > 0 || isShortOnlyTogether(needs)) short.add("support");
  if (needs.guides.short > 0 || needs.chairs.short > 0) short.add("guides");
  if (needs.firstAiders.short > 0) short.add("roles");
  if (needs.families.short > 0) short.add("two-adults");
  return short;
}
