import type { SupportLevel } from "@/lib/cover/support-level";

/** What a family tells once about a child. Words are the trade's; each list's order is the order on the form. */

export const travelTools = ["walks", "long cane", "dog guide", "walker", "wheelchair"] as const;
export const chairMoves = ["pushed", "by hand, alone", "power"] as const;
export const transfers = ["alone", "with one adult", "with two adults or a lift", "stays in the chair", "not sure"] as const;
export const restAfter = ["10", "20", "40", "60", "not sure"] as const;
export const guideTimes = ["all the time", "uneven ground", "crowds", "roads", "new places", "only if I ask", "not needed", "not sure"] as const;
export const guideSides = ["left", "right", "either"] as const;
export const guideHolds = ["above the elbow", "wrist", "shoulder", "hand", "spoken directions only"] as const;
export const readingFormats = [
  "uncontracted braille",
  "contracted braille",
  "large print",
  "audio",
  "electronic text",
  "by phone",
  "none yet",
] as const;

export const supportInWords: Record<SupportLevel, string> = {
  constant: "Somebody with them all the time (one adult for one child)",
  close: "Somebody close by (one adult for two)",
  occasional: "Help now and then (one adult for four)",
  minimal: "Little or no extra help (one adult for five)",
};

export type Contact = { name: string; relationship: string; phone: string };
export type PickUpPerson = { name: string; relationship: string };

export type AccessProfile = {
  travel: (typeof travelTools)[number][];
  chair: (typeof chairMoves)[number] | null;
  transfer: (typeof transfers)[number] | null;
  restAfter: (typeof restAfter)[number];
  guideWhen: (typeof guideTimes)[number][];
  guideSide: (typeof guideSides)[number];
  guideHold: (typeof guideHolds)[number];
  support: SupportLevel;
  reading: (typeof readingFormats)[number];
  leaderNote: string;
  photo: "yes" | "no";
  voice: "yes" | "no";
  contacts: Contact[];
  pickUp: PickUpPerson[];
};

export type GuideNeed = "throughout" | "at-times" | "not-needed";

/** "Not sure" is counted as a need: the day is planned for it until somebody has talked to the family. */
export function guideNeedOf(profile: AccessProfile): GuideNeed {
  if (profile.guideWhen.every((when) => when === "not needed")) return "not-needed";
  if (profile.guideHold === "spoken directions only" && !profile.guideWhen.includes("all the time")) return "at-times";
  if (profile.guideWhen.includes("all the time")) return "throughout";
  return "at-times";
}

/** Who reads each part of the answers; stands beside the question. */
export const whoSees = {
  name: "the coordinator, the leader and the adults of the day",
  legal: "the coordinator",
  travel: "the coordinator, and the leader as a short note",
  guide: "the coordinator, and the leader as a short note",
  support: "the coordinator, and the leader as a short note",
  reading: "the coordinator",
  leaderNote: "the coordinator, and in these words on the leader's roster",
  media: "the coordinator; the leader sees only no photo, no voice",
  contacts: "the coordinator and the leader of the day",
  pickUp: "the coordinator and the leader of the day",
} as const;
