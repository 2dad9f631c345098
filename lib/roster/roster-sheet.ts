import {
  joinWords,
  sortPeople,
  totalsInWords,
  travelLetters,
  travelWords,
} from "@/lib/roster/roster-facts";
import type { RosterAdult, RosterFacts, RosterPerson } from "@/lib/roster/roster-facts";
import { heading, list, note, paragraph, strongParagraph } from "@/lib/sheets/sheet";
import type { Block, Column, Entry, EntryLine, ListItem, Sheet, Table } from "@/lib/sheets/sheet";
import { counted } from "@/lib/shared/words";

/** `table`: one row a person, for a sighted leader. `blocks`: one block a person, for large print. */
export type RosterForm = "table" | "blocks";

/**
 * The roster as a sheet. Totals come first, then people whom nobody looks after yet, then the others by count-off
 * number, the adults with their people, the legend, and the caution. Both forms say the same.
 */
export function rosterSheet(facts: RosterFacts, form: RosterForm): Sheet {
  return {
    title: facts.outingTitle,
    language: "en-US",
    runningHead: `${facts.outingTitle}, ${facts.dateInWords}`,
    runningFoot: runningFoot(facts),
    blocks: [
      strongParagraph(totalsInWords(facts)),
      dayFacts(facts),
      ...peopleBlocks(facts, form),
      heading(2, "Head counts"),
      paragraph(
        "The leader calls the numbers and hears each reply; an adult at the tail counts bodies. Both must agree.",
      ),
      ...countBlocks(facts, form),
      heading(2, "Adults and their people"),
      ...adultBlocks(facts),
      heading(2, "What the words mean"),
      legend(form),
      caution(facts),
    ],
  };
}

function runningFoot(facts: RosterFacts): string {
  const people = counted(facts.people.length, "person", "people");
  const adults = counted(facts.adults.length, "adult", "adults");
  const printed = `Version ${facts.version}, printed ${facts.printedAtInWords}`;
  return `${people}, ${adults}. Base ${facts.basePhone}. ${printed}`;
}

function dayFacts(facts: RosterFacts): Block {
  return list("labelled", [
    { label: "When", text: `${facts.dateInWords}, ${facts.timesInWords}` },
    { label: "Where", text: facts.siteName },
    { label: "Meet at", text: facts.meetingPoint },
    { label: "Base", text: facts.basePhone },
    { label: "Roster", text: `${facts.programme}, version ${facts.version}, printed ${facts.printedAtInWords}` },
  ]);
}

function peopleBlocks(facts: RosterFacts, form: RosterForm): Block[] {
  const { withoutAdult, withAdult } = sortPeople(facts);
  const needing = counted(withoutAdult.length, "person needs", "people need");
  const first = withoutAdult.length === 0 ? [] : [
    heading(2, "No adult yet"),
    ...peopleIn(withoutAdult, `${needing} an adult before the group sets out.`, facts, form),
  ];
  if (withAdult.length === 0) return first;
  const caption = `${counted(withAdult.length, "person", "people")} with an adult, by number.`;
  return [...first, heading(2, "The group"), ...peopleIn(withAdult, caption, facts, form)];
}

function peopleIn(
  people: readonly RosterPerson[],
  caption: string,
  facts: RosterFacts,
  form: RosterForm,
): Block[] {
  if (form === "blocks") return [paragraph(caption), ...people.map((person) => personEntry(person, facts))];
  const columns: Column[] = [
    { header: "No.", kind: "number" },
    { header: "Name", kind: "name" },
    { header: "Adult", kind: "text" },
    { header: "Travel", kind: "text" },
    { header: "What to do", kind: "text" },
    ...facts.countPoints.map((_, at): Column => ({ header: countLetter(at), kind: "tick" })),
  ];
  const table: Table = {
    kind: "table",
    caption: facts.countPoints.length === 0 ? caption : `${caption} Ticks: ${countKey(facts)}.`,
    columns,
    rows: people.map((person) => [
      String(person.number),
      spokenName(person),
      adultOf(person, facts)?.name ?? "nobody yet",
      travelCodes(person),
      [...person.actionNotes, ...codes(person)].join("; ") || "nothing special",
      ...facts.countPoints.map(() => ""),
    ]),
  };
  return [table];
}

/** Letters keep the tick columns narrow and are no count-off numbers: A to Z, then AA. */
function countLetter(at: number): string {
  const letter = String.fromCharCode(65 + (at % 26));
  return at < 26 ? letter : `${countLetter(Math.floor(at / 26) - 1)}${letter}`;
}

function countKey(facts: RosterFacts): string {
  return facts.countPoints.map((point, at) => `${countLetter(at)}\u00A0${point}`).join(", ");
}

