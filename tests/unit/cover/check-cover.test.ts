import { describe, expect, it } from "vitest";
import { checkCover } from "@/lib/cover/check-cover";
import { COVER_CAUTION } from "@/lib/cover/cover";
import { builtInPolicy } from "@/lib/cover/cover-policy";
import { workedMixedAges } from "@/tests/reference/day-camp-ratios";
import { aDay, anAdult, aPerson, bothSides, children, findingOf, rulesWith, severalAdults } from "./cover-day";

/** Eleven children as they come: four walk on an arm all day, three want one at times, four ask for little. */
const elevenChildren = [
  aPerson("Ada", { ageYears: 7 }),
  aPerson("Bram", { guide: "throughout", ageYears: 8 }),
  aPerson("Cai", { supportLevel: "occasional" }),
  aPerson("Dov", { guide: "throughout", supportLevel: "constant" }),
  aPerson("Esi", { guide: "at-times", ageYears: 12 }),
  aPerson("Finn", { guide: "throughout" }),
  aPerson("Amaya", { guide: "throughout", guideSide: "right" }),
  aPerson("Sefa", { guide: "at-times" }),
  aPerson("Uma"),
  aPerson("Pim", { ageYears: 15 }),
  aPerson("Wren", { wheels: "self", guide: "at-times" }),
];

const sixAdults = [
  anAdult("Tove", { role: "leader", isBlind: true, familyId: "lindqvist", firstAid: true }),
  anAdult("Ines", { ...bothSides, firstAid: true }),
  anAdult("Jonah", { ...bothSides, pushChair: true }),
  anAdult("Lio", { guideSides: ["left"] }),
  anAdult("Mina", { guideSides: ["right"] }),
  anAdult("Otto"),
];

describe("a real day of eleven children", () => {
  it("is covered by six adults of whom four guide the four who need it", () => {
    const verdict = checkCover(aDay({ people: elevenChildren, adults: sixAdults }));
    // By support: four one to one, and 1/4 + 6/5 = 1 9/20 for the other seven, so two. By age: one per band.
    expect(verdict.counts).toEqual({ people: 11, adultsWhoCount: 6, neededAdults: 6 });
    expect(findingOf(verdict, "ratio-by-age")).toMatchObject({ needed: 3, have: 6 });
    expect(verdict.covered).toBe(true);
    expect(verdict.sentence).toBe("Covered: 11 people, 6 adults who count.");
  });

  it("has nothing that stops or warns when one more guide has come", () => {
    const verdict = checkCover(aDay({ people: elevenChildren, adults: [...sixAdults, anAdult("Rui", bothSides)] }));
    expect(rulesWith(verdict, "warns")).toEqual([]);
    expect(verdict.sentence).toBe("Covered: 11 people, 7 adults who count.");
    expect(rulesWith(verdict, "stops")).toEqual([]);
  });

  it("is short by one guide when a fifth child needs one, and asks for no other adult beside", () => {
    const people = elevenChildren.map((person) =>
      person.name === "Sefa" ? { ...person, guide: "throughout" as const } : person,
    );
    const verdict = checkCover(aDay({ people, adults: sixAdults }));
    expect(verdict.covered).toBe(false);
    expect(verdict.sentence).toBe("Short by one guide.");
    expect(findingOf(verdict, "ratio-by-support").short).toBe(1);
    const guides = findingOf(verdict, "guide-for-each");
    expect(guides).toMatchObject({ needed: 5, have: 4, short: 1, severity: "stops", action: "Find one more adult who guides." });
    expect(guides.sentence).toBe(
      "5 people (Bram, Dov, Finn and 2 more) need a guide all the time, but only Ines, Jonah, Lio and Mina can guide them.",
    );
  });
});

