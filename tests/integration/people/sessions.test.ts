import { expect, it } from "vitest";
import { createLucia } from "@/lib/people/lucia";
import { sha256 } from "@/lib/shared/ids";
import { makeGuardian } from "../../support/actors";
import { makeWorld } from "../../support/world";

it("a session is found by its cookie and stored as a hash, so a copy of the database signs nobody in", async () => {
  const world = makeWorld();
  const guardian = makeGuardian(world);
  const sessions = createLucia(world.conn, true);
  const { id } = await sessions.createSession(guardian.personId, {});
  const [stored] = world.conn.raw.prepare("select id from sessions").all() as { id: string }[];
  expect(stored?.id).toBe(sha256(id));
  const found = await sessions.validateSession(id);
  expect([found.session?.id, found.user?.id]).toEqual([id, guardian.personId]);
  expect((await sessions.validateSession(stored?.id ?? "")).session).toBeNull();
});

it("signing out ends this device's session and leaves the others", async () => {
  const world = makeWorld();
  const guardian = makeGuardian(world);
  const sessions = createLucia(world.conn, true);
  const here = await sessions.createSession(guardian.personId, {});
  const there = await sessions.createSession(guardian.personId, {});
  await sessions.invalidateSession(here.id);
  expect((await sessions.validateSession(here.id)).session).toBeNull();
  expect((await sessions.validateSession(there.id)).session?.id).toBe(there.id);
});

it("the cookie is out of reach of scripts and of other sites, and goes over HTTPS alone where there is HTTPS", () => {
  const { conn } = makeWorld();
  const { attributes } = createLucia(conn, true).createSessionCookie("x");
  expect(attributes).toMatchObject({ httpOnly: true, sameSite: "lax", path: "/", secure: true });
  expect(createLucia(conn, false).createSessionCookie("x").attributes.secure).toBe(false);
});
