import { describe, expect, it } from "vitest";
import { insertAnswer, setAnswer } from "@/lib/helpers/helper-store";
import { showOutingForm } from "@/lib/outings/show-outing-form";
import { callOffOuting } from "@/lib/registrations/call-off-outing";
import { changeOuting } from "@/lib/registrations/change-outing";
import { showRegistration } from "@/lib/registrations/show-registration";
import { returnPayment } from "@/lib/payments/return-payment";
import { listMoneyToReturn } from "@/lib/payments/list-money-to-return";
import { withdraw } from "@/lib/registrations/withdraw";
import type { SignedIn } from "@/lib/shared/actor";
import { makeChaperone, makeCoordinator } from "../../support/actors";
import { finish, makeFamily, openPayment, outbox, register, sayNeeds, sign, tellPaid } from "../../support/registering";
import { allowed, makeOuting, makeWorld, refused, type World } from "../../support/world";

async function formOf(world: World, coordinator: SignedIn, slug: string) {
  const { values } = await allowed(world, coordinator, showOutingForm, { slug });
  if (!values) throw new Error("the form is empty");
  return values;
}

async function aDay() {
  const world = makeWorld();
  const coordinator = makeCoordinator(world);
  const outing = makeOuting(world);
  const family = makeFamily(world);
  const { registrationId } = await register(world, family, outing.slug);
  await finish(world, family, registrationId);
  const chaperone = makeChaperone(world);
  setAnswer(world.conn, world.now, insertAnswer(world.conn, world.now, { outingId: outing.id, personId: chaperone.personId, task: "chaperone" }).id, "yes");
  return { world, coordinator, family, chaperone, registrationId, slug: outing.slug };
}

describe("an outing that changes", () => {
  it("is told to everybody who comes, with the new meeting point and a calendar file that replaces the old one", async () => {
    const { world, coordinator, family, chaperone, slug } = await aDay();
    const values = await formOf(world, coordinator, slug);
    await allowed(world, coordinator, changeOuting, { ...values, startTime: "10:00", meetingText: "Come to the pump house." });
    const told = outbox(world, "outing-changed");
    expect(told.map((mail) => mail.to).sort()).toEqual([chaperone.email, family.guardian.email].sort());
    expect(told[0]?.facts).toMatchObject({ outing: { hours: "10 a.m. to noon", meetingText: "Come to the pump house." } });
    expect(told[0]?.facts.calendar).toContain("SEQUENCE:2");
  });

  it("is told to nobody when only its words for newcomers change", async () => {
    const { world, coordinator, slug } = await aDay();
    await allowed(world, coordinator, changeOuting, { ...(await formOf(world, coordinator, slug)), summary: "We listen longer." });
    expect(outbox(world, "outing-changed")).toEqual([]);
  });

  it("never leaves out by its ages who is registered already, and says whom it would", async () => {
    const { world, coordinator, slug } = await aDay();
    const values = await formOf(world, coordinator, slug);
    const refusal = await refused(world, coordinator, changeOuting, { ...values, youngestAge: "12" });
    expect(refusal).toMatchObject({ kind: "invalid", fields: { youngestAge: expect.stringMatching(/Amaya \(\d+\)/) } });
  });

  it("that is called off stands in the family's calendar as cancelled, on their page too, and is not changed any more", async () => {
    const { world, coordinator, family, registrationId, slug } = await aDay();
    const values = await formOf(world, coordinator, slug);
    await allowed(world, coordinator, callOffOuting, { slug, because: "A storm is coming." });
    const [mail] = outbox(world, "called-off");
    expect(mail?.facts.calendar).toMatch(/METHOD:CANCEL[\s\S]*STATUS:CANCELLED/);
    const view = await allowed(world, family.guardian, showRegistration, { registrationId });
    expect([view.isOn, view.stateInWords]).toEqual([false, "This outing is called off. A storm is coming."]);
    expect(await refused(world, coordinator, changeOuting, { ...values, title: "Another day" })).toMatchObject({ code: "over" });
  });
});

describe("money that was given back", () => {
  it("is off the list, and buys no seat when the family registers again", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const outing = makeOuting(world);
    const family = makeFamily(world);
    const { registrationId } = await register(world, family, outing.slug);
    await sayNeeds(world, family, registrationId);
    await sign(world, family, registrationId);
    await tellPaid(world, await openPayment(world, family, registrationId));
    await allowed(world, family.guardian, withdraw, { registrationId, sure: "yes" });
    const [owed] = await allowed(world, coordinator, listMoneyToReturn, {});
    expect(owed).toMatchObject({ amountCents: 1200, why: "withdrawn" });
    await allowed(world, coordinator, returnPayment, { paymentId: owed?.paymentId });
    expect(await allowed(world, coordinator, listMoneyToReturn, {})).toEqual([]);
    expect(await refused(world, coordinator, returnPayment, { paymentId: owed?.paymentId })).toMatchObject({ code: "nothing-to-return" });
    const again = await register(world, family, outing.slug);
    expect((await allowed(world, family.guardian, showRegistration, { registrationId: again.registrationId })).stepsLeft).toEqual(["fee"]);
  });
});