describe("supervision by age", () => {
  it.each(workedMixedAges)("$children need $adults adults", ({ children: bands, adults }) => {
    const people = bands.flatMap(({ count, age }) => children(count, { ageYears: age }, `Aged ${age}`));
    const policy = builtInPolicy;
    const enough = checkCover(aDay({ people, adults: severalAdults(adults), policy }));
    expect(findingOf(enough, "ratio-by-age")).toMatchObject({ needed: adults, have: adults, severity: "met" });
    const oneLess = checkCover(aDay({ people, adults: severalAdults(adults - 1), policy }));
    expect(findingOf(oneLess, "ratio-by-age")).toMatchObject({ short: 1, severity: "stops" });
    expect(oneLess.covered).toBe(false);
  });

  it("says how the number comes about, and one thing to do", () => {
    const people = [...children(11, { ageYears: 6 }, "Six"), ...children(11, { ageYears: 10 }, "Ten")];
    const verdict = checkCover(aDay({ people, adults: severalAdults(3) }));
    const finding = findingOf(verdict, "ratio-by-age");
    expect(finding.sentence).toBe(
      "By age the day needs 4 adults: 2 for 11 people aged 6 to 8 and 2 for 11 people aged 9 to 14. Three count so far.",
    );
    expect(finding.action).toBe("Ask one more cleared adult to come.");
    expect(finding.source).toMatch(/American Camp Association/);
  });

  it("never calls a day covered with an age that has no ratio", () => {
    const people = [aPerson("Noor", { ageYears: 19 }), aPerson("Kit", { ageYears: Number.NaN })];
    const verdict = checkCover(aDay({ people, adults: severalAdults(8, { firstAid: true }) }));
    expect(verdict.covered).toBe(false);
    expect(findingOf(verdict, "age-has-ratio").people).toEqual(["noor", "kit"]);
  });

  it("counts everyone who comes, those one to one as well, as the published ratios do", () => {
    const people = [...children(8, { ageYears: 7 }), aPerson("Dov", { supportLevel: "constant", ageYears: 7 })];
    const finding = findingOf(checkCover(aDay({ people, adults: severalAdults(5) })), "ratio-by-age");
    expect(finding).toMatchObject({ needed: 2, have: 5, severity: "met" });
  });
});

describe("support levels", () => {
  const byLevel = (constant: number, close: number, occasional: number, minimal: number) => [
    ...children(constant, { supportLevel: "constant" }, "Constant"),
    ...children(close, { supportLevel: "close" }, "Close"),
    ...children(occasional, { supportLevel: "occasional" }, "Occasional"),
    ...children(minimal, { supportLevel: "minimal" }, "Minimal"),
  ];

  it.each([
    { levels: [0, 2, 4, 0], needed: 2, why: "1/2 + 1/2 + 4/4 is two exactly" },
    { levels: [0, 2, 4, 1], needed: 3, why: "one more fifth rounds up" },
    { levels: [0, 4, 2, 0], needed: 3, why: "2 + 1/2" },
    { levels: [0, 0, 0, 15], needed: 3, why: "fifteen fifths are three" },
    { levels: [0, 0, 0, 1], needed: 2, why: "never fewer than two" },
    { levels: [3, 0, 0, 0], needed: 5, why: "three one to one and two for the group" },
    { levels: [2, 3, 4, 5], needed: 6, why: "2 + ceil(1 1/2 + 1 + 1)" },
  ])("$levels need $needed: $why", ({ levels: [constant = 0, close = 0, occasional = 0, minimal = 0], needed }) => {
    const people = byLevel(constant, close, occasional, minimal);
    const met = findingOf(checkCover(aDay({ people, adults: severalAdults(needed) })), "ratio-by-support");
    expect(met).toMatchObject({ needed, have: needed, short: 0, severity: "met", action: null });
    const short = findingOf(checkCover(aDay({ people, adults: severalAdults(needed - 1) })), "ratio-by-support");
    expect(short).toMatchObject({ needed, short: 1, severity: "stops" });
  });

  it("names the one-to-one adults and the rest apart", () => {
    const verdict = checkCover(aDay({ people: byLevel(1, 4, 1, 0), adults: severalAdults(1) }));
    expect(findingOf(verdict, "ratio-by-support").sentence).toBe(
      "By support level the day needs 4 adults: 1 one to one and 3 for the other 5 people. One counts so far.",
    );
    expect(verdict.sentence).toBe("Short by three adults and one first aider.");
  });

  it("a policy may let an adult who guides count for others as well", () => {
    const people = children(4, { guide: "throughout" });
    const adults = severalAdults(4, bothSides);
    const strict = checkCover(aDay({ people, adults }));
    expect(findingOf(strict, "ratio-by-support").needed).toBe(6);
    const policy = { ...builtInPolicy, handsOnTakesWholeAdult: { applies: false, source: "from memory" } };
    expect(findingOf(checkCover(aDay({ people, adults, policy })), "ratio-by-support").needed).toBe(2);
  });

  it("no adult guides one person and supports another constantly, whatever the policy", () => {
    const policy = { ...builtInPolicy, handsOnTakesWholeAdult: { applies: false, source: "from memory" } };
    const people = [
      ...children(2, { supportLevel: "constant" }, "Constant"),
      ...children(5, { guide: "throughout" }, "Guided"),
    ];
    const verdict = checkCover(aDay({ people, adults: severalAdults(6, { ...bothSides, firstAid: true }), policy }));
    expect(findingOf(verdict, "ratio-by-support").severity).toBe("met");
    expect(findingOf(verdict, "one-to-one-together")).toMatchObject({ needed: 7, have: 6, short: 1 });
    expect(verdict.sentence).toBe("Short by one adult.");
  });
});

