import type { RosterAdult, RosterFacts, RosterPerson } from "@/lib/roster/roster-facts";

/** Invented people of the Saltgrass Listening Club; number 4 is free, numbers 6 and 11 have no adult. */
export const adults: readonly RosterAdult[] = [
  { id: "dee", name: "Dee Okafor", role: "leader", can: ["first aid", "guides"] },
  { id: "marcus", name: "Marcus Hale", role: "chaperone", can: ["guides"] },
  { id: "pia", name: "Pia Lindqvist", role: "guardian", can: [] },
];

export function person(number: number, nameUsed: string, more: Partial<RosterPerson> = {}): RosterPerson {
  return {
    number, nameUsed, adultId: "dee", travel: [], supportLevel: "minimal", actionNotes: [], cardNumber: null,
    photo: "ok", voice: "ok", checkIdList: false, ...more,
  };
}

export const saltgrassPeople: readonly RosterPerson[] = [
  person(2, "Tomás L", { adultId: "marcus", travel: ["cane"], photo: "no" }),
  person(1, "Amaya R", { travel: ["guide", "cane"], supportLevel: "constant", actionNotes: ["guide on her right"] }),
  person(3, "Ngọc Nguyễn", { sayAs: "nop win", adultId: "pia", travel: ["wheels"], cardNumber: 7, checkIdList: true }),
  person(5, "Łucja K", { travel: ["dog"], voice: "no", actionNotes: ["shade every 20 minutes"] }),
  person(6, "Idris B", { adultId: null }),
  person(11, "Wren O", { adultId: "somebody who withdrew" }),
];

export function saltgrassRoster(more: Partial<RosterFacts> = {}): RosterFacts {
  return {
    programme: "Saltgrass Listening Club",
    outingTitle: "Dawn chorus at Alder Bog",
    siteName: "Alder Bog Boardwalk",
    dateInWords: "Saturday 14 March 2026",
    timesInWords: "6:10 a.m. to 10:00 a.m.",
    meetingPoint: "the bench under the bell at the east gate",
    version: 3,
    printedAtInWords: "Thursday 12 March 2026 at 6:10 p.m.",
    printedAt: "2026-03-13T01:10:00Z",
    basePhone: "360 555 0142",
    people: saltgrassPeople,
    adults,
    countPoints: ["Gate", "Boardwalk"],
    ...more,
  };
}

/** A roster of as many people as asked for. */
export function rosterOf(count: number): RosterFacts {
  const people = Array.from({ length: count }, (_, at) =>
    person(at + 1, `Robin ${at + 1}`, {
      adultId: at % 2 === 0 ? "dee" : "marcus",
      travel: ["cane"],
      actionNotes: ["shade every 20 minutes"],
    }),
  );
  return saltgrassRoster({ people });
}
