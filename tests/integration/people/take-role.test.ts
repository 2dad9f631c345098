import { describe, expect, it } from "vitest";
import { becomeGuardian } from "@/lib/families/become-guardian";
import { listChildren } from "@/lib/families/list-children";
import { createLucia } from "@/lib/people/lucia";
import { actorOf } from "@/lib/people/person-store";
import { takeRole } from "@/lib/people/take-role";
import { makeAdmin, makeChaperone, makeCoordinator } from "../../support/actors";
import { allowed, makeWorld, refused } from "../../support/world";

describe("taking a role away", () => {
  it("ends every session of that person at once", async () => {
    const world = makeWorld();
    const admin = makeAdmin(world);
    const coordinator = makeCoordinator(world);
    const sessions = createLucia(world.conn, false);
    const session = await sessions.createSession(coordinator.personId, {});
    await allowed(world, admin, takeRole, { personId: coordinator.personId, role: "coordinator" });
    expect(actorOf(world.conn, coordinator.personId)?.roles).toEqual([]);
    expect((await sessions.validateSession(session.id)).session).toBeNull();
  });

  it("is refused for the last admin, and to everybody but an admin", async () => {
    const world = makeWorld();
    const admin = makeAdmin(world);
    expect(await refused(world, admin, takeRole, { personId: admin.personId, role: "admin" })).toMatchObject({ code: "last-admin" });
    const coordinator = makeCoordinator(world);
    expect(await refused(world, coordinator, takeRole, { personId: admin.personId, role: "admin" })).toMatchObject({ kind: "forbidden" });
  });
});

describe("a chaperone with children of their own", () => {
  it("starts a family page with the account there is, once", async () => {
    const world = makeWorld();
    const chaperone = makeChaperone(world);
    await allowed(world, chaperone, becomeGuardian, {});
    await allowed(world, chaperone, becomeGuardian, {});
    const both = actorOf(world.conn, chaperone.personId);
    expect(both?.roles).toEqual(["chaperone", "guardian"]);
    if (both) expect(await allowed(world, both, listChildren, {})).toEqual([]);
  });
});