describe("guides and chairs", () => {
  it("the adult of a child in constant support is that child's guide", () => {
    const people = [aPerson("Dov", { supportLevel: "constant", guide: "throughout" })];
    const adults = [anAdult("Ines", { ...bothSides, firstAid: true }), anAdult("Otto"), anAdult("Rui")];
    const verdict = checkCover(aDay({ people, adults }));
    expect(verdict.covered).toBe(true);
    expect(verdict.counts.neededAdults).toBe(3);
  });

  it("matches sides, and names the people whose guides are too few", () => {
    const people = [
      aPerson("Amaya", { guide: "throughout", guideSide: "left" }),
      aPerson("Bram", { guide: "throughout", guideSide: "left" }),
      aPerson("Cai", { guide: "throughout", guideSide: "right" }),
    ];
    const adults = [
      anAdult("Lio", { guideSides: ["left"] }),
      anAdult("Mina", { guideSides: ["right"] }),
      anAdult("Rui", { guideSides: ["right"] }),
    ];
    const finding = findingOf(checkCover(aDay({ people, adults })), "guide-for-each");
    expect(finding).toMatchObject({ needed: 3, have: 2, short: 1, people: ["amaya", "bram"], adults: ["lio"] });
    expect(finding.sentence).toBe("Amaya and Bram need a guide all the time on the left arm, but only Lio can guide them.");
    expect(finding.action).toBe("Find one more adult who guides on the left arm.");
  });

  it("says so when nobody can guide at all", () => {
    const people = [aPerson("Amaya", { guide: "throughout" })];
    const finding = findingOf(checkCover(aDay({ people, adults: severalAdults(3) })), "guide-for-each");
    expect(finding.sentence).toBe("Amaya needs a guide all the time, but nobody who counts can guide them.");
  });

  it("says who has a guide when all is well", () => {
    const people = [aPerson("Amaya", { guide: "throughout" })];
    const finding = findingOf(checkCover(aDay({ people, adults: severalAdults(3, bothSides) })), "guide-for-each");
    expect(finding).toMatchObject({ severity: "met", short: 0, action: null });
    expect(finding.sentence).toBe("Amaya needs a guide all the time, and can have one.");
  });

  it("a chair that is pushed needs someone who pushes; one that is driven does not", () => {
    const pushed = [aPerson("Wren", { wheels: "pushed" })];
    const short = findingOf(checkCover(aDay({ people: pushed, adults: severalAdults(3) })), "chair-pusher-for-each");
    expect(short.sentence).toBe("Wren needs an adult to push the chair, but nobody who counts can push.");
    expect(short.action).toBe("Find one more adult who pushes a chair.");
    const met = checkCover(aDay({ people: pushed, adults: severalAdults(3, { pushChair: true, firstAid: true }) }));
    expect(findingOf(met, "chair-pusher-for-each").severity).toBe("met");
    const driven = checkCover(aDay({ people: [aPerson("Wren", { wheels: "power" })], adults: severalAdults(3) }));
    expect(driven.findings.map((finding) => finding.rule)).not.toContain("chair-pusher-for-each");
  });

  it("a blind child in a pushed chair needs one adult who does both, on either arm", () => {
    const people = [aPerson("Wren", { wheels: "pushed", guide: "throughout", guideSide: "left" })];
    const apart = [anAdult("Ines", bothSides), anAdult("Jonah", { pushChair: true }), anAdult("Otto")];
    expect(checkCover(aDay({ people, adults: apart })).shortage.chairPushers).toBe(1);
    const both = [anAdult("Ines", { guideSides: ["right"], pushChair: true }), anAdult("Jonah"), anAdult("Otto")];
    expect(findingOf(checkCover(aDay({ people, adults: both })), "chair-pusher-for-each").severity).toBe("met");
  });

  it("one adult cannot guide one child and push another", () => {
    const people = [aPerson("Amaya", { guide: "throughout" }), aPerson("Wren", { wheels: "pushed" })];
    const adults = [anAdult("Jonah", { ...bothSides, pushChair: true, firstAid: true }), ...severalAdults(3)];
    const verdict = checkCover(aDay({ people, adults }));
    expect(findingOf(verdict, "guide-for-each").severity).toBe("met");
    expect(findingOf(verdict, "chair-pusher-for-each").severity).toBe("met");
    const together = findingOf(verdict, "one-to-one-together");
    expect(together.sentence).toBe("Amaya and Wren need an adult of their own, but only Jonah can be that adult.");
    expect(verdict.sentence).toBe("Short by one adult to guide or push a chair.");
  });

  it("warns, and does not stop, when nobody is free to guide at times", () => {
    const people = [aPerson("Amaya", { guide: "throughout" }), aPerson("Esi", { guide: "at-times" })];
    const one = [anAdult("Ines", { ...bothSides, firstAid: true }), anAdult("Otto"), anAdult("Rui")];
    const warned = checkCover(aDay({ people, adults: one }));
    expect(findingOf(warned, "guide-at-times")).toMatchObject({ severity: "warns", people: ["esi"], short: 1 });
    expect(warned.covered).toBe(true);
    const two = [...one, anAdult("Mina", bothSides)];
    expect(findingOf(checkCover(aDay({ people, adults: two })), "guide-at-times").severity).toBe("met");
  });

  it("asks an adult who said maybe before it asks for a new one", () => {
    const people = [aPerson("Amaya", { guide: "throughout" })];
    const adults = [
      ...severalAdults(3),
      anAdult("Otto", { answer: "maybe" }),
      anAdult("Rui", { ...bothSides, clearedUntil: "2027-01-03" }),
      anAdult("Mina", { ...bothSides, answer: "maybe" }),
    ];
    const finding = findingOf(checkCover(aDay({ people, adults })), "guide-for-each");
    expect(finding.action).toBe("Ask Mina, who said maybe, for a yes.");
  });
});

