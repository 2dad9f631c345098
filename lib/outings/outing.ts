import { dayInWords, dayOf, hoursInWords } from "@/lib/shared/dates";

export const outingStates = ["draft", "open", "closed", "called off", "done"] as const;
export type OutingState = (typeof outingStates)[number];

export type Site = {
  id: string;
  slug: string;
  name: string;
  landManager: string;
  zone: string;
  ground: string;
  meetingPoint: string;
};

export type Outing = {
  id: string;
  slug: string;
  title: string;
  theme: string;
  summary: string;
  site: Site;
  startsAt: string;
  endsAt: string;
  seats: number;
  seatsFree: number;
  waiting: number;
  youngestAge: number;
  oldestAge: number;
  suggestedFeeCents: number;
  currency: string;
  policyId: string;
  meetingText: string;
  state: OutingState;
  calledOffBecause: string | null;
  edition: number;
  modelIds: string[];
};

/** What a visitor is told about room, computed, never stored: an open outing without a free seat is full. */
export type Room = "places left" | "full" | "closed" | "called off" | "done";

export function roomOf(outing: Outing, now: string): Room {
  if (outing.state === "called off") return "called off";
  if (outing.state === "done" || outing.endsAt <= now) return "done";
  if (outing.state !== "open" || outing.startsAt <= now) return "closed";
  return outing.seatsFree > 0 && outing.waiting === 0 ? "places left" : "full";
}

export function isPublic(outing: Outing): boolean {
  return outing.state !== "draft";
}

export function takesRegistrations(outing: Outing, now: string): boolean {
  const room = roomOf(outing, now);
  return room === "places left" || room === "full";
}

export function agesInWords({ youngestAge, oldestAge }: Pick<Outing, "youngestAge" | "oldestAge">): string {
  if (youngestAge <= 3 && oldestAge >= 18) return "all ages";
  return youngestAge === oldestAge ? `age ${youngestAge}` : `ages ${youngestAge} to ${oldestAge}`;
}

export function roomInWords(outing: Outing, now: string): string {
  const room = roomOf(outing, now);
  if (room === "places left") return outing.seatsFree === 1 ? "1 place left" : `${outing.seatsFree} places left`;
  if (room === "full") return "Full";
  if (room === "called off") return "Called off";
  return room === "done" ? "Over" : "Registration closed";
}

export function whenInWords({ startsAt, endsAt, site }: Pick<Outing, "startsAt" | "endsAt" | "site">): string {
  return `${dayInWords(startsAt, site.zone)}, ${hoursInWords(startsAt, endsAt, site.zone)}`;
}

export function outingDay(outing: Pick<Outing, "startsAt" | "site">): string {
  return dayOf(outing.startsAt, outing.site.zone);
}

/** "low-tide-at-heron-spit" */
export function slugFrom(title: string): string {
  const plain = title
    .normalize("NFKD")
    .replace(/\p{M}/gu, "")
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, "-")
    .replace(/^-+|-+$/g, "");
  return plain.slice(0, 60).replace(/-+$/, "") || "outing";
}
