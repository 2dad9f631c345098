import { describe, expect, it } from "vitest";
import { knex } from "@/db/connection";
import { changeOuting } from "@/lib/registrations/change-outing";
import { closeOuting } from "@/lib/outings/close-outing";
import { registerChild } from "@/lib/registrations/register-child";
import { releaseLapsedHolds } from "@/lib/registrations/release-lapsed-holds";
import { holdMinutes, offerMinutes } from "@/lib/registrations/registration";
import { withdraw } from "@/lib/registrations/withdraw";
import { theClock } from "@/lib/shared/actor";
import { minutesLater } from "@/lib/shared/dates";
import { makeCoordinator } from "../../support/actors";
import { finish, makeFamilies, makeFamily, outbox, register, registrationOf, sayNeeds, sign, takeNoFeePlace } from "../../support/registering";
import { allowed, makeOuting, makeWorld, refused, wait, type World } from "../../support/world";

function seatHolders(world: World, outingId: string) {
  return world.conn.all(knex("seats").where({ outing_id: outingId }).orderBy("number").select("number", "registration_id"));
}

describe("the last seats", () => {
  it("100 families at once for 5 seats: 5 hold one, 95 wait in the places 1 to 95", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 5 });
    const answers = await Promise.all(makeFamilies(world, 100).map((family) => register(world, family, outing.slug)));

    expect(answers.filter((answer) => answer.state === "held")).toHaveLength(5);
    const waiting = answers.filter((answer) => answer.state === "waiting").map((answer) => registrationOf(world, answer.registrationId));
    expect(waiting.map((one) => one.placeInQueue)).toEqual(Array.from({ length: 95 }, (_, at) => at + 1));
    const holders = seatHolders(world, outing.id).map((seat) => seat.registration_id);
    expect(new Set(holders).size).toBe(5);
    expect(holders).not.toContain(null);
  });

  it("each waiting family is told the place it keeps", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1 });
    await Promise.all(makeFamilies(world, 12).map((family) => register(world, family, outing.slug)));
    const told = outbox(world, "on-the-waiting-list").map(({ facts }) => facts);
    expect(told.map((facts) => facts.place)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11]);
    expect(told.map((facts) => registrationOf(world, String(facts.registrationId)).placeInQueue)).toEqual(told.map((facts) => facts.place));
  });

  it("two at once for one seat: one holds it, the other is first on the waiting list", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1 });
    const answers = await Promise.all(makeFamilies(world, 2).map((family) => register(world, family, outing.slug)));
    expect(answers.map((answer) => answer.state).sort()).toEqual(["held", "waiting"]);
  });

  it("the same child 20 times at once has one registration and one seat", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 5 });
    const family = makeFamily(world);
    const answers = await Promise.all(Array.from({ length: 20 }, () => register(world, family, outing.slug)));
    expect(new Set(answers.map((answer) => answer.registrationId)).size).toBe(1);
    expect(seatHolders(world, outing.id).filter((seat) => seat.registration_id !== null)).toHaveLength(1);
  });

  it("a newcomer never slips past those who wait, even when a seat is free", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1 });
    const [first, second, third] = makeFamilies(world, 3);
    if (!first || !second || !third) throw new Error("three families were asked for");
    const held = await register(world, first, outing.slug);
    const waiting = await register(world, second, outing.slug);
    world.conn.run(knex("seats").where({ registration_id: held.registrationId }).update({ registration_id: null }));
    expect((await register(world, third, outing.slug)).state).toBe("waiting");
    expect(registrationOf(world, waiting.registrationId).state).toBe("held");
  });
});

