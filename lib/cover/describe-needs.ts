import type { StandingAdult } from "./adult-standing";
import type { CoverAdult, CoverPerson, Finding, NotCountingCode, Shortage } from "./cover";
import { COMMON_PRACTICE } from "./cover-policy";
import {
  adults,
  capitalized,
  countedInWords,
  joinWithAnd,
  listNames,
  numberWord,
  people,
  verb,
} from "./cover-words";
import type { Needs, OwnAdults } from "./measure-needs";
import { guideAtTimes, isShortOnlyTogether, tooFewAmong } from "./measure-needs";
import { hasSkillsFor } from "./one-to-one";

const ONE_GUIDE_EACH =
  "One guide for one person, as every guide to sighted guiding describes it, for example " +
  "https://www.dhs.wisconsin.gov/obvi/adjustment/sightedguidetech.htm";

type Severity = Finding["severity"];

function ids(items: readonly { id: string }[]): string[] {
  return items.map((item) => item.id);
}

function names(items: readonly { name: string }[]): string {
  return listNames(items.map((item) => item.name));
}

function whenShort(short: number): Severity {
  return short > 0 ? "stops" : "met";
}

/** Parts of a shortage, as in "one guide and two adults"; empty when nothing is short. */
export function shortageInWords(shortage: Shortage): string {
  const parts = [
    [shortage.guides, "guide", "guides"],
    [shortage.chairPushers, "adult to push a chair", "adults to push a chair"],
    [shortage.oneToOneAdults, "adult to guide or push a chair", "adults to guide or push a chair"],
    [shortage.adults, "adult", "adults"],
    [shortage.unrelatedAdults, "adult from another family", "adults from other families"],
    [shortage.firstAiders, "first aider", "first aiders"],
  ] as const;
  return joinWithAnd(
    parts.filter(([count]) => count > 0).map(([count, one, many]) => countedInWords(count, one, many)),
  );
}

const ACTION_FOR: Partial<Record<NotCountingCode, (name: string) => string>> = {
  maybe: (name) => `Ask ${name}, who said maybe, for a yes.`,
  "not-answered": (name) => `Ask ${name} again, who has not answered yet.`,
  "clearance-ends": (name) => `Get ${name}’s clearance renewed before the outing.`,
  "no-clearance": (name) => `Get a clearance for ${name} before the outing.`,
};

/**
 * The easiest thing to do: an adult who is on the list, would be of use, and lacks one thing only that can still
 * be had. An answer is quicker to get than a clearance.
 */
function nearestAction(needs: Needs, isOfUse: (adult: CoverAdult) => boolean): string | null {
  const nearly = needs.muster.adults.filter(
    ({ adult, standing }) => standing.reasons.length === 1 && isOfUse(adult),
  );
  for (const [code, action] of Object.entries(ACTION_FOR)) {
    const found = nearly.find(({ standing }) => standing.reasons[0]?.code === code);
    if (found) return action(found.adult.name);
  }
  return null;
}

function askForAdults(needs: Needs, short: number): string {
  const nearest = short === 1 ? nearestAction(needs, () => true) : null;
  return nearest ?? `Ask ${countedInWords(short, "more cleared adult", "more cleared adults")} to come.`;
}

function sourcesOf(figures: readonly { source: string }[]): string {
  return [...new Set(figures.map((figure) => figure.source))].join("; ");
}

function countSentence(needs: Needs, short: number): string {
  const have = needs.adultsWhoCount;
  if (have === 0) return "No adult counts yet.";
  return `${capitalized(numberWord(have))} ${verb(have, "counts", "count")}${short > 0 ? " so far" : ""}.`;
}

function ageFinding(needs: Needs): Finding {
  const { needed, short, bands } = needs.byAge;
  const parts = bands.map(({ band, people: count, adults: forBand }) => {
    const ages = band.fromAge === 0 ? `up to ${band.toAge}` : `${band.fromAge} to ${band.toAge}`;
    return `${forBand} for ${people(count)} aged ${ages}`;
  });
  const because = parts.length > 0 ? `: ${joinWithAnd(parts)}` : "";
  return {
    rule: "ratio-by-age",
    question: "supervision",
    severity: whenShort(short),
    needed,
    have: needs.adultsWhoCount,
    short,
    people: ids(needs.muster.people),
    adults: [],
    sentence: `By age the day needs ${adults(needed)}${because}. ${countSentence(needs, short)}`,
    action: short > 0 ? askForAdults(needs, short) : null,
    source: sourcesOf(bands.map(({ band }) => band)) || COMMON_PRACTICE,
  };
}

