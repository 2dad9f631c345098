import type { StandingAdult } from "./adult-standing";
import { standingOf } from "./adult-standing";
import type { CoverAdult, Finding } from "./cover";
import { COMMON_PRACTICE } from "./cover-policy";
import { listNames } from "./cover-words";
import { shortageInWords } from "./describe-needs";
import type { Muster, Needs } from "./measure-needs";
import { measureAgain, questionsShort } from "./measure-needs";
import { isGuardianOf } from "./one-to-one";

/** Whether some question that was answered is not any more. */
function isWorse(after: Needs, before: Needs): boolean {
  const shortBefore = questionsShort(before);
  return [...questionsShort(after)].some((question) => !shortBefore.has(question));
}

/** The adult at this position had they given another answer. */
function withAnswer(muster: Muster, at: number, answer: CoverAdult["answer"], date: string) {
  const listed = muster.adults[at];
  if (listed === undefined) throw new RangeError(`No adult at position ${at}.`);
  const adult = { ...listed.adult, answer };
  const isGuardian = muster.people.some((person) => isGuardianOf(adult, person));
  return { adult, standing: standingOf(adult, isGuardian, date, muster.policy) };
}

/** Adults who were asked or said maybe, and with a yes would put right what the other's absence makes short. */
function couldStepIn(base: Needs, cancelled: number, date: string): StandingAdult[] {
  const { muster } = base;
  const said = withAnswer(muster, cancelled, "no", date);
  return muster.adults.filter(({ adult }, at) => {
    if (adult.answer !== "asked" && adult.answer !== "maybe") return false;
    const standby = withAnswer(muster, at, "yes", date);
    if (standby.standing.standing === "does-not-count") return false;
    return !isWorse(measureAgain(base, new Map([[cancelled, said], [at, standby]])), base);
  });
}

function standbyAction(steppingIn: readonly StandingAdult[], cancelled: StandingAdult): string {
  if (steppingIn.length === 0) return `Find one more adult to stand by for ${cancelled.adult.name}.`;
  const [first] = steppingIn;
  if (steppingIn.length === 1 && first) return `Ask ${first.adult.name}, who could step in, to stand by.`;
  return `Ask one of ${listNames(steppingIn.map(({ adult }) => adult.name))} to stand by.`;
}

function cancellationFinding(
  cancelled: StandingAdult,
  after: Needs,
  steppingIn: readonly StandingAdult[],
): Finding {
  return {
    rule: "one-adult-cancels",
    question: "cancellation",
    severity: "warns",
    needed: 1,
    have: 0,
    short: 1,
    people: [],
    adults: [cancelled.adult.id],
    sentence: `If ${cancelled.adult.name} cancels, the day is short by ${shortageInWords(after.shortage)}.`,
    action: standbyAction(steppingIn, cancelled),
    source: COMMON_PRACTICE,
  };
}

function nobodyFinding(isShort: boolean): Finding {
  return {
    rule: "one-adult-cancels",
    question: "cancellation",
    severity: isShort ? "warns" : "met",
    needed: isShort ? 1 : 0,
    have: 0,
    short: isShort ? 1 : 0,
    people: [],
    adults: [],
    sentence: isShort
      ? "The day is short already, so nobody can be spared."
      : "Any one adult could cancel, and the day would still be covered.",
    action: isShort ? "First find the adults who are missing, then look at this again." : null,
    source: COMMON_PRACTICE,
  };
}

/**
 * What if one adult cancels: every adult whose absence alone leaves a question unanswered that is answered now,
 * found by counting the day again without them, and who on the list could step in. Pairings play no part, as
 * people would be paired anew.
 */
export function judgeCancellation(base: Needs, date: string): Finding[] {
  const { muster } = base;
  const findings = muster.adults.flatMap((cancelled, at) => {
    if (cancelled.standing.standing === "does-not-count") return [];
    const after = measureAgain(base, new Map([[at, withAnswer(muster, at, "no", date)]]));
    if (!isWorse(after, base)) return [];
    return [cancellationFinding(cancelled, after, couldStepIn(base, at, date))];
  });
  return findings.length > 0 ? findings : [nobodyFinding(questionsShort(base).size > 0)];
}