describe("a hold", () => {
  it("becomes a confirmed seat with its count-off number once needs, waiver and fee are there, in any order", async () => {
    const steps = { needs: sayNeeds, waiver: sign, fee: takeNoFeePlace };
    const orders = [["needs", "waiver", "fee"], ["needs", "fee", "waiver"], ["waiver", "needs", "fee"], ["fee", "waiver", "needs"]] as const;
    for (const order of orders) {
      const world = makeWorld();
      const outing = makeOuting(world);
      const family = makeFamily(world);
      const { registrationId } = await register(world, family, outing.slug);
      for (const step of order) {
        expect(registrationOf(world, registrationId).state).toBe("held");
        await steps[step](world, family, registrationId);
      }
      expect(registrationOf(world, registrationId)).toMatchObject({ state: "confirmed", seatNumber: 1, holdEndsAt: null });
      expect(outbox(world, "registration-confirmed")).toHaveLength(1);
    }
  });

  it("that ran out goes to whoever has waited longest, with a mail that says until when", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1 });
    const [first, second, third] = makeFamilies(world, 3);
    if (!first || !second || !third) throw new Error("three families were asked for");
    const lapsing = await register(world, first, outing.slug);
    const next = await register(world, second, outing.slug);
    const last = await register(world, third, outing.slug);
    wait(world, holdMinutes);
    expect(await allowed(world, theClock, releaseLapsedHolds, {})).toEqual({ outings: 1 });

    expect(registrationOf(world, lapsing.registrationId)).toMatchObject({ state: "withdrawn", seatNumber: null });
    const offered = registrationOf(world, next.registrationId);
    expect(offered).toMatchObject({ state: "held", seatNumber: 1, holdEndsAt: minutesLater(world.now, offerMinutes) });
    expect(registrationOf(world, last.registrationId).placeInQueue).toBe(1);
    expect(outbox(world, "seat-offered").map(({ to, facts }) => [to, facts.until])).toEqual([
      [second.guardian.email, "Wednesday 6 January 2027, 10:45 a.m."],
    ]);
  });

  it("offered close to the day ends when the outing begins", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1, day: "2027-01-05" });
    const [first, second] = makeFamilies(world, 2);
    if (!first || !second) throw new Error("two families were asked for");
    const held = await register(world, first, outing.slug);
    const next = await register(world, second, outing.slug);
    await allowed(world, first.guardian, withdraw, { registrationId: held.registrationId, sure: "yes" });
    expect(registrationOf(world, next.registrationId).holdEndsAt).toBe("2027-01-05T17:00:00.000Z");
  });

  it("is not given up a moment too early", async () => {
    const world = makeWorld();
    const outing = makeOuting(world);
    const { registrationId } = await register(world, makeFamily(world), outing.slug);
    wait(world, holdMinutes - 1);
    expect(await allowed(world, theClock, releaseLapsedHolds, {})).toEqual({ outings: 0 });
    expect(registrationOf(world, registrationId).state).toBe("held");
  });

  it("lost and taken again keeps the needs and the signature that were given", async () => {
    const world = makeWorld();
    const outing = makeOuting(world);
    const family = makeFamily(world);
    const { registrationId } = await register(world, family, outing.slug);
    await sayNeeds(world, family, registrationId);
    await sign(world, family, registrationId);
    wait(world, holdMinutes);
    await allowed(world, theClock, releaseLapsedHolds, {});
    const again = await register(world, family, outing.slug);
    expect(again).toEqual({ registrationId, state: "held" });
    await takeNoFeePlace(world, family, registrationId);
    expect(registrationOf(world, registrationId).state).toBe("confirmed");
  });
});

describe("giving a seat back", () => {
  it("offers it in the same breath, and doing it twice is one thing done", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1 });
    const [first, second] = makeFamilies(world, 2);
    if (!first || !second) throw new Error("two families were asked for");
    const { registrationId } = await register(world, first, outing.slug);
    await finish(world, first, registrationId);
    const next = await register(world, second, outing.slug);
    await allowed(world, first.guardian, withdraw, { registrationId, sure: "yes" });
    await allowed(world, first.guardian, withdraw, { registrationId, sure: "yes" });
    expect(registrationOf(world, next.registrationId).state).toBe("held");
    expect(outbox(world, "seat-offered")).toHaveLength(1);
  });

  it("to leave the waiting list moves those behind up by one", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1 });
    const families = makeFamilies(world, 4);
    const answers = [];
    for (const family of families) answers.push(await register(world, family, outing.slug));
    const [, second, third, fourth] = answers.map((answer) => answer.registrationId);
    if (!second || !third || !fourth || !families[1]) throw new Error("four families were asked for");
    await allowed(world, families[1].guardian, withdraw, { registrationId: second, sure: "yes" });
    expect([third, fourth].map((id) => registrationOf(world, id).placeInQueue)).toEqual([1, 2]);
  });

  it("is refused once the outing is over", async () => {
    const world = makeWorld();
    const outing = makeOuting(world);
    const family = makeFamily(world);
    const { registrationId } = await register(world, family, outing.slug);
    world.now = "2027-01-09T20:00:00.000Z";
    expect(await refused(world, family.guardian, withdraw, { registrationId, sure: "yes" })).toMatchObject({ kind: "conflict", code: "over" });
  });

  it("asks for a second look first", async () => {
    const world = makeWorld();
    const family = makeFamily(world);
    const { registrationId } = await register(world, family, makeOuting(world).slug);
    expect(await refused(world, family.guardian, withdraw, { registrationId })).toMatchObject({ fields: { sure: "Tick the box to give the seat back." } });
    expect(registrationOf(world, registrationId).state).toBe("held");
  });
});