describe("who counts", () => {
  const standing = (adult: ReturnType<typeof anAdult>, people = [aPerson("Ada")], policy = builtInPolicy) =>
    checkCover(aDay({ people, adults: [adult], policy })).adults[0];

  it.each([
    ["who said maybe", { answer: "maybe" }, "Does not count. Said maybe."],
    ["who has not answered", { answer: "asked" }, "Does not count. Has not answered yet."],
    ["who said no", { answer: "no" }, "Does not count. Said no."],
    ["under eighteen", { isAdult: false }, "Does not count. Is under 18 on the day."],
    ["with no clearance", { clearedUntil: null }, "Does not count. Has no clearance on file."],
    ["with a clearance that is no date", { clearedUntil: "soon" }, "Does not count. Has no clearance on file."],
    ["with a clearance of a day that is none", { clearedUntil: "2028-02-30" }, "Does not count. Has no clearance on file."],
    [
      "whose clearance ends before",
      { clearedUntil: "2027-01-03" },
      "Does not count. Clearance ends 3 January, before the outing.",
    ],
    [
      "whose clearance ended the year before",
      { clearedUntil: "2026-12-31" },
      "Does not count. Clearance ends 31 December 2026, before the outing.",
    ],
    ["who drives all day", { drivesWholeDay: true }, "Does not count. Drives, so cannot look after people."],
  ] as const)("an adult %s does not count, and it says why", (_who, facts, sentence) => {
    expect(standing(anAdult("Otto", facts))).toMatchObject({ counts: false, standing: "does-not-count", sentence });
  });

  it("gives every reason, so that none comes up only after the first is mended", () => {
    const sentence = standing(anAdult("Otto", { answer: "maybe", clearedUntil: null }))?.sentence;
    expect(sentence).toBe("Does not count. Said maybe. Has no clearance on file.");
  });

  it("a clearance is good on its last day", () => {
    expect(standing(anAdult("Otto", { clearedUntil: "2027-05-08" }))?.counts).toBe(true);
    expect(standing(anAdult("Otto", { clearedUntil: "2027-05-07" }))?.counts).toBe(false);
  });

  it("being blind changes nothing at all in the verdict", () => {
    const asBlind = (isBlind: boolean) =>
      checkCover(aDay({ people: elevenChildren, adults: sixAdults.map((adult) => ({ ...adult, isBlind })) }));
    expect(asBlind(true)).toEqual(asBlind(false));
    expect(asBlind(true).counts.adultsWhoCount).toBe(6);
  });

  it("the leader counts if the policy says so, and else may be the first aider only", () => {
    const leader = anAdult("Tove", { role: "leader", firstAid: true });
    expect(standing(leader)?.standing).toBe("counts");
    const policy = { ...builtInPolicy, leaderCounts: { counts: false, source: "from memory" } };
    expect(standing(leader, undefined, policy)?.standing).toBe("roles-only");
    const verdict = checkCover(aDay({ people: [aPerson("Ada")], adults: [leader, ...severalAdults(2)], policy }));
    expect(verdict.covered).toBe(true);
    expect(verdict.counts.adultsWhoCount).toBe(2);
  });
});

