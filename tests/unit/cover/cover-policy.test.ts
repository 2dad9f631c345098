import { describe, expect, it } from "vitest";
import {
  ageBandFor,
  builtInPolicy,
  coverPolicySchema,
  FROM_MEMORY,
  participantsPerAdultFor,
} from "@/lib/cover/cover-policy";
import { fromMemoryDayCampBands, publishedDayCampBands, supportRatios } from "@/tests/reference/day-camp-ratios";

describe("the built-in policy", () => {
  it("is a policy that the schema accepts, unchanged, also through JSON", () => {
    expect(coverPolicySchema.parse(JSON.parse(JSON.stringify(builtInPolicy)))).toEqual(builtInPolicy);
  });

  it.each(publishedDayCampBands.flatMap(({ ages, ...band }) => ages.map((age) => ({ age, ...band }))))(
    "has the published ratio at age $age: one to $participantsPerAdult",
    ({ age, participantsPerAdult }) => {
      const band = ageBandFor(builtInPolicy, age);
      expect(band?.participantsPerAdult).toBe(participantsPerAdult);
      expect(band?.source).toMatch(/^American Camp Association.*https:/);
    },
  );

  it.each(fromMemoryDayCampBands.flatMap(({ ages, ...band }) => ages.map((age) => ({ age, ...band }))))(
    "says that the ratio at age $age is from memory",
    ({ age, participantsPerAdult }) => {
      expect(ageBandFor(builtInPolicy, age)).toMatchObject({ participantsPerAdult, source: FROM_MEMORY });
    },
  );

  it.each(supportRatios)("has one adult to $participantsPerAdult for $level support", (published) => {
    const ratio = builtInPolicy.supportRatios[published.level];
    expect(ratio.participantsPerAdult).toBe(published.participantsPerAdult);
    expect(ratio.source === FROM_MEMORY).toBe(published.source === "from memory");
  });

  it("has no ratio for an adult of nineteen", () => {
    expect(ageBandFor(builtInPolicy, 19)).toBeUndefined();
  });

  it("takes the stricter of support level and age band", () => {
    const [first, ...rest] = builtInPolicy.ageBands;
    const strict = { ...builtInPolicy, ageBands: [{ ...first, participantsPerAdult: 3 }, ...rest] };
    const policy = coverPolicySchema.parse(strict);
    expect(participantsPerAdultFor(policy, { ageYears: 4, supportLevel: "minimal" })).toBe(3);
    expect(participantsPerAdultFor(policy, { ageYears: 4, supportLevel: "close" })).toBe(2);
    expect(participantsPerAdultFor(policy, { ageYears: 10, supportLevel: "minimal" })).toBe(5);
  });
});

describe("a policy is refused", () => {
  const [band] = builtInPolicy.ageBands;
  const refused: [why: string, change: object][] = [
    ["with no age bands", { ageBands: [] }],
    ["with two bands that share an age", { ageBands: [{ ...band, toAge: 6 }, { ...band, fromAge: 6, toAge: 8 }] }],
    ["with a band that ends before it starts", { ageBands: [{ ...band, fromAge: 9, toAge: 8 }] }],
    ["with nobody to an adult", { ageBands: [{ ...band, participantsPerAdult: 0 }] }],
    ["with half a person to an adult", { ageBands: [{ ...band, participantsPerAdult: 2.5 }] }],
    ["with a figure without a source", { ageBands: [{ ...band, source: " " }] }],
    ["with fewer than two adults", { minimumAdults: { unrelatedAdults: 1, source: FROM_MEMORY } }],
    ["with minus one first aider", { roleNeeds: { firstAiders: { adults: -1, source: FROM_MEMORY } } }],
    ["with a setting nobody knows", { guessing: true }],
    [
      "with two people to an adult at constant support",
      { supportRatios: { ...builtInPolicy.supportRatios, constant: { participantsPerAdult: 2, source: FROM_MEMORY } } },
    ],
  ];

  it.each(refused)("%s", (_why, change) => {
    expect(coverPolicySchema.safeParse({ ...builtInPolicy, ...change }).success).toBe(false);
  });
});