describe("the number of seats", () => {
  const fields = (world: World, slug: string, seats: string) => ({
    slug, seats, edition: "1", title: "Low tide", theme: "Dunlin", summary: "We listen.", siteId: world.siteId, policyId: world.policyId,
    day: "2027-01-09", startTime: "09:00", endTime: "12:00", youngestAge: "8", oldestAge: "14", suggestedFee: "12", meetingText: "At the gate.",
  });

  it("cannot go below what is taken or held, and the refusal says how many that is", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 4 });
    for (const family of makeFamilies(world, 3)) await register(world, family, outing.slug);
    const refusal = await refused(world, makeCoordinator(world), changeOuting, fields(world, outing.slug, "2"));
    expect(refusal).toMatchObject({ kind: "invalid", fields: { seats: "3 seats are taken or held. Enter that many or more." } });
    expect(seatHolders(world, outing.id)).toHaveLength(4);
  });

  it("going down takes free seats away, so nobody's count-off number changes", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 4 });
    const families = makeFamilies(world, 2);
    const ids: string[] = [];
    for (const family of families) ids.push((await register(world, family, outing.slug)).registrationId);
    await allowed(world, makeCoordinator(world), changeOuting, fields(world, outing.slug, "2"));
    expect(seatHolders(world, outing.id)).toEqual(ids.map((id, at) => ({ number: at + 1, registration_id: id })));
  });

  it("going up offers the new seats to those who wait, at the latest when the clock comes round", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1 });
    const ids: string[] = [];
    for (const family of makeFamilies(world, 4)) ids.push((await register(world, family, outing.slug)).registrationId);
    await allowed(world, makeCoordinator(world), changeOuting, fields(world, outing.slug, "3"));
    await allowed(world, theClock, releaseLapsedHolds, {});
    expect(ids.map((id) => registrationOf(world, id).state)).toEqual(["held", "held", "held", "waiting"]);
    expect(outbox(world, "seat-offered")).toHaveLength(2);
  });
});

describe("who may register when", () => {
  it("a closed, called-off, past or draft outing takes nobody, in words that say which", async () => {
    const world = makeWorld();
    const family = makeFamily(world);
    const asked = (slug: string) => refused(world, family.guardian, registerChild, { slug, participantId: family.childId });
    expect(await asked(makeOuting(world, { state: "closed" }).slug)).toMatchObject({ code: "not-open", sentence: expect.stringContaining("Registration closed") });
    expect(await asked(makeOuting(world, { state: "called off" }).slug)).toMatchObject({ code: "not-open", sentence: expect.stringContaining("Called off") });
    expect(await asked(makeOuting(world, { day: "2027-01-02" }).slug)).toMatchObject({ code: "not-open", sentence: expect.stringContaining("Over") });
    expect(await asked(makeOuting(world, { state: "draft" }).slug)).toMatchObject({ kind: "not-found" });
  });

  it("closing an outing lets those with a seat finish, and offers nothing to those who wait", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1 });
    const [first, second] = makeFamilies(world, 2);
    if (!first || !second) throw new Error("two families were asked for");
    const { registrationId } = await register(world, first, outing.slug);
    const waiting = await register(world, second, outing.slug);
    await allowed(world, makeCoordinator(world), closeOuting, { slug: outing.slug });
    await finish(world, first, registrationId);
    expect(registrationOf(world, registrationId).state).toBe("confirmed");
    await allowed(world, first.guardian, withdraw, { registrationId, sure: "yes" });
    expect(registrationOf(world, waiting.registrationId).state).toBe("waiting");
  });

  it("a child of another family cannot be registered, and is not even there", async () => {
    const world = makeWorld();
    const outing = makeOuting(world);
    const [mine, theirs] = makeFamilies(world, 2);
    if (!mine || !theirs) throw new Error("two families were asked for");
    const refusal = await refused(world, mine.guardian, registerChild, { slug: outing.slug, participantId: theirs.childId });
    expect(refusal.kind).toBe("not-found");
  });
});
