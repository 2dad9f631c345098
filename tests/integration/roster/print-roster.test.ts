import { describe, expect, it } from "vitest";
import { knex } from "@/db/connection";
import { insertAnswer, setAnswer } from "@/lib/helpers/helper-store";
import { listDays } from "@/lib/roster/list-days";
import { listPapers } from "@/lib/roster/list-papers";
import { openPaper } from "@/lib/roster/open-paper";
import { printRoster } from "@/lib/roster/print-roster";
import { renderRoster } from "@/lib/roster/render-roster";
import { confirmNeeds } from "@/lib/registrations/confirm-needs";
import { withdraw } from "@/lib/registrations/withdraw";
import { makeChaperone, makeCoordinator, makeLeader } from "../../support/actors";
import { makeFamily, register, sayNeeds, sign, takeNoFeePlace, type Family } from "../../support/registering";
import { allowed, makeOuting, makeWorld, refused, typedProfile, wait, writeProfileOf, type World } from "../../support/world";

async function comes(world: World, family: Family, slug: string, needs: Record<string, unknown> = {}): Promise<string> {
  const { registrationId } = await register(world, family, slug);
  await sayNeeds(world, family, registrationId, needs);
  await sign(world, family, registrationId);
  await takeNoFeePlace(world, family, registrationId);
  return registrationId;
}

async function aDay() {
  const world = makeWorld();
  const coordinator = makeCoordinator(world);
  const outing = makeOuting(world);
  const leader = makeLeader(world);
  const asked = insertAnswer(world.conn, world.now, { outingId: outing.id, personId: leader.personId, task: "leader" });
  setAnswer(world.conn, world.now, asked.id, "yes");
  const families = { amaya: makeFamily(world), tomas: makeFamily(world, "Nils Holm", "Tomás") };
  const ids = { amaya: await comes(world, families.amaya, outing.slug), tomas: await comes(world, families.tomas, outing.slug) };
  return { world, coordinator, outing, leader, families, ids, slug: outing.slug };
}

