import { expect, it } from "vitest";
import { knex } from "@/db/connection";
import { findOuting } from "@/lib/outings/outing-store";
import { attachSession, findPayment } from "@/lib/payments/payment-store";
import { chooseFee } from "@/lib/payments/choose-fee";
import { confirmNeeds } from "@/lib/registrations/confirm-needs";
import { findRegistrationOfChild } from "@/lib/registrations/registration-store";
import { registerChild } from "@/lib/registrations/register-child";
import { releaseLapsedHolds } from "@/lib/registrations/release-lapsed-holds";
import { withdraw } from "@/lib/registrations/withdraw";
import { signWaiver } from "@/lib/waivers/sign-waiver";
import { theClock } from "@/lib/shared/actor";
import { makeFamilies, signature, tellPaid, type Family } from "../../support/registering";
import { ask, makeOuting, makeWorld, monday, typedProfile, wait, type World } from "../../support/world";
import * as model from "./seat-model";

/** Numbers that are as good as random and the same on every machine (mulberry32, public domain). */
function numbersFrom(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) % below;
  };
}

type Try = { world: World; families: Family[]; outing: { id: string; slug: string }; expected: model.SeatModel; pages: string[][] };

const amounts = [1200, 700];

/** One step in the program and in the model; answers what it was, for the story a failure tells. */
async function step(one: Try, pick: (below: number) => number): Promise<string> {
  const { world, families, outing, expected } = one;
  const child = pick(families.length);
  const family = families[child];
  if (!family) throw new Error("no such family");
  const participantId = family.childId;
  const registrationId = findRegistrationOfChild(world.conn, outing.id, participantId)?.id ?? "none yet";
  const { guardian } = family;
  switch (pick(9)) {
    case 0:
    case 1:
      await ask(world, guardian, registerChild, { slug: outing.slug, participantId });
      model.registers(expected, child, world.now);
      return `${child} registers`;
    case 2:
      await ask(world, guardian, withdraw, { registrationId, sure: "yes" });
      model.withdraws(expected, child, world.now);
      return `${child} withdraws`;
    case 3:
      await ask(world, guardian, confirmNeeds, { ...typedProfile, registrationId, guardianStays: "stays" });
      model.saysNeeds(expected, child, world.now);
      return `${child} says needs`;
    case 4:
      await ask(world, guardian, signWaiver, signature(world, registrationId));
      model.signs(expected, child, world.now);
      return `${child} signs`;
    case 5:
      await ask(world, guardian, chooseFee, { registrationId, choice: "no fee" });
      model.takesNoFee(expected, child, world.now);
      return `${child} takes a no-fee place`;
    case 6:
      return opensPage(one, child, registrationId, amounts[pick(2)] ?? 1200);
    case 7:
      return pays(one, child, pick);
    default:
      wait(world, [0, 1, 20, 46, 3000][pick(5)] ?? 0);
      if (pick(2) === 0) return `it is ${world.now}`;
      await ask(world, theClock, releaseLapsedHolds, {});
      model.settle(expected, world.now);
      return `the clock's round at ${world.now}`;
  }
}

async function opensPage(one: Try, child: number, registrationId: string, amountCents: number): Promise<string> {
  const { world, families, expected, pages } = one;
  const family = families[child];
  if (!family) throw new Error("no such family");
  const otherAmount = String(amountCents / 100);
  const answer = await ask(world, family.guardian, chooseFee, { registrationId, choice: "other", otherAmount });
  if (answer.ok && answer.value.kind === "new page") {
    const sessionId = `cs_${answer.value.payment.id}`;
    attachSession(world.conn, answer.value.payment.id, sessionId, `http://127.0.0.1:1/${sessionId}`);
    pages[child]?.push(sessionId);
  }
  model.opensPage(expected, child, amountCents, world.now);
  return `${child} opens a page for ${otherAmount}`;
}

async function pays(one: Try, child: number, pick: (below: number) => number): Promise<string> {
  const { world, expected, pages } = one;
  const opened = pages[child] ?? [];
  if (opened.length === 0) return `${child} has no page to pay`;
  const at = pick(opened.length);
  const sessionId = opened[at] ?? "";
  const payment = findPayment(world.conn, { checkout_session_id: sessionId });
  if (!payment) throw new Error("the page has no payment");
  await tellPaid(world, { sessionId, amountCents: payment.amount_cents }, `evt_${sessionId}`);
  model.pays(expected, child, at, world.now);
  return `${child} pays page ${at}`;
}

/** States child by child, who sits where, and the queue, from the tables themselves. */
function seenIn({ world, families, outing }: Try) {
  const rows = world.conn.all(
    knex("registrations").where({ outing_id: outing.id }).orderBy(["waiting_since", "id"]).select("id", "participant_id", "state", "hold_ends_at"),
  );
  const holders = world.conn.all(knex("seats").where({ outing_id: outing.id }).whereNotNull("registration_id").select("registration_id"));
  const childOf = (participantId: string) => families.findIndex((family) => family.childId === participantId);
  return {
    states: families.map((family) => rows.find((row) => row.participant_id === family.childId)?.state ?? "none"),
    until: families.map((family) => rows.find((row) => row.participant_id === family.childId)?.hold_ends_at ?? ""),
    seated: holders.map((seat) => childOf(rows.find((row) => row.id === seat.registration_id)?.participant_id ?? "")).sort(),
    queue: rows.filter((row) => row.state === "waiting").map((row) => childOf(row.participant_id)),
  };
}

function expectedOf({ expected }: Try) {
  return {
    states: expected.notes.map((note) => note.state),
    until: expected.notes.map((note) => (note.state === "held" ? note.until : "")),
    seated: expected.notes.flatMap((note, child) => (note.state === "held" || note.state === "confirmed" ? [child] : [])),
    queue: expected.queue,
  };
}

const tries = 300;
const stepsEach = 20;

it(`${tries} random days of ${stepsEach} steps: no seat is sold twice, nobody sits without one, no place in the queue is lost`, { timeout: 60_000 }, async () => {
  const world = makeWorld();
  const families = makeFamilies(world, 5);
  const visited = new Set<string>();
  for (let seed = 1; seed <= tries; seed += 1) {
    world.conn.raw.exec("begin");
    world.now = monday;
    const pick = numbersFrom(seed);
    const outing = makeOuting(world, { seats: 1 + pick(3) });
    const found = findOuting(world.conn, { id: outing.id }, world.now);
    if (!found) throw new Error("the outing is gone");
    const expected = model.emptyModel(found.seats, families.length, found.startsAt);
    const one: Try = { world, families, outing, expected, pages: families.map(() => []) };
    const story: string[] = [];
    for (let at = 0; at < stepsEach && world.now < found.startsAt; at += 1) {
      story.push(await step(one, pick));
      const seen = seenIn(one);
      expect(seen, `day ${seed}: ${story.join("; ")}`).toEqual(expectedOf(one));
      for (const state of seen.states) visited.add(state);
    }
    world.conn.raw.exec("rollback");
  }
  expect([...visited].sort()).toEqual(["confirmed", "held", "none", "waiting", "withdrawn"]);
});