describe("guardians", () => {
  const dov = aPerson("Dov", { supportLevel: "constant", guardianStaysId: "noa" });
  const staff = severalAdults(2, { firstAid: true });

  it("a guardian without a clearance looks after their own child only", () => {
    const noa = anAdult("Noa", { role: "guardian", clearedUntil: null, guardianOf: ["dov"] });
    const verdict = checkCover(aDay({ people: [dov, ...children(3)], adults: [noa, ...staff] }));
    expect(verdict.covered).toBe(true);
    expect(verdict.counts).toMatchObject({ adultsWhoCount: 2, neededAdults: 2 });
    expect(verdict.adults[0]?.sentence).toBe("Counts for their own child only. Has no clearance on file.");
  });

  it("is no help to another child", () => {
    const noa = anAdult("Noa", { role: "guardian", clearedUntil: null, guardianOf: ["dov"] });
    const eli = aPerson("Eli", { supportLevel: "constant" });
    const verdict = checkCover(aDay({ people: [eli, dov], adults: [noa, ...staff] }));
    expect(verdict.sentence).toBe("Short by one adult.");
  });

  it("a cleared guardian counts like anyone", () => {
    const noa = anAdult("Noa", { role: "guardian", guardianOf: ["dov"] });
    expect(checkCover(aDay({ people: [dov], adults: [noa, ...staff] })).counts.adultsWhoCount).toBe(3);
  });

  it("with two children who each need an adult, one guardian is enough for one", () => {
    const noa = anAdult("Noa", { role: "guardian", clearedUntil: null });
    const eli = aPerson("Eli", { supportLevel: "constant", guardianStaysId: "noa" });
    expect(checkCover(aDay({ people: [dov, eli], adults: [noa, ...staff] })).shortage.adults).toBe(1);
  });

  it("guides their own child only if they guide", () => {
    const guided = aPerson("Dov", { guide: "throughout", guardianStaysId: "noa" });
    const noa = anAdult("Noa", { role: "guardian", clearedUntil: null });
    expect(checkCover(aDay({ people: [guided], adults: [noa, ...staff] })).shortage.guides).toBe(1);
    const guiding = anAdult("Noa", { role: "guardian", clearedUntil: null, ...bothSides });
    expect(checkCover(aDay({ people: [guided], adults: [guiding, ...staff] })).covered).toBe(true);
  });

  it("who said maybe does not count for their own child either", () => {
    const noa = anAdult("Noa", { role: "guardian", clearedUntil: null, answer: "maybe" });
    expect(checkCover(aDay({ people: [dov], adults: [noa, ...staff] })).covered).toBe(false);
  });
});

