import { describe, expect, it } from "vitest";
import { checkNeverOnPaper, neverOnPaper } from "@/lib/roster/never-on-paper";
import { rosterSheet } from "@/lib/roster/roster-sheet";
import { person, saltgrassRoster } from "@/tests/unit/roster/saltgrass-roster";

function findingsFor(note: string) {
  const facts = saltgrassRoster({ people: [person(1, "Amaya R", { actionNotes: [note] })] });
  return checkNeverOnPaper(rosterSheet(facts, "blocks"), [facts.basePhone, facts.dateInWords, facts.printedAtInWords]);
}

describe("what must never be on paper", () => {
  it.each([
    ["diagnosis", "has epilepsy"],
    ["diagnosis", "diagnosed last year"],
    ["medication", "5 mg at noon"],
    ["medication", "carries an inhaler"],
    ["toileting", "needs help at the toilet"],
    ["custody", "court order on file"],
    ["address", "lives at 12 Old Ferry Road"],
    ["address", "WA 98101"],
    ["birth-date", "born in spring"],
    ["birth-date", "3/5/2014"],
    ["birth-date", "5 May 2014"],
    ["identity-numbers", "insurance card in the bag"],
    ["identity-numbers", "123-45-6789"],
    ["money", "no-fee place"],
    ["money", "owes $20"],
    ["clearance", "background check pending"],
    ["behaviour", "tantrums when tired"],
    ["photo-reason", "no photo because of a hearing"],
    ["guardian-remark", "told us in confidence"],
    ["phone", "call 206 555 0199"],
    ["phone", "call (206) 555-0199"],
    ["e-mail", "robin@example.org"],
  ])("finds %s in “%s”", (id, note) => {
    const finding = findingsFor(note).find((one) => one.id === id);
    expect(finding?.where).toBe("the entry of number 1");
    expect(finding?.sentence).toContain(`“${finding?.found ?? ""}” in the entry of number 1 looks like`);
  });

  it.each(["shade every 20 minutes", "guide on her right", "card 7", "speak first, then offer the back of your hand",
    "sit down every 10 minutes, at 7:30 and 8:15", "sees steps on the left", "meets at post 1204"])(
    "lets the action “%s” pass",
    (note) => {
      expect(findingsFor(note)).toEqual([]);
    },
  );

  it("knows the base's phone and finds every other", () => {
    const facts = saltgrassRoster();
    const found = checkNeverOnPaper(rosterSheet(facts, "table"), [facts.dateInWords, facts.printedAtInWords]);
    expect(new Set(found.map(({ id, found: text }) => `${id} ${text}`))).toEqual(new Set(["phone 360 555 0142"]));
  });

  it("has for each thing a name of its own, an alternative and something to look for", () => {
    expect(new Set(neverOnPaper.map(({ id }) => id)).size).toBe(neverOnPaper.length);
    expect(neverOnPaper.filter((rule) => rule.instead === "" || rule.patterns.length === 0)).toEqual([]);
  });
});
