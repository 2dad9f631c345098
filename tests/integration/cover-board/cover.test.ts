import { describe, expect, it } from "vitest";
import { checkOutingCover } from "@/lib/cover-board/check-outing-cover";
import { pairPeople } from "@/lib/cover-board/pair-people";
import { answerRequest } from "@/lib/helpers/answer-request";
import { askToHelp } from "@/lib/helpers/ask-to-help";
import { listMyRequests } from "@/lib/helpers/list-my-requests";
import { withdraw } from "@/lib/registrations/withdraw";
import type { SignedIn } from "@/lib/shared/actor";
import { makeChaperone, makeCoordinator, makeLeader } from "../../support/actors";
import { makeFamily, register, sayNeeds, sign, takeNoFeePlace, type Family } from "../../support/registering";
import { allowed, makeOuting, makeWorld, refused, type World } from "../../support/world";

async function comes(world: World, family: Family, slug: string, needs: Record<string, unknown> = {}): Promise<string> {
  const { registrationId } = await register(world, family, slug);
  await sayNeeds(world, family, registrationId, needs);
  await sign(world, family, registrationId);
  await takeNoFeePlace(world, family, registrationId);
  return registrationId;
}

async function says(world: World, coordinator: SignedIn, helper: SignedIn, slug: string, answer: "yes" | "maybe" | "no"): Promise<void> {
  const task = helper.roles.includes("leader") ? "leader" : "chaperone";
  await allowed(world, coordinator, askToHelp, { slug, personIds: helper.personId, task });
  const { requests } = await allowed(world, helper, listMyRequests, {});
  await allowed(world, helper, answerRequest, { answerId: requests[0]?.answerId, answer });
}

async function aDay() {
  const world = makeWorld();
  const coordinator = makeCoordinator(world);
  const { slug } = makeOuting(world);
  const amaya = await comes(world, makeFamily(world), slug);
  const check = () => allowed(world, coordinator, checkOutingCover, { slug });
  return { world, coordinator, slug, amaya, check };
}

describe("the cover of an outing", () => {
  it("is short without adults and covered once two unrelated cleared ones say yes and everybody has somebody", async () => {
    const { world, coordinator, slug, amaya, check } = await aDay();
    expect((await check()).verdict.covered).toBe(false);
    const marcus = makeChaperone(world);
    await says(world, coordinator, marcus, slug, "yes");
    await says(world, coordinator, makeLeader(world), slug, "yes");
    await allowed(world, coordinator, pairPeople, { slug, pair: { [amaya]: marcus.personId } });
    const { verdict, people } = await check();
    expect(verdict.covered).toBe(true);
    expect(verdict.counts).toMatchObject({ people: 1, adultsWhoCount: 2 });
    expect(people).toMatchObject([{ nameUsed: "Amaya", number: 1, adultId: marcus.personId, support: "occasional" }]);
  });

  it("counts a maybe, an unanswered request and a lapsed clearance for nothing", async () => {
    const { world, coordinator, slug, check } = await aDay();
    await says(world, coordinator, makeChaperone(world, "Maybe Moss"), slug, "maybe");
    await says(world, coordinator, makeChaperone(world, "Lapsed Lund", { clearedUntil: "2027-01-08" }), slug, "yes");
    await allowed(world, coordinator, askToHelp, { slug, personIds: makeChaperone(world, "Asked Aas").personId, task: "chaperone" });
    const { verdict } = await check();
    expect(verdict.counts.adultsWhoCount).toBe(0);
    expect(verdict.adults.find((adult) => adult.name === "Lapsed Lund")?.reasons.map(({ code }) => code)).toEqual(["clearance-ends"]);
  });

  it("counts those who are confirmed, not those who hold a seat or have withdrawn", async () => {
    const { world, slug, check } = await aDay();
    await register(world, makeFamily(world, "Nils Holm", "Pia"), slug);
    const gone = makeFamily(world, "Hanne Strand", "Wren");
    const registrationId = await comes(world, gone, slug);
    expect((await check()).verdict.counts.people).toBe(2);
    await allowed(world, gone.guardian, withdraw, { registrationId, sure: "yes" });
    expect((await check()).people.map((person) => person.nameUsed)).toEqual(["Amaya"]);
  });

  it("lets a guardian who stays look after their own child, and be counted for nobody else without a clearance", async () => {
    const { world, coordinator, slug, check } = await aDay();
    const family = makeFamily(world, "Nils Holm", "Pia");
    const pia = await comes(world, family, slug, { guardianStays: "stays", support: "constant" });
    await allowed(world, coordinator, pairPeople, { slug, pair: { [pia]: family.guardian.personId } });
    const { verdict } = await check();
    expect(verdict.adults).toMatchObject([{ name: "Nils Holm", standing: "own-child-only" }]);
    expect(verdict.counts.adultsWhoCount).toBe(0);
  });

  it("uses the needs as they were told for this outing, not a profile changed later", async () => {
    const { world, slug, check } = await aDay();
    await comes(world, makeFamily(world, "Nils Holm", "Pia"), slug, { support: "constant", travel: "wheelchair", chair: "pushed", transfer: "alone" });
    const { people } = await check();
    expect(people).toMatchObject([{ nameUsed: "Amaya", chair: null }, { nameUsed: "Pia", support: "constant", chair: "pushed" }]);
  });
});

describe("pairing people", () => {
  it("with an adult who is not coming any more is refused beside the person, and nothing of the form is kept", async () => {
    const { world, coordinator, slug, amaya, check } = await aDay();
    const pia = await comes(world, makeFamily(world, "Nils Holm", "Pia"), slug);
    const marcus = makeChaperone(world);
    await says(world, coordinator, marcus, slug, "yes");
    const gone = makeChaperone(world, "Gone Gran");
    await says(world, coordinator, gone, slug, "no");
    const refusal = await refused(world, coordinator, pairPeople, { slug, pair: { [amaya]: marcus.personId, [pia]: gone.personId } });
    expect(refusal).toMatchObject({ kind: "invalid", fields: { [`pair.${pia}`]: "The adult chosen for Pia is not coming any more. Choose another." } });
    expect((await check()).people.map((person) => person.adultId)).toEqual([null, null]);
  });

  it("touches only the people the form names, takes somebody off with an empty choice, and ignores other outings' people", async () => {
    const { world, coordinator, slug, amaya, check } = await aDay();
    const marcus = makeChaperone(world);
    await says(world, coordinator, marcus, slug, "yes");
    await allowed(world, coordinator, pairPeople, { slug, pair: { [amaya]: marcus.personId, elsewhere: marcus.personId } });
    await allowed(world, coordinator, pairPeople, { slug });
    expect((await check()).people.map((person) => person.adultId)).toEqual([marcus.personId]);
    await allowed(world, coordinator, pairPeople, { slug, pair: { [amaya]: "" } });
    expect((await check()).people.map((person) => person.adultId)).toEqual([null]);
  });
});