function personEntry(person: RosterPerson, facts: RosterFacts): Entry {
  const notes = [...person.actionNotes, ...codesInWords(person)];
  const lines: EntryLine[] = [
    { label: "Adult", text: adultOf(person, facts)?.name ?? "nobody yet" },
    { label: "Travel", text: travelInWords(person) },
    { label: "Do", text: notes.join("; ") || "nothing special" },
  ];
  const number = String(person.number);
  return { kind: "entry", number, name: spokenName(person), lines, ticks: facts.countPoints };
}

function spokenName(person: RosterPerson): string {
  return person.sayAs === undefined ? person.nameUsed : `${person.nameUsed} (say ${person.sayAs})`;
}

function adultOf(person: RosterPerson, facts: RosterFacts): RosterAdult | undefined {
  return facts.adults.find((adult) => adult.id === person.adultId);
}

function travelCodes(person: RosterPerson): string {
  const letters = person.travel.map((code) => travelLetters[code]);
  return [...letters, ...(person.supportLevel === "constant" ? ["1:1"] : [])].join(" ") || "alone";
}

function travelInWords(person: RosterPerson): string {
  const words = person.travel.length === 0 ? "alone" : joinWords(person.travel.map((code) => travelWords[code]));
  return person.supportLevel === "constant" ? `${words}; one adult all the time` : words;
}

/** A no-break space keeps "card 7" on one line. */
const cardWords = (person: RosterPerson) => (person.cardNumber === null ? [] : [`card\u00A0${person.cardNumber}`]);
const closeWords = (person: RosterPerson) => (person.supportLevel === "close" ? ["stay close"] : []);

function codes(person: RosterPerson): string[] {
  const flags = [
    person.photo === "no" ? "NP" : "",
    person.voice === "no" ? "NV" : "",
    person.checkIdList ? "PK" : "",
  ];
  return [...closeWords(person), ...cardWords(person), ...flags.filter(Boolean)];
}

function codesInWords(person: RosterPerson): string[] {
  const flags = [
    person.photo === "no" ? "no photo" : "",
    person.voice === "no" ? "no voice recording" : "",
    person.checkIdList ? "check ID list before hand-over" : "",
  ];
  return [...closeWords(person), ...cardWords(person), ...flags.filter(Boolean)];
}

function countBlocks(facts: RosterFacts, form: RosterForm): Block[] {
  const expected = String(facts.people.length);
  if (facts.countPoints.length === 0) return [paragraph(`Expect ${expected} at every count.`)];
  if (form === "blocks") {
    return facts.countPoints.map((point): Entry => ({
      kind: "entry",
      // No number: it could be taken for somebody's count-off number.
      number: "",
      name: point,
      lines: [
        { label: "Expect", text: expected },
        { label: "Called", writeHere: true },
        { label: "At the tail", writeHere: true },
      ],
      ticks: [],
    }));
  }
  return [{
    kind: "table",
    caption: "One row for each count.",
    columns: [
      { header: "Count", kind: "name" },
      { header: "Expect", kind: "number" },
      { header: "Called", kind: "write" },
      { header: "At the tail", kind: "write" },
      { header: "Time", kind: "write" },
    ],
    rows: facts.countPoints.map((point, at) => [`${countLetter(at)}, ${point}`, expected, "", "", ""]),
  }];
}

function adultBlocks(facts: RosterFacts): Block[] {
  if (facts.adults.length === 0) return [paragraph("No adult is on this roster yet.")];
  const items = facts.adults.map((adult): ListItem => {
    const theirs = sortPeople(facts).withAdult.filter((person) => person.adultId === adult.id);
    const people = theirs.map((person) => `${person.number}\u00A0${person.nameUsed}`);
    const can = adult.can.length === 0 ? "" : ` Can: ${adult.can.join(", ")}.`;
    const withWhom = people.length === 0 ? "with nobody in particular" : `with ${joinWords(people)}`;
    return { label: adult.name, text: `${adult.role}, ${withWhom}.${can}` };
  });
  return [list("labelled", items)];
}

function legend(form: RosterForm): Block {
  const card = form === "table" ? "card 7" : "card";
  const both: ListItem[] = [{ label: card, text: "see the sealed card of that number, kept by the medication lead" }];
  if (form === "blocks") {
    return list("labelled", [
      ...both,
      { label: "no voice recording", text: "keep this person's voice out of recordings that are kept" },
      { label: "check ID list", text: "ask for identification and look at the list before handing over" },
    ]);
  }
  return list("labelled", [
    { label: "G, C, D, W", text: "human guide, cane, dog guide, wheels" },
    { label: "1:1", text: "one adult all the time" },
    ...both,
    { label: "NP, NV", text: "no photo, no voice recording" },
    { label: "PK", text: "check ID list before hand-over" },
  ]);
}

function caution(facts: RosterFacts): Block {
  return note(
    "Before you rely on this",
    `This is the working list of ${facts.programme}. Follow each person's plan and the people qualified to carry it ` +
      `out. Hand people over only to somebody on the family's list, against photo identification. In an emergency call the local emergency number first, then the base at ${facts.basePhone}.`,
  );
}
