import type { CoverPolicy } from "./cover-policy";
import type { SupportLevel } from "./support-level";

/** Shown wherever a verdict on cover is shown. */
export const COVER_CAUTION =
  "These ratios are the programme’s policy, built on published camp standards. Licensing rules, the land " +
  "agency’s terms and the judgement of qualified staff come first.";

export type GuideSide = "left" | "right";

/** Someone the outing takes along: a registered child or teenager, or a sibling without an adult of their own. */
export type CoverPerson = {
  id: string;
  name: string;
  /** Whole years on the day of the outing. */
  ageYears: number;
  supportLevel: SupportLevel;
  guide: "throughout" | "at-times" | "not-needed";
  /** The arm of the guide that this person holds. */
  guideSide: GuideSide | "either";
  /** "pushed" is a chair that an adult has to push; the rest need no hands. */
  wheels: "none" | "pushed" | "self" | "power";
  /** The adult of the family who stays for the day, or null. */
  guardianStaysId: string | null;
};

export type CoverAdult = {
  id: string;
  name: string;
  /** At least the policy's adult age on the day. */
  isAdult: boolean;
  answer: "asked" | "yes" | "maybe" | "no";
  /** Last day the clearance is valid, YYYY-MM-DD, or null when there is none. */
  clearedUntil: string | null;
  /** Adults with the same family id are related. Null is related to nobody. */
  familyId: string | null;
  /** People this adult is a guardian of. */
  guardianOf: readonly string[];
  role: "leader" | "chaperone" | "guardian";
  drivesWholeDay?: boolean;
  capabilities: {
    /** Sides on which this adult can be held as a sighted guide; none: does not guide. */
    guideSides: readonly GuideSide[];
    pushChair: boolean;
    firstAid: boolean;
    drive: boolean;
  };
  /**
   * Never read by the count: a blind adult counts in full. Guiding and driving are capabilities of their own and
   * are never guessed from this.
   */
  isBlind?: boolean;
};

/** This adult looks after this person on the day. */
export type Pairing = { personId: string; adultId: string };

export type CoverInput = {
  /** The day of the outing at the site, YYYY-MM-DD. */
  date: string;
  people: readonly CoverPerson[];
  adults: readonly CoverAdult[];
  pairings: readonly Pairing[];
  policy: CoverPolicy;
};

export const coverQuestions = [
  "supervision",
  "support",
  "guides",
  "roles",
  "two-adults",
  "cancellation",
] as const;
export type CoverQuestion = (typeof coverQuestions)[number];

export type FindingRule =
  | "date-readable"
  | "people-registered"
  | "person-listed-once"
  | "adult-listed-once"
  | "age-has-ratio"
  | "ratio-by-age"
  | "ratio-by-support"
  | "one-to-one-together"
  | "guide-for-each"
  | "guide-at-times"
  | "chair-pusher-for-each"
  | "first-aider"
  | "two-unrelated-adults"
  | "pairing-known"
  | "pairing-adult-counts"
  | "pairing-one-to-one"
  | "pairing-load"
  | "pairing-guide"
  | "pairing-chair"
  | "pairing-everyone"
  | "pairings-hold"
  | "one-adult-cancels";

export type Finding = {
  rule: FindingRule;
  question: CoverQuestion;
  /** "stops": the outing is not covered. "warns": it is, but look. "met": the rule holds. */
  severity: "stops" | "warns" | "met";
  /** Counted in adults, unless the sentence says otherwise. `short` is never negative. */
  needed: number;
  have: number;
  short: number;
  /** Ids of the people it is about. */
  people: readonly string[];
  /** Ids of the adults it is about. */
  adults: readonly string[];
  sentence: string;
  /** One thing to do, in plain words; null when there is nothing to do. */
  action: string | null;
  source: string;
};

export type NotCountingCode =
  | "under-age"
  | "not-answered"
  | "maybe"
  | "said-no"
  | "no-clearance"
  | "clearance-ends"
  | "drives"
  | "leader";

/**
 * "counts": in full. "own-child-only": a guardian without a clearance for the day. "roles-only": the leader, where
 * the policy does not count the leader, who may still be the first aider. "does-not-count": for nothing.
 */
export type Standing = "counts" | "own-child-only" | "roles-only" | "does-not-count";

export type AdultStanding = {
  adultId: string;
  name: string;
  counts: boolean;
  standing: Standing;
  /** Why not, in words, one sentence each; empty for an adult who counts. */
  reasons: readonly { code: NotCountingCode; sentence: string }[];
  /** All of it in words, also for an adult who counts. */
  sentence: string;
};

/**
 * The fewest adults whose coming would make the numbers right, by what each must be able to do. The kinds do not
 * overlap: a missing guide who comes also counts as an adult, so is not asked for twice.
 */
export type Shortage = {
  guides: number;
  chairPushers: number;
  /** Able to guide or push: each is enough alone, but the same adults are wanted for both. */
  oneToOneAdults: number;
  adults: number;
  /** From another family than those who come. */
  unrelatedAdults: number;
  /** A skill, not a seat: an adult who comes anyway may have it. */
  firstAiders: number;
};

export type CoverVerdict = {
  covered: boolean;
  sentence: string;
  counts: { people: number; adultsWhoCount: number; neededAdults: number };
  shortage: Shortage;
  adults: readonly AdultStanding[];
  /** In the order of the questions. Rules that hold are there too, as "met". */
  findings: readonly Finding[];
};