function withoutBandFinding(needs: Needs): Finding[] {
  const { withoutBand } = needs;
  if (withoutBand.length === 0) return [];
  const ages = [...new Set(withoutBand.map((person) => person.ageYears))].toSorted((a, b) => a - b).map(String);
  const isOne = ages.length === 1;
  return [
    {
      rule: "age-has-ratio",
      question: "supervision",
      severity: "stops",
      needed: withoutBand.length,
      have: 0,
      short: withoutBand.length,
      people: ids(withoutBand),
      adults: [],
      sentence:
        `The policy has no ratio for ${isOne ? "age" : "ages"} ${joinWithAnd(ages)}, ` +
        `so ${names(withoutBand)} cannot be counted.`,
      action: `Check the birth ${verb(withoutBand.length, "date", "dates")}, or add an age band to the policy.`,
      source: `Policy: ${needs.muster.policy.name}, version ${needs.muster.policy.version}`,
    },
  ];
}

function supportFinding(needs: Needs): Finding {
  const { needed, short, sharedAdults } = needs.bySupport;
  const { policy } = needs.muster;
  const shared = needs.sharedPeople.length;
  const parts = [
    ...(needs.wholeAdults > 0 ? [`${needs.wholeAdults} one to one`] : []),
    shared > 0
      ? `${sharedAdults} for ${needs.wholeAdults > 0 ? "the other " : ""}${people(shared)}`
      : `${sharedAdults} for the group as a whole`,
  ];
  return {
    rule: "ratio-by-support",
    question: "support",
    severity: whenShort(short),
    needed,
    have: needs.adultsWhoCount,
    short,
    people: ids(needs.muster.people),
    adults: [],
    sentence: `By support level the day needs ${adults(needed)}: ${joinWithAnd(parts)}. ${countSentence(needs, short)}`,
    action: short > 0 ? askForAdults(needs, short) : null,
    source: sourcesOf([...Object.values(policy.supportRatios), policy.handsOnTakesWholeAdult]),
  };
}

/** "only Ines can", "only Ines and Jonah can", "nobody who counts can". */
function onlyThese(candidates: readonly StandingAdult[]): string {
  if (candidates.length === 0) return "nobody who counts";
  const theirNames = names(candidates.map(({ adult }) => adult));
  return candidates.length <= 4 ? `only ${theirNames}` : `only ${adults(candidates.length)} (${theirNames})`;
}

function sideInWords(wanting: readonly CoverPerson[]): string {
  const sides = new Set(wanting.map((person) => person.guideSide));
  const [side] = sides;
  return sides.size === 1 && side !== undefined && side !== "either" ? ` on the ${side} arm` : "";
}

/** Names as they are up to four; beyond, the number first, as it is what the sentence is about. */
function group(wanting: readonly CoverPerson[]): string {
  return wanting.length <= 4 ? names(wanting) : `${people(wanting.length)} (${names(wanting)})`;
}

type OwnAdultWords = {
  rule: Finding["rule"];
  question: Finding["question"];
  /** "needs a guide all the time" */
  needs: (wanting: readonly CoverPerson[]) => string;
  can: string;
  source: string;
  toAsk: [one: string, many: string];
};

function ownAdultFinding(needs: Needs, own: OwnAdults, words: OwnAdultWords): Finding[] {
  if (own.people.length === 0) return [];
  const tooFew = tooFewAmong(own, needs.muster);
  const common = {
    rule: words.rule,
    question: words.question,
    needed: own.needed,
    have: own.have,
    short: own.short,
    source: words.source,
  };
  if (tooFew === null) {
    const canHave = own.people.length === 1 ? "and can have one" : "and each can have one";
    const sentence = `${capitalized(group(own.people))} ${words.needs(own.people)}, ${canHave}.`;
    return [{ ...common, severity: "met", people: ids(own.people), adults: [], sentence, action: null }];
  }
  const isOfUse = (adult: CoverAdult) => tooFew.people.some((person) => hasSkillsFor(adult, person));
  const nearest = own.short === 1 ? nearestAction(needs, isOfUse) : null;
  return [
    {
      ...common,
      severity: "stops",
      people: ids(tooFew.people),
      adults: tooFew.adults.map(({ adult }) => adult.id),
      sentence:
        `${capitalized(group(tooFew.people))} ${words.needs(tooFew.people)}, ` +
        `but ${onlyThese(tooFew.adults)} ${words.can}.`,
      action: nearest ?? `Find ${countedInWords(own.short, ...words.toAsk)}${sideOfAsk(words, tooFew.people)}.`,
    },
  ];
}

function sideOfAsk(words: OwnAdultWords, wanting: readonly CoverPerson[]): string {
  return words.rule === "guide-for-each" ? sideInWords(wanting) : "";
}

function guidesFinding(needs: Needs): Finding[] {
  return ownAdultFinding(needs, needs.guides, {
    rule: "guide-for-each",
    question: "guides",
    needs: (wanting) =>
      `${verb(wanting.length, "needs", "need")} a guide all the time${sideInWords(wanting)}`,
    can: "can guide them",
    source: ONE_GUIDE_EACH,
    toAsk: ["more adult who guides", "more adults who guide"],
  });
}

