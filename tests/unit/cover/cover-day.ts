import type { CoverAdult, CoverInput, CoverPerson, CoverVerdict, Finding } from "@/lib/cover/cover";
import { builtInPolicy } from "@/lib/cover/cover-policy";

/** A child who asks for the least: ten, minimal support, no guide, no chair. */
export function aPerson(name: string, facts: Partial<CoverPerson> = {}): CoverPerson {
  return {
    id: name.toLowerCase(),
    name,
    ageYears: 10,
    supportLevel: "minimal",
    guide: "not-needed",
    guideSide: "either",
    wheels: "none",
    guardianStaysId: null,
    ...facts,
  };
}

type AdultFacts = Partial<Omit<CoverAdult, "capabilities">> & Partial<CoverAdult["capabilities"]>;

/** An adult who said yes, is cleared for years, and has no special skill. */
export function anAdult(name: string, facts: AdultFacts = {}): CoverAdult {
  const { guideSides = [], pushChair = false, firstAid = false, drive = false, ...rest } = facts;
  return {
    id: name.toLowerCase(),
    name,
    isAdult: true,
    answer: "yes",
    clearedUntil: "2029-12-31",
    familyId: null,
    guardianOf: [],
    role: "chaperone",
    capabilities: { guideSides, pushChair, firstAid, drive },
    ...rest,
  };
}

export const bothSides = { guideSides: ["left", "right"] } as const;

/** That many, named "Child 1" and so on. */
export function children(count: number, facts: Partial<CoverPerson> = {}, prefix = "Child"): CoverPerson[] {
  return Array.from({ length: count }, (_, at) => aPerson(`${prefix} ${at + 1}`, facts));
}

export function severalAdults(count: number, facts: AdultFacts = {}, prefix = "Adult"): CoverAdult[] {
  return Array.from({ length: count }, (_, at) => anAdult(`${prefix} ${at + 1}`, facts));
}

export function aDay(facts: Partial<CoverInput>): CoverInput {
  return { date: "2027-05-08", people: [], adults: [], pairings: [], policy: builtInPolicy, ...facts };
}

/** The one finding of a rule; fails when there are none or several. */
export function findingOf(verdict: CoverVerdict, rule: Finding["rule"]): Finding {
  const found = verdict.findings.filter((finding) => finding.rule === rule);
  const [only] = found;
  if (!only || found.length > 1) throw new Error(`Expected one finding of ${rule}, got ${found.length}.`);
  return only;
}

export function rulesWith(verdict: CoverVerdict, severity: Finding["severity"]): string[] {
  return verdict.findings.filter((finding) => finding.severity === severity).map((finding) => finding.rule);
}

/** Numbers in [0, 1) that are the same on every run (mulberry32). */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}
