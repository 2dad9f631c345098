import type { StandingAdult } from "./adult-standing";
import type { CoverPerson, Finding, Pairing } from "./cover";
import { COMMON_PRACTICE } from "./cover-policy";
import { adults as countAdults, capitalized, listNames, people as countPeople, verb } from "./cover-words";
import { ceilFraction, compareFractions, formatFraction, fraction } from "./fraction";
import type { Muster } from "./measure-needs";
import { supportLoad } from "./measure-needs";
import {
  hasSkillsFor,
  mayLookAfter,
  needsChairPushed,
  needsGuideThroughout,
  needsHands,
  needsOwnAdult,
  takesWholeAdult,
} from "./one-to-one";

type Paired = {
  peopleOf: Map<StandingAdult, CoverPerson[]>;
  adultsOf: Map<CoverPerson, StandingAdult[]>;
  unknown: Pairing[];
};

function resolvePairings(pairings: readonly Pairing[], { people, adults }: Muster): Paired {
  const personById = new Map(people.map((person) => [person.id, person]));
  const adultById = new Map(adults.map((each) => [each.adult.id, each]));
  const paired: Paired = { peopleOf: new Map(), adultsOf: new Map(), unknown: [] };
  for (const pairing of pairings) {
    const person = personById.get(pairing.personId);
    const adult = adultById.get(pairing.adultId);
    if (!person || !adult) {
      paired.unknown.push(pairing);
      continue;
    }
    const already = paired.peopleOf.get(adult) ?? [];
    if (already.includes(person)) continue;
    paired.peopleOf.set(adult, [...already, person]);
    paired.adultsOf.set(person, [...(paired.adultsOf.get(person) ?? []), adult]);
  }
  return paired;
}

function names(people: readonly CoverPerson[]): string {
  return listNames(people.map((person) => person.name));
}

function ids(people: readonly CoverPerson[]): string[] {
  return people.map((person) => person.id);
}

function unknownFinding(unknown: readonly Pairing[]): Finding[] {
  if (unknown.length === 0) return [];
  const count = unknown.length;
  return [
    {
      rule: "pairing-known",
      question: "support",
      severity: "stops",
      needed: count,
      have: 0,
      short: count,
      people: [...new Set(unknown.map((pairing) => pairing.personId))],
      adults: [...new Set(unknown.map((pairing) => pairing.adultId))],
      sentence: `${count} ${verb(count, "pairing names", "pairings name")} someone who is not on the outing.`,
      action: `Remove ${verb(count, "it and pair that person", "them and pair those people")} again.`,
      source: COMMON_PRACTICE,
    },
  ];
}

function doesNotCountFinding(candidate: StandingAdult, theirs: readonly CoverPerson[]): Finding[] {
  const wrong = theirs.filter((person) => !mayLookAfter(candidate, person));
  if (wrong.length === 0) return [];
  const { adult, standing } = candidate;
  const isGuardian = standing.standing === "own-child-only";
  const who = isGuardian ? "who counts for their own child only" : "who does not count";
  const why = standing.reasons.map((reason) => reason.sentence).join(" ");
  return [
    {
      rule: "pairing-adult-counts",
      question: "support",
      severity: "stops",
      needed: 1,
      have: 0,
      short: 1,
      people: ids(wrong),
      adults: [adult.id],
      sentence: `${names(wrong)} ${verb(wrong.length, "is", "are")} with ${adult.name}, ${who}. ${why}`,
      action: `Give ${names(wrong)} another adult.`,
      source: COMMON_PRACTICE,
    },
  ];
}

/** Those of an adult's people who leave no room for anyone beside them. */
function exclusivePeople(theirs: readonly CoverPerson[], muster: Muster): CoverPerson[] {
  const whole = theirs.filter((person) => takesWholeAdult(person, muster.policy));
  if (whole.length > 0) return whole;
  const own = theirs.filter(needsOwnAdult);
  return own.length > 1 ? own : [];
}

function oneToOneFinding(
  { adult }: StandingAdult,
  theirs: readonly CoverPerson[],
  muster: Muster,
): Finding | null {
  const exclusive = exclusivePeople(theirs, muster);
  if (theirs.length < 2 || exclusive.length === 0) return null;
  const rest = theirs.filter((person) => !exclusive.includes(person));
  const needed = exclusive.length + ceilFraction(supportLoad(rest, muster.policy));
  const has =
    rest.length === 0
      ? `${adult.name} has ${countPeople(theirs.length)}`
      : `${adult.name} also has ${names(rest)}`;
  return {
    rule: "pairing-one-to-one",
    question: "support",
    severity: "stops",
    needed,
    have: 1,
    short: needed - 1,
    people: ids(theirs),
    adults: [adult.id],
    sentence:
      `${names(exclusive)} ${verb(exclusive.length, "needs an adult", "each need an adult")} ` +
      `of their own, but ${has}.`,
    action: `Give ${names(rest.length > 0 ? rest : exclusive.slice(1))} another adult.`,
    source: COMMON_PRACTICE,
  };
}