describe("roles and two adults", () => {
  it("needs a first aider, who may be anyone who counts", () => {
    const people = children(3);
    const short = checkCover(aDay({ people, adults: severalAdults(2) }));
    expect(short.sentence).toBe("Short by one first aider.");
    expect(findingOf(short, "first-aider")).toMatchObject({
      severity: "stops",
      sentence: "The day needs one first aider, and none comes.",
      action: "Find one adult trained in first aid.",
    });
    const met = findingOf(checkCover(aDay({ people, adults: severalAdults(2, { firstAid: true }) })), "first-aider");
    expect(met).toMatchObject({ severity: "met", sentence: "The day needs one first aider, and two come." });
  });

  it("a first aider who said maybe is the one to ask", () => {
    const adults = [...severalAdults(2), anAdult("Mina", { firstAid: true, answer: "asked" })];
    const finding = findingOf(checkCover(aDay({ people: children(3), adults })), "first-aider");
    expect(finding.action).toBe("Ask Mina again, who has not answered yet.");
  });

  it("two of one family are one", () => {
    const related = severalAdults(3, { familyId: "pell", firstAid: true });
    const verdict = checkCover(aDay({ people: children(3), adults: related }));
    expect(verdict.sentence).toBe("Short by one adult from another family.");
    const finding = findingOf(verdict, "two-unrelated-adults");
    expect(finding).toMatchObject({ needed: 2, have: 1, short: 1, severity: "stops" });
    expect(finding.sentence).toBe("The day needs two cleared adults who are not related, and those who come are from one family.");
    const met = checkCover(aDay({ people: children(3), adults: [...related, anAdult("Otto")] }));
    expect(findingOf(met, "two-unrelated-adults")).toMatchObject({ have: 2, severity: "met" });
  });

  it("one adult alone is short by one, said once", () => {
    const verdict = checkCover(aDay({ people: [aPerson("Ada")], adults: [anAdult("Ines", { firstAid: true })] }));
    expect(verdict.sentence).toBe("Short by one adult.");
    expect(findingOf(verdict, "two-unrelated-adults").sentence).toBe(
      "The day needs two cleared adults who are not related, and one comes.",
    );
  });
});

describe("what if one adult cancels", () => {
  const people = children(4);

  it("names each adult whose absence alone makes the day short", () => {
    const adults = [anAdult("Ines", { firstAid: true }), anAdult("Otto"), anAdult("Rui")];
    const verdict = checkCover(aDay({ people, adults }));
    expect(verdict.covered).toBe(true);
    const finding = findingOf(verdict, "one-adult-cancels");
    expect(finding).toMatchObject({ severity: "warns", adults: ["ines"] });
    expect(finding.sentence).toBe("If Ines cancels, the day is short by one first aider.");
    expect(finding.action).toBe("Find one more adult to stand by for Ines.");
  });

  it("names who could step in, and nobody who could not", () => {
    const adults = [
      ...severalAdults(3, { firstAid: true }),
      anAdult("Ines", bothSides),
      anAdult("Mina", { ...bothSides, answer: "maybe" }),
      anAdult("Lio", { ...bothSides, answer: "asked", clearedUntil: "2027-01-03" }),
      anAdult("Otto", { answer: "asked" }),
    ];
    const verdict = checkCover(aDay({ people: [...people, aPerson("Amaya", { guide: "throughout" })], adults }));
    const finding = findingOf(verdict, "one-adult-cancels");
    expect(finding.sentence).toBe("If Ines cancels, the day is short by one guide.");
    expect(finding.action).toBe("Ask Mina, who could step in, to stand by.");
  });

  it("rests easy when anyone may cancel", () => {
    const finding = findingOf(checkCover(aDay({ people, adults: severalAdults(3, { firstAid: true }) })), "one-adult-cancels");
    expect(finding).toMatchObject({ severity: "met", short: 0 });
    expect(finding.sentence).toBe("Any one adult could cancel, and the day would still be covered.");
  });

  it("on a short day names those who would leave another question open", () => {
    const shortOfGuides = [...people, aPerson("Amaya", { guide: "throughout" })];
    const adults = [anAdult("Ines", { firstAid: true }), ...severalAdults(4)];
    const verdict = checkCover(aDay({ people: shortOfGuides, adults }));
    const finding = findingOf(verdict, "one-adult-cancels");
    expect(finding.sentence).toBe("If Ines cancels, the day is short by one guide and one first aider.");
  });

  it("on a short day with nothing more to lose says that nobody can be spared", () => {
    const finding = findingOf(checkCover(aDay({ people, adults: [] })), "one-adult-cancels");
    expect(finding.sentence).toBe("The day is short already, so nobody can be spared.");
  });

  it("the guardian of a child in constant support is named", () => {
    const dov = aPerson("Dov", { supportLevel: "constant", guardianStaysId: "noa" });
    const noa = anAdult("Noa", { role: "guardian", clearedUntil: null });
    const verdict = checkCover(aDay({ people: [dov], adults: [noa, ...severalAdults(2, { firstAid: true })] }));
    const named = verdict.findings.filter((finding) => finding.rule === "one-adult-cancels");
    expect(named.map((finding) => finding.adults[0])).toContain("noa");
  });
});

