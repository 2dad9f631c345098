import { describe, expect, it } from "vitest";
import type { Choices } from "@/lib/cover/matching";
import { adultsToBeHad, freed, largestMatching, matchedCount, NONE, tooFewAdultsFor } from "@/lib/cover/matching";
import { seededRandom } from "./cover-day";

/** The largest matching by trying everything. */
function bestByTrying(choices: Choices, used: ReadonlySet<number> = new Set(), at = 0): number {
  const options = choices[at];
  if (options === undefined) return 0;
  const withAdult = options
    .filter((adult) => !used.has(adult))
    .map((adult) => 1 + bestByTrying(choices, new Set([...used, adult]), at + 1));
  return Math.max(bestByTrying(choices, used, at + 1), ...withAdult);
}

function randomChoices(random: () => number): { choices: Choices; adultCount: number } {
  const adultCount = Math.floor(random() * 6);
  const density = random();
  const choices = Array.from({ length: Math.floor(random() * 7) }, () =>
    Array.from({ length: adultCount }, (_, adult) => adult).filter(() => random() < density),
  );
  return { choices, adultCount };
}

describe("matching people to adults", () => {
  it("re-pairs people who were placed first, so that everyone fits", () => {
    const matching = largestMatching([[0, 1], [0], [1, 2]], 3);
    expect(matching.adultOf).toEqual([1, 0, 2]);
  });

  it("finds as many pairs as trying everything does, and proves it where some are left out", () => {
    const random = seededRandom(20270508);
    let leftOutSeen = 0;
    for (let round = 0; round < 2000; round += 1) {
      const { choices, adultCount } = randomChoices(random);
      const matching = largestMatching(choices, adultCount);
      const size = matchedCount(matching);
      expect(size).toBe(bestByTrying(choices));

      matching.adultOf.forEach((adult, person) => {
        if (adult === NONE) return;
        expect(choices[person]).toContain(adult);
        expect(matching.personOf[adult]).toBe(person);
      });

      const tooFew = tooFewAdultsFor(choices, matching);
      expect(tooFew === null).toBe(size === choices.length);
      if (!tooFew) continue;
      leftOutSeen += 1;
      const theirChoices = new Set(tooFew.people.flatMap((person) => choices[person] ?? []));
      expect(new Set(tooFew.adults)).toEqual(theirChoices);
      expect(tooFew.people.length - theirChoices.size).toBe(choices.length - size);
    }
    expect(leftOutSeen).toBeGreaterThan(200);
  });

  it("says rightly whether one more person could have an adult", () => {
    const random = seededRandom(7);
    const answers = { yes: 0, no: 0 };
    for (let round = 0; round < 1000; round += 1) {
      const { choices, adultCount } = randomChoices(random);
      const [extra = [], ...rest] = choices;
      const matching = largestMatching(rest, adultCount);
      const toBeHad = adultsToBeHad(rest, matching);
      const could = extra.some((adult) => toBeHad.has(adult));
      expect(could).toBe(bestByTrying(choices) === matchedCount(matching) + 1);
      answers[could ? "yes" : "no"] += 1;
    }
    expect(Math.min(answers.yes, answers.no)).toBeGreaterThan(100);
  });

  it("goes on from a matching with an adult gone as well as it starts afresh", () => {
    const random = seededRandom(23);
    for (let round = 0; round < 500; round += 1) {
      const { choices, adultCount } = randomChoices(random);
      const gone = Math.floor(random() * adultCount);
      const left = choices.map((options) => options.filter((adult) => adult !== gone));
      const start = freed(largestMatching(choices, adultCount), [gone]);
      expect(matchedCount(largestMatching(left, adultCount, start))).toBe(bestByTrying(left));
    }
  });

  it("keeps everyone matched who was matched at the start", () => {
    const start = largestMatching([[0], [], []], 3);
    const matching = largestMatching([[0, 1], [0], [0, 1]], 3, start);
    expect(matching.adultOf[0]).not.toBe(NONE);
    expect(matching.personOf[0]).not.toBe(NONE);
    expect(matchedCount(matching)).toBe(2);
  });
});
