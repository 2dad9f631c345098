import { z } from "zod";
import type { SupportLevel } from "./support-level";

/** What a figure rests on when nobody could point to a page for it. Shown as it stands. */
export const FROM_MEMORY = "from memory";
export const COMMON_PRACTICE = "common practice, no published source";


const source = z.string().trim().min(1, "Say where the figure comes from, or write “from memory”.");
const participantsPerAdult = z
  .int("Participants per adult is a whole number.")
  .min(1, "One adult looks after at least 1 participant.")
  .max(50, "One adult cannot look after more than 50 participants.");
const ageYears = z.int("Ages are whole years.").min(0).max(120);

export const ageBandSchema = z
  .strictObject({ fromAge: ageYears, toAge: ageYears, participantsPerAdult, source })
  .refine((band) => band.fromAge <= band.toAge, {
    message: "An age band starts at its younger age.",
    path: ["toAge"],
  });

const supportRatio = z.strictObject({ participantsPerAdult, source });

function bandsOverlap(bands: readonly { fromAge: number; toAge: number }[]): boolean {
  const inOrder = bands.toSorted((a, b) => a.fromAge - b.fromAge);
  return inOrder.some((band, at) => {
    const next = inOrder[at + 1];
    return next !== undefined && next.fromAge <= band.toAge;
  });
}

/**
 * A programme's cover policy as data. Ages in whole years, both ends of a band included; ratios as participants
 * per one adult. Each figure carries its source. An edit is a new `version`; a policy is never changed in place.
 */
export const coverPolicySchema = z.strictObject({
  key: z.string().regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, "A key has small letters, digits and hyphens."),
  version: z.int().min(1),
  name: z.string().trim().min(1, "Give the policy a name."),
  ageBands: z
    .array(ageBandSchema)
    .min(1, "A policy needs at least one age band.")
    .refine((bands) => !bandsOverlap(bands), "Two age bands share an age. Each age belongs to one band."),
  supportRatios: z.strictObject({
    constant: supportRatio.refine((ratio) => ratio.participantsPerAdult === 1, {
      message: "Constant support is always one adult for one person.",
      path: ["participantsPerAdult"],
    }),
    close: supportRatio,
    occasional: supportRatio,
    minimal: supportRatio,
  }),
  minimumAdults: z.strictObject({
    unrelatedAdults: z.int().min(2, "At least two unrelated adults come on every outing.").max(50),
    source,
  }),
  /** Whether the adult who runs the day counts towards supervision and support. */
  leaderCounts: z.strictObject({ counts: z.boolean(), source }),
  /**
   * Whether an adult who guides one person all the time, or pushes a chair, is fully used by it. When not, such
   * an adult still has no second person to guide or push, but counts for others' supervision and support.
   */
  handsOnTakesWholeAdult: z.strictObject({ applies: z.boolean(), source }),
  adultAge: z.strictObject({ years: z.int().min(16).max(30), source }),
  roleNeeds: z.strictObject({ firstAiders: z.strictObject({ adults: z.int().min(0).max(50), source }) }),
});

export type CoverPolicy = z.infer<typeof coverPolicySchema>;
export type AgeBand = CoverPolicy["ageBands"][number];

const DAY_CAMP_SOURCE =
  "American Camp Association day-camp minimum, as reported by " +
  "https://www.washingtonfamily.com/10-questions-for-camp-directors-2/ and " +
  "https://tpgonlinedaily.com/choosing-a-summer-camp";

const SEVERE_NEEDS_SOURCE =
  "American Camp Association, 1:1 for severe needs, as reported by " +
  "https://www.washingtonfamily.com/10-questions-for-camp-directors-2/";

/**
 * The policy a new programme starts with: the published day-camp ratios by age, and the support ratios used in
 * camps for disabled campers. Read the sources: some figures are from memory and say so.
 */
export const builtInPolicy: CoverPolicy = {
  key: "day-camp",
  version: 1,
  name: "Day camp ratios",
  ageBands: [
    { fromAge: 0, toAge: 5, participantsPerAdult: 6, source: FROM_MEMORY },
    { fromAge: 6, toAge: 8, participantsPerAdult: 8, source: DAY_CAMP_SOURCE },
    { fromAge: 9, toAge: 14, participantsPerAdult: 10, source: DAY_CAMP_SOURCE },
    { fromAge: 15, toAge: 18, participantsPerAdult: 12, source: DAY_CAMP_SOURCE },
  ],
  supportRatios: {
    constant: { participantsPerAdult: 1, source: SEVERE_NEEDS_SOURCE },
    close: { participantsPerAdult: 2, source: FROM_MEMORY },
    occasional: { participantsPerAdult: 4, source: FROM_MEMORY },
    minimal: { participantsPerAdult: 5, source: FROM_MEMORY },
  },
  minimumAdults: {
    unrelatedAdults: 2,
    source: "Two unrelated adults, as in https://www.uua.org/safe/youth/unrelated-adults",
  },
  leaderCounts: { counts: true, source: COMMON_PRACTICE },
  handsOnTakesWholeAdult: { applies: true, source: COMMON_PRACTICE },
  adultAge: { years: 18, source: FROM_MEMORY },
  roleNeeds: { firstAiders: { adults: 1, source: COMMON_PRACTICE } },
};

/** The band an age falls in, or undefined when the policy has none for it. */
export function ageBandFor(policy: CoverPolicy, age: number): AgeBand | undefined {
  const whole = Math.floor(age);
  return policy.ageBands.find((band) => band.fromAge <= whole && whole <= band.toAge);
}

/**
 * How many participants like this one adult can look after: the stricter of the support level's ratio and the
 * age band's. An age without a band is judged by the support level alone (and reported elsewhere).
 */
export function participantsPerAdultFor(
  policy: CoverPolicy,
  person: { ageYears: number; supportLevel: SupportLevel },
): number {
  const byLevel = policy.supportRatios[person.supportLevel].participantsPerAdult;
  const byAge = ageBandFor(policy, person.ageYears)?.participantsPerAdult ?? byLevel;
  return Math.min(byLevel, byAge);
}
