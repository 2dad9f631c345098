import { describe, expect, it } from "vitest";
import { checkCover } from "@/lib/cover/check-cover";
import type { CoverPerson } from "@/lib/cover/cover";
import { aDay, anAdult, aPerson, bothSides, findingOf, rulesWith } from "./cover-day";

const adults = [
  anAdult("Ines", { ...bothSides, firstAid: true }),
  anAdult("Jonah", { pushChair: true, guideSides: ["left"] }),
  anAdult("Otto"),
  anAdult("Rui"),
  anAdult("Mina", { answer: "maybe" }),
  anAdult("Noa", { role: "guardian", clearedUntil: null, guardianOf: ["ada"] }),
];

/** "ada+ines" pairs Ada with Ines. */
function paired(people: CoverPerson[], ...pairs: string[]) {
  const pairings = pairs.map((pair) => {
    const [personId = "", adultId = ""] = pair.split("+");
    return { personId, adultId };
  });
  return checkCover(aDay({ people, adults, pairings }));
}

const [ada, bram, cai] = [aPerson("Ada"), aPerson("Bram"), aPerson("Cai")];

describe("pairings", () => {
  it("that all hold are said to", () => {
    const verdict = paired([ada, bram, cai], "ada+ines", "bram+ines", "cai+otto");
    expect(findingOf(verdict, "pairings-hold").sentence).toBe("Every pairing holds: 3 people with 2 adults.");
    expect(verdict.covered).toBe(true);
  });

  it("none yet is no finding", () => {
    expect(paired([ada]).findings.filter((finding) => finding.rule.startsWith("pairing"))).toEqual([]);
  });

  it("an adult one to one with someone has nobody else", () => {
    const dov = aPerson("Dov", { supportLevel: "constant" });
    const verdict = paired([dov, ada, bram], "dov+ines", "ada+ines", "bram+otto");
    const finding = findingOf(verdict, "pairing-one-to-one");
    expect(finding).toMatchObject({ severity: "stops", needed: 2, have: 1, short: 1, adults: ["ines"] });
    expect(finding.sentence).toBe("Dov needs an adult of their own, but Ines also has Ada.");
    expect(finding.action).toBe("Give Ada another adult.");
    expect(verdict.sentence).toBe("Not covered yet. Dov needs an adult of their own, but Ines also has Ada.");
    expect(rulesWith(paired([dov, ada], "dov+ines", "ada+otto"), "stops")).toEqual([]);
  });

  it("nobody guides two", () => {
    const people = [aPerson("Eli", { guide: "throughout" }), aPerson("Fay", { guide: "throughout" })];
    const finding = findingOf(paired(people, "eli+ines", "fay+ines"), "pairing-one-to-one");
    expect(finding.sentence).toBe("Eli and Fay each need an adult of their own, but Ines has 2 people.");
    expect(finding.action).toBe("Give Fay another adult.");
  });

  it("a load of one adult exactly holds, a twentieth more does not", () => {
    const close = aPerson("Gus", { supportLevel: "close" });
    const quarters = [aPerson("Hal", { supportLevel: "occasional" }), aPerson("Ivy", { supportLevel: "occasional" })];
    const exact = paired([close, ...quarters], "gus+ines", "hal+ines", "ivy+ines");
    expect(rulesWith(exact, "stops")).toEqual([]);
    const over = paired([close, ...quarters, ada], "gus+ines", "hal+ines", "ivy+ines", "ada+ines");
    const finding = findingOf(over, "pairing-load");
    expect(finding).toMatchObject({ severity: "stops", needed: 2, have: 1, short: 1 });
    expect(finding.sentence).toBe("Ines has 4 people who together need 1 1/5 adults.");
  });

  it("the same pairing twice is one", () => {
    expect(rulesWith(paired([aPerson("Dov", { supportLevel: "constant" })], "dov+otto", "dov+otto"), "stops")).toEqual([]);
  });

  it("with an adult who does not count are found, and it says why", () => {
    const finding = findingOf(paired([ada, bram], "ada+mina", "bram+mina"), "pairing-adult-counts");
    expect(finding.sentence).toBe("Ada and Bram are with Mina, who does not count. Said maybe.");
    expect(finding.action).toBe("Give Ada and Bram another adult.");
  });

  it("a guardian without a clearance may have their own child and no other", () => {
    const finding = findingOf(paired([ada, bram], "ada+noa", "bram+noa"), "pairing-adult-counts");
    expect(finding.people).toEqual(["bram"]);
    expect(finding.sentence).toBe(
      "Bram is with Noa, who counts for their own child only. Has no clearance on file.",
    );
  });

  it("a guide on the wrong side is found", () => {
    const eli = aPerson("Eli", { guide: "throughout", guideSide: "right" });
    const finding = findingOf(paired([eli], "eli+jonah"), "pairing-guide");
    expect(finding.sentence).toBe("Eli needs a guide on the right arm, and Jonah does not do that.");
    expect(rulesWith(paired([eli], "eli+ines"), "stops")).toEqual([]);
  });

  it("an adult who does not push is found beside a chair that is pushed", () => {
    const wren = aPerson("Wren", { wheels: "pushed" });
    expect(findingOf(paired([wren], "wren+otto"), "pairing-chair").sentence).toBe(
      "Wren needs a chair pushed, and Otto does not do that.",
    );
    expect(rulesWith(paired([wren], "wren+jonah"), "stops")).toEqual([]);
  });

  it("with someone who is not on the outing are found", () => {
    const finding = findingOf(paired([ada], "ada+ghost", "ghost+ines"), "pairing-known");
    expect(finding).toMatchObject({ severity: "stops", short: 2 });
    expect(finding.sentence).toBe("2 pairings name someone who is not on the outing.");
  });

  it("warn about people who have no adult yet", () => {
    const verdict = paired([ada, bram], "ada+ines");
    const finding = findingOf(verdict, "pairing-everyone");
    expect(finding).toMatchObject({ severity: "warns", needed: 2, have: 1, short: 1, people: ["bram"] });
    expect(finding.sentence).toBe("Bram has no adult yet.");
    expect(verdict.covered).toBe(true);
  });
});
