import { knex } from "@/db/connection";
import { attachSession } from "@/lib/payments/payment-store";
import { chooseFee, type CheckoutWanted } from "@/lib/payments/choose-fee";
import { takeCheckoutEvent, type EventAnswer } from "@/lib/payments/take-checkout-event";
import { confirmNeeds } from "@/lib/registrations/confirm-needs";
import { registerChild } from "@/lib/registrations/register-child";
import { findRegistration, type Registration } from "@/lib/registrations/registration-store";
import { payments, type SignedIn } from "@/lib/shared/actor";
import { dayOf } from "@/lib/shared/dates";
import { signWaiver } from "@/lib/waivers/sign-waiver";
import { makeGuardian } from "./actors";
import { allowed, makeChild, typedProfile, zone, type World } from "./world";

/** A family with one child, for when a test needs many of them. */
export type Family = { guardian: SignedIn; childId: string };

export function makeFamilies(world: World, count: number): Family[] {
  return Array.from({ length: count }, (_, at) => makeFamily(world, `Guardian ${at + 1}`, `Child ${at + 1}`));
}

export function makeFamily(world: World, guardianName = "Rosa Reyes", childName = "Amaya"): Family {
  const guardian = makeGuardian(world, guardianName);
  return { guardian, childId: makeChild(world, guardian, { nameUsed: childName }) };
}

export function register(world: World, { guardian, childId }: Family, slug: string) {
  return allowed(world, guardian, registerChild, { slug, participantId: childId });
}

export function sayNeeds(world: World, { guardian }: Family, registrationId: string, changes: Record<string, unknown> = {}) {
  return allowed(world, guardian, confirmNeeds, { ...typedProfile, registrationId, guardianStays: "drops off", ...changes });
}

export function sign(world: World, { guardian }: Family, registrationId: string) {
  return allowed(world, guardian, signWaiver, signature(world, registrationId));
}

/** What the waiver's form sends, with nothing wrong in it. */
export function signature(world: World, registrationId: string) {
  const typedDate = dayOf(world.now, zone);
  return { registrationId, textSha256: world.waiver.sha256, typedName: "Rosa Reyes", typedDate, agree: "yes" };
}

export function takeNoFeePlace(world: World, { guardian }: Family, registrationId: string) {
  return allowed(world, guardian, chooseFee, { registrationId, choice: "no fee" });
}

/** Needs, waiver and a no-fee place: the seat is confirmed after it. */
export async function finish(world: World, family: Family, registrationId: string): Promise<void> {
  await sayNeeds(world, family, registrationId);
  await sign(world, family, registrationId);
  await takeNoFeePlace(world, family, registrationId);
}

/** Chooses an amount to pay and opens the payment page for it; answers what the page is for. */
export async function openPayment(
  world: World,
  { guardian }: Family,
  registrationId: string,
  amount?: string,
): Promise<CheckoutWanted & { sessionId: string }> {
  const choice = amount === undefined ? { choice: "suggested" } : { choice: "other", otherAmount: amount };
  const answer = await allowed(world, guardian, chooseFee, { registrationId, ...choice });
  if (answer.kind !== "new page") throw new Error(`no new page, but ${answer.kind}`);
  const sessionId = `cs_${answer.payment.id}`;
  attachSession(world.conn, answer.payment.id, sessionId, `http://127.0.0.1:1/${sessionId}`);
  return { ...answer.payment, sessionId };
}

let events = 0;

/** The payment service tells that a page was paid. */
export function tellPaid(
  world: World,
  page: { sessionId: string; amountCents: number },
  eventId = `evt_${(events += 1)}`,
): Promise<EventAnswer> {
  return allowed(world, payments, takeCheckoutEvent, {
    eventId,
    eventType: "checkout.session.completed",
    sessionId: page.sessionId,
    paymentIntentId: `pi_${page.sessionId}`,
    amountCents: page.amountCents,
    currency: "usd",
  });
}

export function registrationOf(world: World, registrationId: string): Registration {
  const registration = findRegistration(world.conn, registrationId, world.now);
  if (!registration) throw new Error(`there is no registration ${registrationId}`);
  return registration;
}

/** The mails in the outbox, oldest first: what kind, to whom, and their facts. */
export function outbox(world: World, kind?: string): { kind: string; to: string; facts: Record<string, unknown> }[] {
  const query = knex("messages").orderBy("rowid").select("kind", "to_address", "facts");
  if (kind !== undefined) query.where({ kind });
  return world.conn.all(query).map((row) => ({ kind: row.kind, to: row.to_address, facts: JSON.parse(row.facts) as Record<string, unknown> }));
}
