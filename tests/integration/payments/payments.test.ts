import { describe, expect, it } from "vitest";
import { knex } from "@/db/connection";
import { chooseFee } from "@/lib/payments/choose-fee";
import { listMoneyToReturn } from "@/lib/payments/list-money-to-return";
import { returnPayment } from "@/lib/payments/return-payment";
import { showCheckout } from "@/lib/payments/show-checkout";
import { takeCheckoutEvent } from "@/lib/payments/take-checkout-event";
import { callOffOuting } from "@/lib/registrations/call-off-outing";
import { checkoutMinutes, holdMinutes } from "@/lib/registrations/registration";
import { releaseLapsedHolds } from "@/lib/registrations/release-lapsed-holds";
import { withdraw } from "@/lib/registrations/withdraw";
import { payments, theClock } from "@/lib/shared/actor";
import { minutesLater } from "@/lib/shared/dates";
import { makeCoordinator } from "../../support/actors";
import {
  makeFamilies, makeFamily, openPayment, outbox, register, registrationOf, sayNeeds, sign, takeNoFeePlace, tellPaid, type Family,
} from "../../support/registering";
import { allowed, makeOuting, makeWorld, refused, wait, type World } from "../../support/world";

/** A held seat with needs and signature: only the fee is missing. */
async function almostThere(world: World, slug: string, family: Family): Promise<string> {
  const { registrationId } = await register(world, family, slug);
  await sayNeeds(world, family, registrationId);
  await sign(world, family, registrationId);
  return registrationId;
}

async function oneAlmostThere(seats = 5) {
  const world = makeWorld();
  const outing = makeOuting(world, { seats });
  const family = makeFamily(world);
  return { world, outing, family, registrationId: await almostThere(world, outing.slug, family) };
}

describe("a payment", () => {
  it("told once confirms the seat, and the mail says what was received", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const page = await openPayment(world, family, registrationId);
    expect(page).toMatchObject({ amountCents: 1200, currency: "usd", title: "Low tide at Heron Spit" });
    expect(await tellPaid(world, page)).toBe("settled");
    expect(registrationOf(world, registrationId)).toMatchObject({ state: "confirmed", feeSettled: true });
    expect(outbox(world, "registration-confirmed").map(({ facts }) => facts.amount)).toEqual(["$12"]);
  });

  it("told twice, by the same or by another event, changes nothing more", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const page = await openPayment(world, family, registrationId);
    await tellPaid(world, page, "evt_one");
    expect(await tellPaid(world, page, "evt_one")).toBe("seen before");
    expect(await tellPaid(world, page, "looked-up-by-the-family")).toBe("seen before");
    expect(outbox(world, "registration-confirmed")).toHaveLength(1);
    expect(await allowed(world, makeCoordinator(world), listMoneyToReturn, {})).toEqual([]);
  });

  it("told a hundred times at once settles once", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const page = await openPayment(world, family, registrationId);
    const answers = await Promise.all(Array.from({ length: 100 }, (_, at) => tellPaid(world, page, `evt_many_${at % 50}`)));
    expect(answers.filter((answer) => answer === "settled")).toHaveLength(1);
    expect(outbox(world, "registration-confirmed")).toHaveLength(1);
  });

  it("is still awaited for a family that comes back early, and settled when the event follows", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const page = await openPayment(world, family, registrationId);
    const early = await allowed(world, family.guardian, showCheckout, { registrationId });
    expect(early).toEqual({ sessionId: page.sessionId, settled: false });
    expect(registrationOf(world, registrationId).state).toBe("held");
    await tellPaid(world, page);
    expect(await allowed(world, family.guardian, showCheckout, { registrationId })).toEqual({ sessionId: null, settled: true });
  });

  it("settled before the family is back shows as settled", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    await tellPaid(world, await openPayment(world, family, registrationId));
    const again = await allowed(world, family.guardian, chooseFee, { registrationId, choice: "suggested" });
    expect(again).toEqual({ kind: "settled", registrationId });
  });

  it("of another amount or in another currency than was asked settles nothing", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const page = await openPayment(world, family, registrationId);
    expect(await tellPaid(world, { ...page, amountCents: 100 })).toBe("other amount");
    const euros = { eventId: "evt_eur", eventType: "t", sessionId: page.sessionId, paymentIntentId: null, amountCents: 1200, currency: "eur" };
    expect(await allowed(world, payments, takeCheckoutEvent, euros)).toBe("other amount");
    expect(registrationOf(world, registrationId)).toMatchObject({ state: "held", feeSettled: false });
  });

  it("for a page that is not ours is taken note of and nothing else", async () => {
    const { world } = await oneAlmostThere();
    expect(await tellPaid(world, { sessionId: "cs_of_somebody", amountCents: 1200 })).toBe("not ours");
  });

  it("made on a page that another amount replaced counts; what comes on top of it is money to return", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const first = await openPayment(world, family, registrationId);
    const second = await openPayment(world, family, registrationId, "20");
    expect(await tellPaid(world, first)).toBe("settled");
    expect(await tellPaid(world, second, "evt_extra")).toBe("paid twice");
    expect(await tellPaid(world, second, "evt_extra")).toBe("seen before");
    expect(await allowed(world, makeCoordinator(world), listMoneyToReturn, {})).toEqual([
      { paymentId: second.id, nameUsed: "Amaya", amountCents: 2000, currency: "usd", why: "paid without need" },
    ]);
  });
});