describe("the roster", () => {
  it("keeps its version while nothing changed, in whatever form, and has the next one after a change", async () => {
    const { world, coordinator, slug, families, ids } = await aDay();
    const print = (form: string) => allowed(world, coordinator, printRoster, { slug, form });
    const first = await print("standard");
    expect(first.version).toBe(1);
    wait(world, 30);
    expect(await print("standard")).toEqual(first);
    expect((await print("large print")).version).toBe(1);
    expect((await allowed(world, coordinator, listPapers, { slug })).isCurrent).toBe(true);
    await allowed(world, families.tomas.guardian, withdraw, { registrationId: ids.tomas, sure: "yes" });
    expect((await allowed(world, coordinator, listPapers, { slug })).isCurrent).toBe(false);
    expect((await print("standard")).version).toBe(2);
  });

  it("keeps everybody's count-off number when somebody withdraws", async () => {
    const { world, coordinator, slug, families, ids } = await aDay();
    await allowed(world, families.amaya.guardian, withdraw, { registrationId: ids.amaya, sure: "yes" });
    const { facts } = await allowed(world, coordinator, listPapers, { slug });
    expect(facts.people.map(({ number, nameUsed }) => [number, nameUsed])).toEqual([[2, "Tomás"]]);
  });

  it("says what to do with a person in the family's words, and nothing of legal names, contacts or money", async () => {
    const { world, coordinator, slug } = await aDay();
    const { facts } = await allowed(world, coordinator, listPapers, { slug });
    expect(facts.people[0]).toMatchObject({
      number: 1, nameUsed: "Amaya", travel: ["guide", "cane"], supportLevel: "occasional", photo: "no", voice: "ok",
    });
    expect(facts.people[0]?.actionNotes).toContain("says when she wants quiet");
    expect(JSON.stringify(facts)).not.toMatch(/Reyes|360 555 0119|2016-06-15|no.fee|\$/);
  });

  it("never says a diagnosis: the family is told at once, and an older note is asked about instead of printed", async () => {
    const { world, coordinator, slug } = await aDay();
    const family = makeFamily(world, "Hanne Strand", "Wren");
    const { registrationId } = await register(world, family, slug);
    const needs = { ...typedProfile, registrationId, guardianStays: "stays", leaderNote: "has asthma" };
    expect(await refused(world, family.guardian, confirmNeeds, needs)).toMatchObject({ kind: "invalid", fields: { leaderNote: expect.any(String) } });
    await sayNeeds(world, family, registrationId);
    await sign(world, family, registrationId);
    await takeNoFeePlace(world, family, registrationId);
    const profileId = writeProfileOf(world, family.guardian, family.childId, { leaderNote: "has asthma" });
    world.conn.run(knex("registrations").where({ id: registrationId }).update({ profile_id: profileId }));
    await allowed(world, coordinator, printRoster, { slug, form: "standard" });
    const { facts } = await allowed(world, coordinator, listPapers, { slug });
    expect(JSON.stringify(facts)).not.toContain("asthma");
    expect(facts.people.find((person) => person.nameUsed === "Wren")?.actionNotes).toContain("ask the coordinator");
  });

  it("takes people whose names look like something else", async () => {
    const { world, coordinator, slug, outing } = await aDay();
    const foster = makeChaperone(world, "June Foster");
    const asked = insertAnswer(world.conn, world.now, { outingId: outing.id, personId: foster.personId, task: "chaperone" });
    setAnswer(world.conn, world.now, asked.id, "yes");
    await comes(world, makeFamily(world, "Hanne Strand", "Al"), slug);
    await allowed(world, coordinator, printRoster, { slug, form: "standard" });
  });

  it("is the same bytes each time it is opened, and every opening and printing is logged", async () => {
    const { world, leader, slug } = await aDay();
    const { paperId } = await allowed(world, leader, printRoster, { slug, form: "large print", textSizePt: "24" });
    const paper = await allowed(world, leader, openPaper, { paperId });
    expect(paper).toMatchObject({ form: "large print", textSizePt: 24 });
    const [one, other] = await Promise.all([renderRoster(paper), renderRoster(await allowed(world, leader, openPaper, { paperId }))]);
    expect(Buffer.from(one).equals(Buffer.from(other))).toBe(true);
    expect(Buffer.from(one).subarray(0, 5).toString()).toBe("%PDF-");
    const log = world.conn.all(knex("access_log").orderBy("id").select("person_id", "what"));
    expect(log.map(({ what }) => what)).toEqual(["printed the roster", "opened roster version 1", "opened roster version 1"]);
    expect(new Set(log.map(({ person_id }) => person_id))).toEqual(new Set([leader.personId]));
  });

  it.each([["large print", "8", 18], ["large print", "99", 36], ["standard", "30", 14]])("in %s of %s points comes in %s", async (form, textSizePt, size) => {
    const { world, leader, slug } = await aDay();
    const { paperId } = await allowed(world, leader, printRoster, { slug, form, textSizePt });
    expect((await allowed(world, leader, openPaper, { paperId })).textSizePt).toBe(size);
  });
});

describe("a leader's access to the people of a day", () => {
  it("ends three days after it", async () => {
    const { world, leader, slug } = await aDay();
    const { paperId } = await allowed(world, leader, printRoster, { slug, form: "standard" });
    world.now = "2027-01-12T20:00:00.000Z";
    await allowed(world, leader, openPaper, { paperId });
    expect(await allowed(world, leader, listDays, {})).toHaveLength(1);
    world.now = "2027-01-12T20:00:00.001Z";
    for (const [useCase, input] of [[openPaper, { paperId }], [printRoster, { slug, form: "standard" }], [listPapers, { slug }]] as const) {
      const outcome = await useCase({ conn: world.conn, actor: leader, now: world.now }, input);
      expect(outcome).toMatchObject({ ok: false });
    }
    expect(await allowed(world, leader, listDays, {})).toEqual([]);
  });

  it("is for the day's own leader who said yes", async () => {
    const { world, slug, outing } = await aDay();
    const other = makeLeader(world, "Hanne Strand");
    expect((await refused(world, other, listPapers, { slug })).kind).toBe("not-found");
    const asked = insertAnswer(world.conn, world.now, { outingId: outing.id, personId: other.personId, task: "leader" });
    for (const answer of ["maybe", "no"] as const) {
      setAnswer(world.conn, world.now, asked.id, answer);
      expect((await refused(world, other, listPapers, { slug })).kind).toBe("not-found");
    }
    setAnswer(world.conn, world.now, asked.id, "yes");
    await allowed(world, other, listPapers, { slug });
  });
});
