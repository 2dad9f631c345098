import type { StandingAdult } from "./adult-standing";
import { standingOf } from "./adult-standing";
import type { CoverInput, CoverVerdict, Finding } from "./cover";
import { coverQuestions } from "./cover";
import { COMMON_PRACTICE } from "./cover-policy";
import {
  adults as countAdults,
  countedInWords,
  isIsoDate,
  listNames,
  people as countPeople,
  verb,
} from "./cover-words";
import { needFindings, shortageInWords } from "./describe-needs";
import { judgeCancellation } from "./judge-cancellation";
import { judgePairings } from "./judge-pairings";
import type { Muster, Needs } from "./measure-needs";
import { measureNeeds } from "./measure-needs";
import { isGuardianOf } from "./one-to-one";

type Listed = { id: string; name: string };

/** The first of each id, and those whose id came before. */
function listedOnce<Item extends Listed>(items: readonly Item[]): { once: Item[]; again: Item[] } {
  const seen = new Set<string>();
  const [once, again]: [Item[], Item[]] = [[], []];
  for (const item of items) {
    (seen.has(item.id) ? again : once).push(item);
    seen.add(item.id);
  }
  return { once, again };
}

function inputFinding(
  rule: Finding["rule"],
  about: Partial<Pick<Finding, "people" | "adults">> & Pick<Finding, "sentence" | "action">,
): Finding {
  return {
    rule,
    question: "supervision",
    severity: "stops",
    needed: 1,
    have: 0,
    short: 1,
    people: [],
    adults: [],
    source: COMMON_PRACTICE,
    ...about,
  };
}

function listedTwice(again: readonly Listed[], rule: "person-listed-once" | "adult-listed-once"): Finding[] {
  if (again.length === 0) return [];
  const ids = [...new Set(again.map((item) => item.id))];
  const [who, are] = [listNames([...new Set(again.map((item) => item.name))]), verb(ids.length, "is", "are")];
  return [
    inputFinding(rule, {
      [rule === "person-listed-once" ? "people" : "adults"]: ids,
      sentence: `${who} ${are} listed twice and ${are} counted once.`,
      action: `Remove ${who} from the list once.`,
    }),
  ];
}

/** What would make any count wrong: it is said first, and no such day is called covered. */
function judgeInput(input: CoverInput, peopleAgain: readonly Listed[], adultsAgain: readonly Listed[]): Finding[] {
  const findings = [
    ...listedTwice(peopleAgain, "person-listed-once"),
    ...listedTwice(adultsAgain, "adult-listed-once"),
  ];
  if (!isIsoDate(input.date)) {
    const sentence = "The outing has no date that can be read, so no clearance can be checked.";
    findings.unshift(inputFinding("date-readable", { sentence, action: "Set the date of the outing." }));
  }
  if (input.people.length === 0) {
    const sentence = "Nobody is registered yet, so there is nobody to cover.";
    findings.push(inputFinding("people-registered", { sentence, action: "Look again when someone has registered." }));
  }
  return findings;
}

function verdictSentence(findings: readonly Finding[], unreadable: readonly Finding[], needs: Needs): string {
  const [first] = unreadable;
  if (first) return first.sentence;
  const short = shortageInWords(needs.shortage);
  if (short !== "") return `Short by ${short}.`;
  const stops = findings.filter((finding) => finding.severity === "stops");
  const [only] = stops;
  if (only && stops.length === 1) return `Not covered yet. ${only.sentence}`;
  if (stops.length > 1) return `Not covered yet: ${countedInWords(stops.length, "thing", "things")} to put right.`;
  const counting = countAdults(needs.adultsWhoCount);
  const who = verb(needs.adultsWhoCount, "who counts", "who count");
  return `Covered: ${countPeople(needs.muster.people.length)}, ${counting} ${who}.`;
}

function musterOf(input: CoverInput, people: Muster["people"], adults: CoverInput["adults"]): Muster {
  const standing: StandingAdult[] = adults.map((adult) => {
    const isGuardian = people.some((person) => isGuardianOf(adult, person));
    return { adult, standing: standingOf(adult, isGuardian, input.date, input.policy) };
  });
  return { people, adults: standing, policy: input.policy };
}

/**
 * Whether the adults who are coming meet every need of the people who are coming, on one day taken as a whole.
 *
 * Answers six questions apart (supervision by age, support levels, guides and chairs, roles, two unrelated adults,
 * what if one cancels), each by findings that say what is needed, what there is, how many short, and one thing to
 * do. Rules that hold are reported as "met". `covered` is true only if no finding "stops".
 *
 * Ages in whole years, dates YYYY-MM-DD, counts in adults. Sums of support are exact. Never throws on a policy
 * that `coverPolicySchema` accepts: input that cannot be counted (no people, an id twice, an age without a band, a
 * date that is none) is a finding that stops. Ratios and their sources come from the policy; the method is common
 * practice with no published source. Read `COVER_CAUTION` beside every verdict.
 */
export function checkCover(input: CoverInput): CoverVerdict {
  const { once: people, again: peopleAgain } = listedOnce(input.people);
  const { once: adults, again: adultsAgain } = listedOnce(input.adults);
  const muster = musterOf(input, people, adults);
  const needs = measureNeeds(muster);

  const unreadable = judgeInput(input, peopleAgain, adultsAgain);
  const found = [
    ...unreadable,
    ...needFindings(needs),
    ...judgePairings(input.pairings, muster),
    ...judgeCancellation(needs, input.date),
  ];
  const findings = coverQuestions.flatMap((question) => found.filter((finding) => finding.question === question));

  return {
    covered: findings.every((finding) => finding.severity !== "stops"),
    sentence: verdictSentence(findings, unreadable, needs),
    counts: {
      people: people.length,
      adultsWhoCount: needs.adultsWhoCount,
      neededAdults: Math.max(needs.byAge.needed, needs.bySupport.needed),
    },
    shortage: needs.shortage,
    adults: muster.adults.map(({ standing }) => standing),
    findings,
  };
}