describe("a page to pay", () => {
  it("is the same one when asked for again, and a new one for another amount", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const page = await openPayment(world, family, registrationId);
    const again = await allowed(world, family.guardian, chooseFee, { registrationId, choice: "suggested" });
    expect(again).toEqual({ kind: "open page", registrationId, url: `http://127.0.0.1:1/${page.sessionId}` });
    const other = await allowed(world, family.guardian, chooseFee, { registrationId, choice: "other", otherAmount: "20" });
    expect(other).toMatchObject({ kind: "new page", payment: { amountCents: 2000 }, replacesSession: page.sessionId });
  });

  it("closes before the seat is given up, so nobody pays for a seat they have lost", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    wait(world, holdMinutes - 1);
    const page = await openPayment(world, family, registrationId);
    expect(page.expiresAt).toBe(minutesLater(world.now, checkoutMinutes));
    const holdEndsAt = registrationOf(world, registrationId).holdEndsAt ?? "";
    expect(holdEndsAt > page.expiresAt).toBe(true);
  });

  it("that could not be opened because the service is down leaves the seat held, and the next try works", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const first = await allowed(world, family.guardian, chooseFee, { registrationId, choice: "suggested" });
    expect(first.kind).toBe("new page"); // and nothing was attached to it
    expect(registrationOf(world, registrationId).state).toBe("held");
    await tellPaid(world, await openPayment(world, family, registrationId));
    expect(registrationOf(world, registrationId).state).toBe("confirmed");
  });

  it.each([
    ["other", "0.49", "A card payment is 0.50 dollars or more. For less, choose a no-fee place."],
    ["other", "1000.01", "Enter 1,000 dollars or less. Call us about larger gifts."],
    ["other", "twelve", "Enter an amount in dollars, such as 12 or 12.50."],
    ["other", "", "Enter an amount in dollars, such as 12 or 12.50."],
  ])("is not opened for %s %j", async (choice, otherAmount, sentence) => {
    const { world, family, registrationId } = await oneAlmostThere();
    const refusal = await refused(world, family.guardian, chooseFee, { registrationId, choice, otherAmount });
    expect(refusal).toMatchObject({ kind: "invalid", fields: { otherAmount: sentence } });
  });

  it("is not opened for an outing that is called off", async () => {
    const { world, outing, family, registrationId } = await oneAlmostThere();
    await allowed(world, makeCoordinator(world), callOffOuting, { slug: outing.slug, because: "A storm is coming." });
    const refusal = await refused(world, family.guardian, chooseFee, { registrationId, choice: "suggested" });
    expect(refusal).toMatchObject({ kind: "conflict", code: "called-off" });
  });
});

describe("a no-fee place", () => {
  it("settles at once, asks no reason, and looks like any other confirmed seat to the family's list", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    await takeNoFeePlace(world, family, registrationId);
    expect(registrationOf(world, registrationId)).toMatchObject({ state: "confirmed", payment: { kind: "no-fee", amountCents: 0 } });
    expect(outbox(world, "registration-confirmed").map(({ facts }) => facts.amount)).toEqual([""]);
  });

  it("is what a suggested fee of nothing comes to", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { feeCents: 0 });
    const family = makeFamily(world);
    const registrationId = await almostThere(world, outing.slug, family);
    const answer = await allowed(world, family.guardian, chooseFee, { registrationId, choice: "suggested" });
    expect(answer.kind).toBe("settled");
    expect(registrationOf(world, registrationId).state).toBe("confirmed");
  });

  it("taken while a page is open closes that page's payment", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const page = await openPayment(world, family, registrationId);
    await takeNoFeePlace(world, family, registrationId);
    expect(world.conn.first(knex("payments").where({ id: page.id }).select("state"))?.state).toBe("abandoned");
    expect(await tellPaid(world, page)).toBe("paid twice");
  });
});

