import type { AdultStanding, CoverAdult, NotCountingCode, Standing } from "./cover";
import type { CoverPolicy } from "./cover-policy";
import { dayInWords, isIsoDate } from "./cover-words";

export type StandingAdult = { adult: CoverAdult; standing: AdultStanding };

type Reason = { code: NotCountingCode; sentence: string };

const ANSWER_REASONS: Record<Exclude<CoverAdult["answer"], "yes">, Reason> = {
  asked: { code: "not-answered", sentence: "Has not answered yet." },
  maybe: { code: "maybe", sentence: "Said maybe." },
  no: { code: "said-no", sentence: "Said no." },
};

function clearanceReason(adult: CoverAdult, date: string): Reason | null {
  if (adult.clearedUntil === null || !isIsoDate(adult.clearedUntil)) {
    return { code: "no-clearance", sentence: "Has no clearance on file." };
  }
  // YYYY-MM-DD sorts as text. A clearance is good on its last day.
  if (adult.clearedUntil >= date) return null;
  const lastDay = dayInWords(adult.clearedUntil, date);
  return { code: "clearance-ends", sentence: `Clearance ends ${lastDay}, before the outing.` };
}

function reasonsNotToCount(adult: CoverAdult, date: string, policy: CoverPolicy): Reason[] {
  const reasons: Reason[] = [];
  if (adult.answer !== "yes") reasons.push(ANSWER_REASONS[adult.answer]);
  if (!adult.isAdult) {
    reasons.push({ code: "under-age", sentence: `Is under ${policy.adultAge.years} on the day.` });
  }
  const clearance = clearanceReason(adult, date);
  if (clearance) reasons.push(clearance);
  if (adult.drivesWholeDay) reasons.push({ code: "drives", sentence: "Drives, so cannot look after people." });
  if (adult.role === "leader" && !policy.leaderCounts.counts) {
    reasons.push({ code: "leader", sentence: "Leads the day, and the policy does not count the leader." });
  }
  return reasons;
}

const CLEARANCE_CODES: readonly NotCountingCode[] = ["no-clearance", "clearance-ends"];

function standingFrom(reasons: readonly Reason[], isGuardian: boolean): Standing {
  if (reasons.length === 0) return "counts";
  const [only] = reasons;
  if (reasons.length > 1 || only === undefined) return "does-not-count";
  if (only.code === "leader") return "roles-only";
  return isGuardian && CLEARANCE_CODES.includes(only.code) ? "own-child-only" : "does-not-count";
}

function standingSentence(standing: Standing, reasons: readonly Reason[]): string {
  const why = reasons.map((reason) => reason.sentence).join(" ");
  if (standing === "counts") return "Counts in full.";
  if (standing === "own-child-only") return `Counts for their own child only. ${why}`;
  if (standing === "roles-only") return `Can be the first aider, but does not count. ${why}`;
  return `Does not count. ${why}`;
}

/**
 * Whether an adult counts on the day, and why not, in words. Sight is not asked: a blind adult counts in full.
 * Drivers, under-18s, "maybe", lapsed clearances: common practice, no published source.
 *
 * @param isGuardian whether someone who comes has this adult as a guardian
 * @param date the day of the outing, YYYY-MM-DD
 */
export function standingOf(
  adult: CoverAdult,
  isGuardian: boolean,
  date: string,
  policy: CoverPolicy,
): AdultStanding {
  const reasons = reasonsNotToCount(adult, date, policy);
  const standing = standingFrom(reasons, isGuardian);
  return {
    adultId: adult.id,
    name: adult.name,
    counts: standing === "counts",
    standing,
    reasons,
    sentence: standingSentence(standing, reasons),
  };
}
