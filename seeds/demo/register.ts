import { attachCheckout } from "@/lib/payments/attach-checkout";
import { chooseFee } from "@/lib/payments/choose-fee";
import { takeCheckoutEvent } from "@/lib/payments/take-checkout-event";
import { confirmNeeds } from "@/lib/registrations/confirm-needs";
import { registerChild } from "@/lib/registrations/register-child";
import { withdraw } from "@/lib/registrations/withdraw";
import { payments } from "@/lib/shared/actor";
import { dayOf, minutesLater } from "@/lib/shared/dates";
import { sha256 } from "@/lib/shared/ids";
import { showWaiver } from "@/lib/waivers/show-waiver";
import { signWaiver } from "@/lib/waivers/sign-waiver";
import type { DemoRegistration } from "./outings";
import type { SeededChild } from "./seed-families";
import { must, sendPost, type Story } from "./story";

type Going = { slug: string; child: SeededChild; at: string };

/** A family's whole way to a confirmed seat: hold, needs, waiver, fee. */
export async function registerWholly(story: Story, going: Going, told: DemoRegistration): Promise<string> {
  const { conn } = story;
  const { slug, child, at } = going;
  const actor = child.guardian;
  const { participantId } = child;
  const { registrationId } = must(await registerChild({ conn, actor, now: at }, { slug, participantId }));
  must(
    await confirmNeeds(
      { conn, actor, now: minutesLater(at, 4) },
      { registrationId, guardianStays: told.guardianStays ?? "drops off", thisTime: told.thisTime ?? "", ...child.profile },
    ),
  );
  await sign(story, { registrationId, child, at: minutesLater(at, 9) });
  await pay(story, { registrationId, child, at: minutesLater(at, 10), fee: told.fee });
  await sendPost(story, minutesLater(at, 13));
  return registrationId;
}

type Registered = { registrationId: string; child: SeededChild; at: string };

export async function giveSeatBack(story: Story, { registrationId, child, at }: Registered): Promise<void> {
  must(await withdraw({ conn: story.conn, actor: child.guardian, now: at }, { registrationId, sure: "yes" }));
  await sendPost(story, at);
}

/** Comes after the last seat is gone. */
export async function joinWaitingList(story: Story, { slug, child, at }: Going): Promise<void> {
  const asked = { conn: story.conn, actor: child.guardian, now: at };
  const { state } = must(await registerChild(asked, { slug, participantId: child.participantId }));
  if (state !== "waiting") throw new Error(`${slug} was meant to be full, and a child was given a place: ${state}.`);
  await sendPost(story, at);
}

async function sign(story: Story, { registrationId, child, at: now }: Registered): Promise<void> {
  const asked = { conn: story.conn, actor: child.guardian, now };
  const text = must(await showWaiver(asked, {}));
  must(
    await signWaiver(asked, {
      registrationId,
      textSha256: text.sha256,
      typedName: child.guardian.name,
      typedDate: dayOf(now, story.zone),
      agree: "yes",
    }),
  );
}

type Paying = Registered & { fee: DemoRegistration["fee"] };

async function pay(story: Story, { registrationId, child, at, fee }: Paying): Promise<void> {
  const { conn } = story;
  const answer = must(await chooseFee({ conn, actor: child.guardian, now: at }, { registrationId, ...choiceOf(fee) }));
  if (answer.kind !== "new page") return;
  const { id, amountCents, currency } = answer.payment;
  const mark = sha256(id).slice(0, 24);
  const sessionId = `cs_demo_${mark}`;
  const url = `https://pay.saltgrass.example/${sessionId}`;
  must(await attachCheckout({ conn, actor: payments, now: at }, { paymentId: id, sessionId, url }));
  const event = {
    eventId: `evt_demo_${mark}`,
    eventType: "checkout.session.completed",
    paymentIntentId: `pi_demo_${mark}`,
  };
  const asked = { conn, actor: payments, now: minutesLater(at, 2) };
  must(await takeCheckoutEvent(asked, { ...event, sessionId, amountCents, currency }));
}

function choiceOf(fee: DemoRegistration["fee"]) {
  if (fee === undefined) return { choice: "suggested" };
  return fee === "no fee" ? { choice: fee } : { choice: "other", otherAmount: fee };
}
