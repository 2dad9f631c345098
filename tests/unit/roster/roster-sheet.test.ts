import { describe, expect, it } from "vitest";
import { totalsInWords } from "@/lib/roster/roster-facts";
import { checkNeverOnPaper } from "@/lib/roster/never-on-paper";
import { rosterSheet } from "@/lib/roster/roster-sheet";
import { sheetTexts } from "@/lib/sheets/sheet";
import type { Entry, Table } from "@/lib/sheets/sheet";
import { toPdf } from "@/lib/sheets/to-pdf";
import { checkPdfConditions } from "@/tests/support/pdf-conditions";
import { person, rosterOf, saltgrassRoster } from "@/tests/unit/roster/saltgrass-roster";

const forms = ["table", "blocks"] as const;

function numbersAndNames(form: (typeof forms)[number], facts = saltgrassRoster()): string[][] {
  const { blocks } = rosterSheet(facts, form);
  if (form === "blocks") {
    const entries = blocks.filter((block): block is Entry => block.kind === "entry" && block.number !== "");
    return entries.map((entry) => [entry.number, entry.name]);
  }
  const tables = blocks.filter((block): block is Table => block.kind === "table" && block.columns[0]?.header === "No.");
  return tables.flatMap((table) => table.rows.map((row) => [row[0] ?? "", row[1] ?? ""]));
}

function allText(form: (typeof forms)[number], facts = saltgrassRoster()): string {
  return sheetTexts(rosterSheet(facts, form)).map(({ text }) => text.replaceAll("\u00A0", " ")).join("\n");
}

describe("the roster", () => {
  it("gives everyone the same number in every form, people without an adult first", () => {
    expect(numbersAndNames("table")).toEqual(numbersAndNames("blocks"));
    expect(numbersAndNames("table").map(([number]) => number)).toEqual(["6", "11", "1", "2", "3", "5"]);
  });

  it("says which numbers nobody has, so that a gap alarms nobody", () => {
    expect(totalsInWords(saltgrassRoster())).toBe(
      "6 people and 3 adults. Numbers 1 to 11; nobody has 4, 7, 8, 9 and 10.",
    );
    expect(totalsInWords(rosterOf(1))).toBe("1 person and 3 adults. Number 1; every number is taken.");
    expect(totalsInWords(rosterOf(0))).toBe("Nobody is on this roster yet; 3 adults.");
  });

  it.each(forms)("says as %s what to do with codes or words for it, and names the adult", (form) => {
    const text = allText(form);
    for (const words of ["guide on her right", "card 7", "Ngọc Nguyễn (say nop win)", "Marcus Hale", "nobody yet"]) {
      expect(text).toContain(words);
    }
    expect(text).toContain(form === "table" ? "G C 1:1" : "human guide and cane; one adult all the time");
    expect(text).toContain(form === "table" ? "card 7; PK" : "check ID list before hand-over");
  });

  it.each(forms)("carries as %s its version, its printing time, the base and the caution", (form) => {
    const text = allText(form);
    expect(text).toContain("Saltgrass Listening Club, version 3, printed Thursday 12 March 2026 at 6:10 p.m.");
    expect(text).toContain("In an emergency call the local emergency number first, then the base at 360 555 0142.");
    expect(text).toContain("This is the working list of Saltgrass Listening Club.");
    const sheet = rosterSheet(saltgrassRoster(), form);
    expect(sheet.runningHead).toContain("Saturday 14 March 2026");
    expect(sheet.runningFoot).toContain("6 people, 3 adults. Base 360 555 0142");
  });

  it.each(forms)("lists as %s each adult with their people", (form) => {
    expect(allText(form)).toContain("Dee Okafor: leader, with 1 Amaya R and 5 Łucja K. Can: first aid, guides.");
  });

  it.each(forms)("leaves out as %s what must never be on paper", (form) => {
    const facts = saltgrassRoster();
    const known = [facts.basePhone, facts.dateInWords, facts.printedAtInWords];
    expect(checkNeverOnPaper(rosterSheet(facts, form), known)).toEqual([]);
  });

  it.each([["table", 14], ["blocks", 18], ["blocks", 28]] as const)(
    "prints as %s at %d points with the conditions of a tagged document",
    async (form, textSizePt) => {
      const options = { paper: "letter", textSizePt, printedAt: "2026-03-13T01:10:00Z" } as const;
      for (const facts of [saltgrassRoster(), rosterOf(0), saltgrassRoster({ countPoints: [], adults: [] })]) {
        expect(checkPdfConditions(await toPdf(rosterSheet(facts, form), options))).toEqual([]);
      }
    },
  );

  it("prints 300 people and a name of 200 characters", async () => {
    const facts = rosterOf(299);
    const long = person(300, "Wren ".repeat(40).trim());
    for (const form of forms) {
      const sheet = rosterSheet({ ...facts, people: [...facts.people, long] }, form);
      const bytes = await toPdf(sheet, { paper: "a4", textSizePt: form === "table" ? 14 : 24, printedAt: facts.printedAt });
      expect(checkPdfConditions(bytes)).toEqual([]);
    }
  }, 60_000);
});