function loadFinding({ adult }: StandingAdult, theirs: readonly CoverPerson[], muster: Muster): Finding[] {
  const load = supportLoad(theirs, muster.policy);
  if (compareFractions(load, fraction(1)) <= 0) return [];
  const needed = ceilFraction(load);
  return [
    {
      rule: "pairing-load",
      question: "support",
      severity: "stops",
      needed,
      have: 1,
      short: needed - 1,
      people: ids(theirs),
      adults: [adult.id],
      sentence: `${adult.name} has ${countPeople(theirs.length)} who together need ${formatFraction(load)} adults.`,
      action: `Move one of them from ${adult.name} to an adult with room.`,
      source: `Policy: ${muster.policy.name}, version ${muster.policy.version}`,
    },
  ];
}

/** A person whose adults may look after them, but none has the skills. */
function skillFinding(person: CoverPerson, theirAdults: readonly StandingAdult[]): Finding[] {
  const allowed = theirAdults.filter((candidate) => mayLookAfter(candidate, person));
  if (!needsHands(person) || allowed.length === 0) return [];
  if (allowed.some(({ adult }) => hasSkillsFor(adult, person))) return [];
  const side = person.guideSide === "either" ? "" : ` on the ${person.guideSide} arm`;
  const need = needsGuideThroughout(person) ? `needs a guide${side}` : "needs a chair pushed";
  const adultNames = listNames(allowed.map(({ adult }) => adult.name));
  const skill = needsChairPushed(person) && person.guide === "throughout" ? "both guide and push" : "do that";
  return [
    {
      rule: needsGuideThroughout(person) ? "pairing-guide" : "pairing-chair",
      question: "guides",
      severity: "stops",
      needed: 1,
      have: 0,
      short: 1,
      people: [person.id],
      adults: allowed.map(({ adult }) => adult.id),
      sentence: `${person.name} ${need}, and ${adultNames} ${verb(allowed.length, "does not", "do not")} ${skill}.`,
      action: `Give ${person.name} an adult who can ${skill}.`,
      source: COMMON_PRACTICE,
    },
  ];
}

function notPairedFinding({ people }: Muster, adultsOf: Paired["adultsOf"]): Finding[] {
  const alone = people.filter((person) => !adultsOf.has(person));
  if (alone.length === 0) return [];
  return [
    {
      rule: "pairing-everyone",
      question: "support",
      severity: "warns",
      needed: people.length,
      have: people.length - alone.length,
      short: alone.length,
      people: ids(alone),
      adults: [],
      sentence: `${capitalized(names(alone))} ${verb(alone.length, "has", "have")} no adult yet.`,
      action: `Choose an adult for ${names(alone)}.`,
      source: COMMON_PRACTICE,
    },
  ];
}

function allHoldFinding({ peopleOf, adultsOf }: Paired): Finding {
  const paired = [...adultsOf.keys()];
  return {
    rule: "pairings-hold",
    question: "support",
    severity: "met",
    needed: peopleOf.size,
    have: peopleOf.size,
    short: 0,
    people: ids(paired),
    adults: [...peopleOf.keys()].map(({ adult }) => adult.id),
    sentence: `Every pairing holds: ${countPeople(paired.length)} with ${countAdults(peopleOf.size)}.`,
    action: null,
    source: COMMON_PRACTICE,
  };
}

/**
 * Whether the pairings made so far may stand. No pairings, no findings: the numbers are judged apart. A person in
 * two adults' care counts in full for both.
 */
export function judgePairings(pairings: readonly Pairing[], muster: Muster): Finding[] {
  if (pairings.length === 0) return [];
  const paired = resolvePairings(pairings, muster);
  const perAdult = [...paired.peopleOf].flatMap(([candidate, theirs]) => {
    // An adult with two people one to one is over the load as well; the first says it better.
    const oneToOne = oneToOneFinding(candidate, theirs, muster);
    const burden = oneToOne ? [oneToOne] : loadFinding(candidate, theirs, muster);
    return [...doesNotCountFinding(candidate, theirs), ...burden];
  });
  const perPerson = [...paired.adultsOf].flatMap(([person, theirAdults]) => skillFinding(person, theirAdults));
  const wrong = [...unknownFinding(paired.unknown), ...perAdult, ...perPerson];
  const holds = wrong.length === 0 ? [allHoldFinding(paired)] : [];
  return [...wrong, ...holds, ...notPairedFinding(muster, paired.adultsOf)];
}
