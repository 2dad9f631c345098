import { describe, expect, it } from "vitest";
import { checkCover } from "@/lib/cover/check-cover";
import type { CoverAdult, CoverInput, CoverPerson, Shortage } from "@/lib/cover/cover";
import { builtInPolicy } from "@/lib/cover/cover-policy";
import { aDay, anAdult, aPerson, bothSides, seededRandom, severalAdults } from "./cover-day";

/*
 * The same question answered the slow way, from the rules as people say them and with nothing of the engine: try
 * every way to give adults to those who need one of their own, then see whether the adults left over are enough.
 * Support is counted in twentieths of an adult, which every level divides.
 */
const TWENTIETHS = { constant: 20, close: 10, occasional: 5, minimal: 4 } as const;
const BANDS = [
  { to: 5, ratio: 6 },
  { to: 8, ratio: 8 },
  { to: 14, ratio: 10 },
  { to: 18, ratio: 12 },
] as const;

function isComing(adult: CoverAdult): boolean {
  return adult.answer === "yes" && adult.isAdult && !adult.drivesWholeDay;
}

function isCleared(adult: CoverAdult, date: string): boolean {
  return adult.clearedUntil !== null && adult.clearedUntil >= date;
}

function suits(adult: CoverAdult, person: CoverPerson): boolean {
  const { guideSides, pushChair } = adult.capabilities;
  if (person.wheels === "pushed" && !pushChair) return false;
  if (person.guide !== "throughout") return true;
  if (person.wheels === "pushed" || person.guideSide === "either") return guideSides.length > 0;
  return guideSides.includes(person.guideSide);
}

function adultsByAge(people: readonly CoverPerson[]): number {
  const bandOf = (person: CoverPerson) => BANDS.findIndex(({ to }) => person.ageYears <= to);
  return BANDS.reduce(
    (sum, { ratio }, at) => sum + Math.ceil(people.filter((person) => bandOf(person) === at).length / ratio),
    0,
  );
}

function restIsEnough(people: readonly CoverPerson[], free: readonly CoverAdult[], guardians: readonly CoverAdult[]) {
  const others = people.filter(({ id }) => !guardians.some((guardian) => guardian.guardianOf.includes(id)));
  const load = others.reduce((sum, person) => sum + TWENTIETHS[person.supportLevel], 0);
  return free.length >= Math.max(2, Math.ceil(load / 20));
}

function isCoveredByTrying({ people, adults, date }: CoverInput): boolean {
  const coming = adults.filter(isComing);
  const counting = coming.filter((adult) => isCleared(adult, date));
  const guardians = coming.filter((adult) => !isCleared(adult, date));
  const families = new Set(counting.map((adult) => adult.familyId ?? adult.id));
  if (adultsByAge(people) > counting.length) return false;
  if (families.size < 2 || !counting.some((adult) => adult.capabilities.firstAid)) return false;

  const needsOwn = (person: CoverPerson) =>
    person.supportLevel === "constant" || person.guide === "throughout" || person.wheels === "pushed";
  const own = people.filter(needsOwn);
  const shared = people.filter((person) => !needsOwn(person));
  const place = (at: number, free: readonly CoverAdult[], freeGuardians: readonly CoverAdult[]): boolean => {
    const person = own[at];
    if (!person) return restIsEnough(shared, free, freeGuardians);
    const byCounting = free.some(
      (adult) => suits(adult, person) && place(at + 1, free.filter((each) => each !== adult), freeGuardians),
    );
    return (
      byCounting ||
      freeGuardians.some(
        (adult) =>
          adult.guardianOf.includes(person.id) &&
          suits(adult, person) &&
          place(at + 1, free, freeGuardians.filter((each) => each !== adult)),
      )
    );
  };
  return place(0, counting, guardians);
}

type Random = () => number;

function oneOf<Item>(random: Random, items: readonly [Item, ...Item[]]): Item {
  return items[Math.floor(random() * items.length)] ?? items[0];
}

function randomPerson(random: Random, at: number): CoverPerson {
  return aPerson(`Child ${at}`, {
    ageYears: oneOf(random, [5, 6, 8, 9, 14, 15, 18]),
    supportLevel: oneOf(random, ["constant", "close", "occasional", "minimal", "minimal", "minimal"]),
    guide: oneOf(random, ["throughout", "at-times", "not-needed", "not-needed"]),
    guideSide: oneOf(random, ["left", "right", "either"]),
    wheels: oneOf(random, ["none", "none", "none", "pushed", "power"]),
  });
}