function chairsFinding(needs: Needs): Finding[] {
  return ownAdultFinding(needs, needs.chairs, {
    rule: "chair-pusher-for-each",
    question: "guides",
    needs: (wanting) =>
      `${verb(wanting.length, "needs", "need")} an adult to push ${verb(wanting.length, "the chair", "their chairs")}`,
    can: "can push",
    source: COMMON_PRACTICE,
    toAsk: ["more adult who pushes a chair", "more adults who push a chair"],
  });
}

/** Left out when the guides or the chairs alone already tell why it cannot be. */
function togetherFinding(needs: Needs): Finding[] {
  if (needs.together.short > 0 && !isShortOnlyTogether(needs)) return [];
  return ownAdultFinding(needs, needs.together, {
    rule: "one-to-one-together",
    question: "support",
    needs: (wanting) => `${verb(wanting.length, "needs", "need")} an adult of their own`,
    can: "can be that adult",
    source: COMMON_PRACTICE,
    toAsk: ["more adult for one-to-one help", "more adults for one-to-one help"],
  });
}

function guideAtTimesFinding(needs: Needs): Finding[] {
  const { people: wanting, without } = guideAtTimes(needs);
  if (wanting.length === 0) return [];
  const isMet = without.length === 0;
  const affected = isMet ? wanting : without;
  const wants = verb(affected.length, "wants", "want");
  return [
    {
      rule: "guide-at-times",
      question: "guides",
      severity: isMet ? "met" : "warns",
      needed: 1,
      have: isMet ? 1 : 0,
      short: isMet ? 0 : 1,
      people: ids(affected),
      adults: [],
      sentence: isMet
        ? `${names(affected)} ${wants} a guide at times, and one will be free.`
        : `${names(affected)} ${wants} a guide at times${sideInWords(affected)}, but none will be free.`,
      action: isMet ? null : "Find one more adult who guides, or plan who waits with whom at the hard places.",
      source: COMMON_PRACTICE,
    },
  ];
}

function firstAidFinding(needs: Needs): Finding[] {
  const { needed, have, short } = needs.firstAiders;
  if (needed === 0) return [];
  const nearest = short === 1 ? nearestAction(needs, (adult) => adult.capabilities.firstAid) : null;
  const comes = have === 0 ? "none comes" : `${numberWord(have)} ${verb(have, "comes", "come")}`;
  const needing = countedInWords(needed, "first aider", "first aiders");
  return [
    {
      rule: "first-aider",
      question: "roles",
      severity: whenShort(short),
      needed,
      have,
      short,
      people: [],
      adults: [],
      sentence: `The day needs ${needing}, and ${comes}.`,
      action: short > 0 ? (nearest ?? `Find ${countedInWords(short, "adult", "adults")} trained in first aid.`) : null,
      source: needs.muster.policy.roleNeeds.firstAiders.source,
    },
  ];
}

function twoAdultsFinding(needs: Needs): Finding {
  const { needed, have, short } = needs.families;
  const counting = needs.muster.adults.filter(({ standing }) => standing.counts);
  const families = new Set(counting.map(({ adult }) => adult.familyId));
  const isFromElsewhere = (adult: CoverAdult) => adult.familyId === null || !families.has(adult.familyId);
  const nearest = short === 1 ? nearestAction(needs, isFromElsewhere) : null;
  const wanted = `${countedInWords(needed, "cleared adult", "cleared adults")} who are not related`;
  const comes =
    have === 0
      ? "none comes"
      : have < needed && counting.length > have
        ? `those who come are from ${countedInWords(have, "family", "families")}`
        : `${numberWord(have)} ${verb(have, "comes", "come")}`;
  return {
    rule: "two-unrelated-adults",
    question: "two-adults",
    severity: whenShort(short),
    needed,
    have,
    short,
    people: [],
    adults: counting.map(({ adult }) => adult.id),
    sentence: `The day needs ${wanted}, and ${comes}.`,
    action:
      short > 0
        ? (nearest ?? `Ask ${countedInWords(short, "cleared adult", "cleared adults")} from another family to come.`)
        : null,
    source: needs.muster.policy.minimumAdults.source,
  };
}

/** What the numbers say, question by question, rules that hold included. */
export function needFindings(needs: Needs): Finding[] {
  return [
    ageFinding(needs),
    ...withoutBandFinding(needs),
    supportFinding(needs),
    ...togetherFinding(needs),
    ...guidesFinding(needs),
    ...chairsFinding(needs),
    ...guideAtTimesFinding(needs),
    ...firstAidFinding(needs),
    twoAdultsFinding(needs),
  ];
}
