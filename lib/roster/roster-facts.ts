/** What a roster says, the same in every form. Nothing of `never-on-paper.ts` may be in it. */

import { counted } from "@/lib/shared/words";
import type { SupportLevel } from "@/lib/cover/support-level";

export type TravelCode = "guide" | "cane" | "dog" | "wheels";

export type RosterPerson = {
  /** The count-off number, the same in every form; gaps are possible. */
  readonly number: number;
  readonly nameUsed: string;
  /** How to say the name, where the family told it. */
  readonly sayAs?: string;
  readonly adultId: string | null;
  readonly travel: readonly TravelCode[];
  readonly supportLevel: SupportLevel;
  /** Actions such as "shade every 20 minutes", never causes. */
  readonly actionNotes: readonly string[];
  readonly cardNumber: number | null;
  readonly photo: "ok" | "no";
  readonly voice: "ok" | "no";
  /** Check the list of who may collect the person before handing over. */
  readonly checkIdList: boolean;
};

export type RosterAdult = {
  readonly id: string;
  readonly name: string;
  readonly role: "leader" | "chaperone" | "guardian";
  /** What the adult can do on the day, in words: "guides", "first aid". */
  readonly can: readonly string[];
  readonly phone?: never;
};

export type RosterFacts = {
  readonly programme: string;
  readonly outingTitle: string;
  readonly siteName: string;
  readonly dateInWords: string;
  readonly timesInWords: string;
  readonly meetingPoint: string;
  readonly version: number;
  readonly printedAtInWords: string;
  /** ISO 8601 instant. */
  readonly printedAt: string;
  readonly basePhone: string;
  readonly people: readonly RosterPerson[];
  readonly adults: readonly RosterAdult[];
  /** When the group is counted, in order: "Meeting point", "Boardwalk", "Back at the bus". */
  readonly countPoints: readonly string[];
};

export const travelWords: Readonly<Record<TravelCode, string>> = {
  guide: "human guide",
  cane: "cane",
  dog: "dog guide",
  wheels: "wheels",
};

export const travelLetters: Readonly<Record<TravelCode, string>> = { guide: "G", cane: "C", dog: "D", wheels: "W" };

/** The people in the order of their numbers: those nobody looks after yet, and the others. */
export function sortPeople(facts: RosterFacts): {
  readonly withoutAdult: readonly RosterPerson[];
  readonly withAdult: readonly RosterPerson[];
} {
  const known = new Set(facts.adults.map((adult) => adult.id));
  const people = facts.people.toSorted((one, other) => one.number - other.number);
  const isLookedAfter = (person: RosterPerson) => person.adultId !== null && known.has(person.adultId);
  return {
    withoutAdult: people.filter((person) => !isLookedAfter(person)),
    withAdult: people.filter(isLookedAfter),
  };
}

/** The numbers from 1 to the highest that nobody has, so that a gap in the count-off alarms nobody. */
export function numbersNobodyHas(facts: RosterFacts): number[] {
  const taken = new Set(facts.people.map((person) => person.number));
  const highest = Math.max(0, ...taken);
  return Array.from({ length: highest }, (_, at) => at + 1).filter((number) => !taken.has(number));
}

/** "12 people and 5 adults. Numbers 1 to 13; nobody has 4." */
export function totalsInWords(facts: RosterFacts): string {
  const people = counted(facts.people.length, "person", "people");
  const adults = counted(facts.adults.length, "adult", "adults");
  if (facts.people.length === 0) return `Nobody is on this roster yet; ${adults}.`;
  const highest = Math.max(...facts.people.map((person) => person.number));
  const missing = numbersNobodyHas(facts);
  const gaps = missing.length === 0 ? "every number is taken" : `nobody has ${joinWords(missing.map(String))}`;
  const range = highest === 1 ? "Number 1" : `Numbers 1 to ${highest}`;
  return `${people} and ${adults}. ${range}; ${gaps}.`;
}

/** "a", "a and b", "a, b and c". */
export function joinWords(words: readonly string[]): string {
  if (words.length < 2) return words.join("");
  return `${words.slice(0, -1).join(", ")} and ${words.at(-1) ?? ""}`;
}
