import { describe, expect, it } from "vitest";
import { agesInWords, roomInWords, roomOf, slugFrom, takesRegistrations, type Outing } from "@/lib/outings/outing";

const outing: Outing = {
  id: "o", slug: "s", title: "t", theme: "t", summary: "s",
  site: { id: "s", slug: "s", name: "Heron Spit", landManager: "m", zone: "America/Los_Angeles", ground: "g", meetingPoint: "p" },
  startsAt: "2027-01-09T17:00:00.000Z", endsAt: "2027-01-09T20:00:00.000Z", seats: 5, seatsFree: 2, waiting: 0, youngestAge: 8, oldestAge: 14,
  suggestedFeeCents: 0, currency: "usd", policyId: "p", meetingText: "m", state: "open", calledOffBecause: null, edition: 1, modelIds: [],
};
const before = "2027-01-09T16:59:59.999Z";

describe("whether there is room", () => {
  it.each([
    [{}, before, "places left", "2 places left"],
    [{ seatsFree: 1 }, before, "places left", "1 place left"],
    [{ seatsFree: 0 }, before, "full", "Full"],
    [{ seatsFree: 1, waiting: 1 }, before, "full", "Full"],
    [{}, outing.startsAt, "closed", "Registration closed"],
    [{ state: "closed" }, before, "closed", "Registration closed"],
    [{ state: "draft" }, before, "closed", "Registration closed"],
    [{}, outing.endsAt, "done", "Over"],
    [{ state: "called off" }, outing.endsAt, "called off", "Called off"],
  ] as const)("of %j at %s: %s", (changes, now, room, words) => {
    const one = { ...outing, ...changes };
    expect([roomOf(one, now), roomInWords(one, now)]).toEqual([room, words]);
    expect(takesRegistrations(one, now)).toBe(room === "places left" || room === "full");
  });
});

it.each([
  [8, 14, "ages 8 to 14"],
  [10, 10, "age 10"],
  [3, 18, "all ages"],
  [3, 17, "ages 3 to 17"],
])("from %i to %i is %s", (youngestAge, oldestAge, words) => expect(agesInWords({ youngestAge, oldestAge })).toBe(words));

it.each([
  ["Low tide at Heron Spit", "low-tide-at-heron-spit"],
  ["  ¿Qué suena?  ", "que-suena"],
  ["Rain, reeds & rails!", "rain-reeds-rails"],
  ["鳥の声", "outing"],
  ["x".repeat(200), "x".repeat(60)],
  [`${"a".repeat(59)} and more`, "a".repeat(59)],
])("the address of %j is %s", (title, slug) => expect(slugFrom(title)).toBe(slug));