describe("money that comes after the hold ran out", () => {
  async function lapsedAfterPaying(seats: number) {
    const given = await oneAlmostThere(seats);
    const page = await openPayment(given.world, given.family, given.registrationId);
    wait(given.world, 60);
    await allowed(given.world, theClock, releaseLapsedHolds, {});
    expect(registrationOf(given.world, given.registrationId).state).toBe("withdrawn");
    return { ...given, page };
  }

  it("buys a seat while one is free", async () => {
    const { world, registrationId, page } = await lapsedAfterPaying(5);
    expect(await tellPaid(world, page)).toBe("settled");
    expect(registrationOf(world, registrationId).state).toBe("confirmed");
  });

  it("buys the next free seat when none is: the family waits, keeps its payment, and is confirmed without asking", async () => {
    const { world, outing, registrationId, page } = await lapsedAfterPaying(1);
    const [other] = makeFamilies(world, 1);
    if (!other) throw new Error("one family was asked for");
    const taken = await register(world, other, outing.slug);
    await tellPaid(world, page);
    expect(registrationOf(world, registrationId)).toMatchObject({ state: "waiting", placeInQueue: 1, feeSettled: true });
    await allowed(world, other.guardian, withdraw, { registrationId: taken.registrationId, sure: "yes" });
    expect(registrationOf(world, registrationId).state).toBe("confirmed");
    expect(outbox(world, "seat-offered")).toEqual([]);
  });

  it("never pushes in front of those who wait", async () => {
    const { world, outing, registrationId, page } = await lapsedAfterPaying(1);
    const [holder, waiting] = makeFamilies(world, 2);
    if (!holder || !waiting) throw new Error("two families were asked for");
    await register(world, holder, outing.slug);
    const first = await register(world, waiting, outing.slug);
    await tellPaid(world, page);
    expect([first.registrationId, registrationId].map((id) => registrationOf(world, id).placeInQueue)).toEqual([1, 2]);
  });

  it("does not bring back a child whose family gave the seat back; it is money to return", async () => {
    const { world, family, registrationId } = await oneAlmostThere();
    const page = await openPayment(world, family, registrationId);
    await allowed(world, family.guardian, withdraw, { registrationId, sure: "yes" });
    expect(await tellPaid(world, page)).toBe("withdrawn");
    expect(registrationOf(world, registrationId).state).toBe("withdrawn");
    expect(await allowed(world, makeCoordinator(world), listMoneyToReturn, {})).toMatchObject([{ amountCents: 1200 }]);
  });

  it("for a day that was called off confirms nothing", async () => {
    const { world, outing, registrationId, page } = await lapsedAfterPaying(5);
    await allowed(world, makeCoordinator(world), callOffOuting, { slug: outing.slug, because: "A storm is coming." });
    await tellPaid(world, page);
    expect(registrationOf(world, registrationId).state).toBe("withdrawn");
    expect(outbox(world, "registration-confirmed")).toEqual([]);
    expect(await allowed(world, makeCoordinator(world, "Bo Lind"), listMoneyToReturn, {})).toHaveLength(1);
  });
});

describe("giving a paid seat back", () => {
  it("shows staff the money to return; once it is given back it buys no seat any more", async () => {
    const { world, outing, family, registrationId } = await oneAlmostThere();
    const page = await openPayment(world, family, registrationId);
    await tellPaid(world, page);
    await allowed(world, family.guardian, withdraw, { registrationId, sure: "yes" });
    const coordinator = makeCoordinator(world);
    const [owed, ...more] = await allowed(world, coordinator, listMoneyToReturn, {});
    expect([owed, more]).toMatchObject([{ nameUsed: "Amaya", why: "withdrawn" }, []]);
    await allowed(world, coordinator, returnPayment, { paymentId: owed?.paymentId });
    expect(await allowed(world, coordinator, listMoneyToReturn, {})).toEqual([]);
    expect(await refused(world, coordinator, returnPayment, { paymentId: owed?.paymentId })).toMatchObject({ code: "nothing-to-return" });
    expect(await tellPaid(world, page, "evt_late_again")).toBe("seen before");
    await register(world, family, outing.slug);
    expect(registrationOf(world, registrationId)).toMatchObject({ state: "held", feeSettled: false });
  });
});