/** Each child has at most one guardian among the adults, and a guardian at most two children. */
function randomDay(random: Random): CoverInput {
  const people = Array.from({ length: 1 + Math.floor(random() * 7) }, (_, at) => randomPerson(random, at));
  const adults = Array.from({ length: Math.floor(random() * 8) }, (_, at) => {
    const isGuardian = random() < 0.25;
    return anAdult(`Adult ${at}`, {
      answer: oneOf(random, ["yes", "yes", "yes", "yes", "yes", "yes", "maybe", "asked"]),
      isAdult: random() > 0.05,
      clearedUntil: oneOf(random, ["2029-12-31", "2027-05-08", "2027-05-07", "2029-12-31", "2029-12-31"]),
      familyId: oneOf(random, [null, null, "pell", "carrow"]),
      guardianOf: isGuardian ? people.slice(at * 2, at * 2 + 2).map(({ id }) => id) : [],
      role: isGuardian ? "guardian" : "chaperone",
      drivesWholeDay: random() < 0.05,
      guideSides: oneOf(random, [["left", "right"], ["left", "right"], ["left"], ["right"], []]),
      pushChair: random() < 0.5,
      firstAid: random() < 0.5,
    });
  });
  return aDay({ people, adults, policy: builtInPolicy });
}

function adultsFor(shortage: Shortage): CoverAdult[] {
  const firstAid = shortage.firstAiders > 0;
  return [
    ...severalAdults(shortage.guides, { ...bothSides, firstAid }, "New guide"),
    ...severalAdults(shortage.chairPushers, { ...bothSides, pushChair: true, firstAid }, "New pusher"),
    ...severalAdults(shortage.oneToOneAdults, { ...bothSides, pushChair: true, firstAid }, "New one to one"),
    ...severalAdults(shortage.adults, { firstAid }, "New adult"),
    ...severalAdults(shortage.unrelatedAdults, { firstAid }, "New unrelated"),
  ];
}

function sizeOf(shortage: Shortage): number {
  const { guides, chairPushers, oneToOneAdults, adults, unrelatedAdults } = shortage;
  return guides + chairPushers + oneToOneAdults + adults + unrelatedAdults;
}

describe("2,000 random days, answered by the engine and by trying everything", () => {
  const random = seededRandom(11);
  const days = Array.from({ length: 2000 }, () => randomDay(random));

  it("have the same verdict", () => {
    const differing = days.filter((day) => checkCover(day).covered !== isCoveredByTrying(day));
    expect(differing).toEqual([]);
    const covered = days.filter(isCoveredByTrying).length;
    expect(covered).toBeGreaterThan(150);
    expect(covered).toBeLessThan(1850);
  });

  it("are covered once the adults who are said to be missing come, and no fewer would do", () => {
    const [notHelped, lessWouldDo]: [CoverInput[], CoverInput[]] = [[], []];
    for (const day of days) {
      const { shortage } = checkCover(day);
      const size = sizeOf(shortage);
      const isCoveredWith = (more: CoverAdult[]) => isCoveredByTrying({ ...day, adults: [...day.adults, ...more] });
      if (size >= shortage.firstAiders && !isCoveredWith(adultsFor(shortage))) notHelped.push(day);
      if (size === 0) continue;
      if (isCoveredWith(severalAdults(size - 1, { ...bothSides, pushChair: true, firstAid: true }, "Able"))) {
        lessWouldDo.push(day);
      }
    }
    expect(notHelped).toEqual([]);
    expect(lessWouldDo).toEqual([]);
  });

  it("name, when covered, exactly the adults whose absence makes them short", () => {
    let namedSeen = 0;
    for (const day of days) {
      const verdict = checkCover(day);
      if (!verdict.covered) continue;
      const named = verdict.findings.filter(({ rule }) => rule === "one-adult-cancels").flatMap(({ adults }) => adults);
      const byTrying = day.adults.filter(
        (adult) => !isCoveredByTrying({ ...day, adults: day.adults.filter((each) => each !== adult) }),
      );
      expect(named).toEqual(byTrying.map(({ id }) => id));
      namedSeen += named.length;
    }
    expect(namedSeen).toBeGreaterThan(100);
  });
});
