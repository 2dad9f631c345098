import { describe, expect, it } from "vitest";
import { knex } from "@/db/connection";
import { insertAnswer, setAnswer } from "@/lib/helpers/helper-store";
import { openContacts } from "@/lib/roster/open-contacts";
import { makeChaperone, makeCoordinator, makeGuardian, makeLeader } from "../../support/actors";
import { finish, makeFamily, register } from "../../support/registering";
import { allowed, makeOuting, makeWorld, refused, wait } from "../../support/world";

async function aDay() {
  const world = makeWorld();
  const outing = makeOuting(world);
  const leader = makeLeader(world);
  const asked = insertAnswer(world.conn, world.now, { outingId: outing.id, personId: leader.personId, task: "leader" });
  setAnswer(world.conn, world.now, asked.id, "yes");
  const family = makeFamily(world);
  const { registrationId } = await register(world, family, outing.slug);
  await finish(world, family, registrationId);
  return { world, leader, slug: outing.slug };
}

describe("contacts and pick-up of a day", () => {
  it("are whom to call and who may collect, and each reading is noted", async () => {
    const { world, slug } = await aDay();
    const coordinator = makeCoordinator(world);
    const { people } = await allowed(world, coordinator, openContacts, { slug, at: "desk" });
    expect(people).toHaveLength(1);
    expect(people[0]?.contacts[0]?.phone).toMatch(/\d/);
    expect(people[0]?.pickUp.length).toBeGreaterThan(0);
    const noted = world.conn.all(knex("access_log").select("person_id", "what"));
    expect(noted).toContainEqual({ person_id: coordinator.personId, what: "opened contacts and pick-up list" });
  });

  it("show the leader of the day no legal name, and nothing at the desk", async () => {
    const { world, leader, slug } = await aDay();
    const { people } = await allowed(world, leader, openContacts, { slug, at: "field" });
    expect(people[0]?.staffOnly).toBeNull();
    expect(JSON.stringify(people)).not.toContain("legalName");
    expect(await refused(world, leader, openContacts, { slug, at: "desk" })).toMatchObject({ kind: "forbidden" });
  });

  it("are closed to the leader four days after, and always to chaperones, other leaders and families", async () => {
    const { world, leader, slug } = await aDay();
    for (const other of [makeChaperone(world), makeLeader(world, "Sam Other"), makeGuardian(world, "Ada Other")]) {
      expect(await refused(world, other, openContacts, { slug })).toMatchObject({ kind: "not-found" });
    }
    wait(world, 60 * 24 * 12);
    expect(await refused(world, leader, openContacts, { slug })).toMatchObject({ kind: "forbidden" });
  });
});