describe("input that cannot be counted", () => {
  it("nobody registered is not a covered day", () => {
    const verdict = checkCover(aDay({ adults: severalAdults(5, { firstAid: true }) }));
    expect(verdict.covered).toBe(false);
    expect(verdict.sentence).toBe("Nobody is registered yet, so there is nobody to cover.");
  });

  it("no adults and nobody registered is a verdict, not a crash", () => {
    expect(checkCover(aDay({})).covered).toBe(false);
    expect(checkCover(aDay({ people: children(3) })).sentence).toBe("Short by two adults and one first aider.");
  });

  it("an adult listed twice is counted once and said", () => {
    const [one = anAdult("Ines")] = severalAdults(1, { firstAid: true });
    const verdict = checkCover(aDay({ people: children(2), adults: [one, one] }));
    expect(verdict.covered).toBe(false);
    expect(verdict.counts.adultsWhoCount).toBe(1);
    expect(findingOf(verdict, "adult-listed-once").sentence).toBe("Adult 1 is listed twice and is counted once.");
  });

  it("a person listed twice is counted once and said", () => {
    const verdict = checkCover(aDay({ people: [aPerson("Ada"), aPerson("Ada")], adults: severalAdults(2) }));
    expect(verdict.counts.people).toBe(1);
    expect(findingOf(verdict, "person-listed-once").people).toEqual(["ada"]);
  });

  it.each(["", "soon", "2027-13-01", "2027-02-29", "2027-5-8"])("a date like %j is no covered day", (date) => {
    const verdict = checkCover(aDay({ date, people: children(2), adults: severalAdults(4, { firstAid: true }) }));
    expect(verdict.covered).toBe(false);
    expect(findingOf(verdict, "date-readable").action).toBe("Set the date of the outing.");
  });

  it("2,000 people are counted", () => {
    const people = children(2000, { guide: "throughout" });
    const verdict = checkCover(aDay({ people, adults: severalAdults(100, bothSides) }));
    expect(verdict.shortage.guides).toBe(1900);
  });
});

it("every finding that is not met has one thing to do, every one a source and a whole sentence", () => {
  const short = checkCover(aDay({ people: elevenChildren, adults: sixAdults.slice(0, 2), pairings: [{ personId: "bram", adultId: "tove" }] }));
  const met = checkCover(aDay({ people: elevenChildren, adults: severalAdults(9, { ...bothSides, firstAid: true }) }));
  for (const finding of [...short.findings, ...met.findings]) {
    expect(finding.sentence).toMatch(/^[A-Z0-9].*\.$/);
    expect(finding.source).not.toBe("");
    expect(finding.short).toBeGreaterThanOrEqual(0);
    if (finding.severity === "met") expect([finding.short, finding.action]).toEqual([0, null]);
    else expect(finding.action).toMatch(/^[A-Z][^.]*\.$/);
  }
});

it("the caution says that rules and judgement come first", () => {
  expect(COVER_CAUTION).toMatch(/Licensing rules.*land agency.*qualified staff come first/);
});
