import { describe, expect, it } from "vitest";
import { knex } from "@/db/connection";
import { findHouseholdOf } from "@/lib/families/household-store";
import { acceptInvitation } from "@/lib/people/accept-invitation";
import { askForSignInLink } from "@/lib/people/ask-for-sign-in-link";
import { changeReading } from "@/lib/people/change-reading";
import { followMailLink } from "@/lib/people/follow-mail-link";
import { invite } from "@/lib/people/invite";
import { attemptsAllowed } from "@/lib/people/person";
import { actorOf, findPersonByEmail } from "@/lib/people/person-store";
import { showMailLink } from "@/lib/people/show-mail-link";
import { showMe } from "@/lib/people/show-me";
import { signIn } from "@/lib/people/sign-in";
import { signUp } from "@/lib/people/sign-up";
import { visitor } from "@/lib/shared/actor";
import { makeAdmin, makeCoordinator, makeGuardian } from "../../support/actors";
import { outbox } from "../../support/registering";
import { allowed, ask, makeWorld, refused, wait, type World } from "../../support/world";

const ada = { name: "Ada Moss", email: "Ada@Example.org ", password: "salt and reeds and rain" };
const credentials = { email: "ada@example.org", password: ada.password };

/** The secret in the newest mail of a kind. */
function secretIn(world: World, kind: string): string {
  const link = String(outbox(world, kind).at(-1)?.facts.link);
  return link.slice(link.lastIndexOf("/") + 1);
}

async function confirmedAda(): Promise<World> {
  const world = makeWorld();
  await allowed(world, visitor, signUp, ada);
  await allowed(world, visitor, followMailLink, { secret: secretIn(world, "confirm-email") });
  return world;
}

describe("signing up", () => {
  it("makes a guardian with a household once the mailed link is followed; before it the password opens nothing", async () => {
    const world = makeWorld();
    await allowed(world, visitor, signUp, ada);
    expect(findPersonByEmail(world.conn, "ada@example.org")).toMatchObject({ roles: [], emailConfirmed: false, hasPassword: false });
    expect((await allowed(world, visitor, signIn, credentials)).kind).not.toBe("signed-in");
    const { personId } = await allowed(world, visitor, followMailLink, { secret: secretIn(world, "confirm-email") });
    expect(actorOf(world.conn, personId)).toMatchObject({ name: "Ada Moss", roles: ["guardian"] });
    expect(findHouseholdOf(world.conn, personId)).not.toBeNull();
    expect((await allowed(world, visitor, signIn, credentials)).kind).toBe("signed-in");
  });

  it("answers the same for an address that has an account, which gets a sign-in link and keeps its password", async () => {
    const world = await confirmedAda();
    const known = await ask(world, visitor, signUp, { ...ada, name: "Mallory", password: "another password" });
    const unknown = await ask(world, visitor, signUp, { ...ada, email: "bo@example.org" });
    expect(known).toEqual({ ok: true, value: { email: "ada@example.org" } });
    expect(unknown).toEqual({ ok: true, value: { email: "bo@example.org" } });
    expect(findPersonByEmail(world.conn, "ada@example.org")?.name).toBe("Ada Moss");
    expect((await allowed(world, visitor, signIn, credentials)).kind).toBe("signed-in");
    expect(outbox(world, "already-registered")).toHaveLength(1);
  });

  it("by a stranger with somebody's address never gives the stranger's password to the account, in whatever order", async () => {
    const theirs = { ...ada, name: "Mallory", password: "the stranger's password" };
    for (const order of [[theirs, ada], [ada, theirs]]) {
      const world = makeWorld();
      const secrets = new Map<string, string>();
      for (const form of order) {
        await allowed(world, visitor, signUp, form);
        secrets.set(form.password, secretIn(world, "confirm-email"));
      }
      await allowed(world, visitor, followMailLink, { secret: secrets.get(ada.password) });
      await ask(world, visitor, followMailLink, { secret: secrets.get(theirs.password) });
      expect(await allowed(world, visitor, signIn, { ...credentials, password: theirs.password })).toEqual({ kind: "wrong" });
      expect((await allowed(world, visitor, signIn, credentials)).kind).toBe("signed-in");
      expect(findPersonByEmail(world.conn, "ada@example.org")?.name).toBe("Ada Moss");
    }
  });

  it("by a stranger is not made true by a sign-in link the owner asks for", async () => {
    const world = makeWorld();
    await allowed(world, visitor, signUp, { ...ada, password: "the stranger's password" });
    await allowed(world, visitor, askForSignInLink, { linkEmail: "ada@example.org" });
    await allowed(world, visitor, followMailLink, { secret: secretIn(world, "sign-in-link") });
    expect(await allowed(world, visitor, signIn, { ...credentials, password: "the stranger's password" })).toEqual({ kind: "wrong" });
  });

  it("at once with the same address makes one account", async () => {
    const world = makeWorld();
    await Promise.all(Array.from({ length: 8 }, () => allowed(world, visitor, signUp, ada)));
    expect(world.conn.all(knex("people").select("id"))).toHaveLength(1);
  });

  it.each([
    [{ name: "" }, "name", "Enter a name."],
    [{ email: "ada at example" }, "email", "Enter an e-mail address like name@example.org."],
    [{ password: "short" }, "password", "Use at least 10 characters. Several words in a row are easy to keep."],
    [{ phone: "12" }, "phone", "Enter a phone number with area code, such as 360 555 0100."],
  ])("with %j says what to do about %s", async (change, field, sentence) => {
    const refusal = await refused(makeWorld(), visitor, signUp, { ...ada, ...change });
    expect(refusal).toMatchObject({ kind: "invalid", fields: { [field]: sentence } });
  });

  it("keeps a name with any letters as it was typed", async () => {
    const world = makeWorld();
    await allowed(world, visitor, signUp, { ...ada, name: "Łucja O’Brien-Ñúñez 阮" });
    expect(findPersonByEmail(world.conn, "ada@example.org")?.name).toBe("Łucja O’Brien-Ñúñez 阮");
  });

  it("stores neither the password nor a link's secret", async () => {
    const world = makeWorld();
    await allowed(world, visitor, signUp, ada);
    const secret = secretIn(world, "confirm-email");
    const links = JSON.stringify(world.conn.all(knex("mail_links").select("secret_hash", "purpose", "person_id", "about_id", "carries")));
    for (const hidden of [secret, ada.password]) expect(links).not.toContain(hidden);
    await allowed(world, visitor, followMailLink, { secret });
    expect(JSON.stringify(world.conn.all(knex("people").select("password_hash")))).toMatch(/\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });
});

describe("signing in", () => {
  it("answers a wrong password and an unknown address with the same words", async () => {
    const world = await confirmedAda();
    const wrong = await ask(world, visitor, signIn, { ...credentials, password: "not this one" });
    const unknown = await ask(world, visitor, signIn, { ...credentials, email: "nobody@example.org" });
    expect(wrong).toEqual(unknown);
    expect(wrong).toEqual({ ok: true, value: { kind: "wrong" } });
  });

  it("is closed after ten wrong answers in a quarter of an hour, even to the right one, and open again after it", async () => {
    const world = await confirmedAda();
    for (let n = 0; n < attemptsAllowed.count; n += 1) {
      expect(await allowed(world, visitor, signIn, { ...credentials, password: `guess number ${n}` })).toEqual({ kind: "wrong" });
    }
    expect(await allowed(world, visitor, signIn, credentials)).toEqual({ kind: "too-many" });
    wait(world, attemptsAllowed.minutes);
    expect((await allowed(world, visitor, signIn, credentials)).kind).toBe("signed-in");
  });

  it("forgets wrong answers after a right one, and counts each address for itself", async () => {
    const world = await confirmedAda();
    for (let n = 0; n < attemptsAllowed.count - 1; n += 1) await ask(world, visitor, signIn, { ...credentials, password: `guess ${n}` });
    expect((await allowed(world, visitor, signIn, credentials)).kind).toBe("signed-in");
    expect(await allowed(world, visitor, signIn, { ...credentials, password: "a wrong one" })).toEqual({ kind: "wrong" });
    expect(await allowed(world, visitor, signIn, { email: "bo@example.org", password: "whatever it is" })).toEqual({ kind: "wrong" });
  });

  it("asks for the address without minding capitals or the space around it", async () => {
    const world = await confirmedAda();
    expect((await allowed(world, visitor, signIn, { ...credentials, email: "  ADA@example.ORG" })).kind).toBe("signed-in");
  });
});

describe("a link in a mail", () => {
  it("signs in once; used again it says so", async () => {
    const world = await confirmedAda();
    await allowed(world, visitor, askForSignInLink, { linkEmail: "ada@example.org" });
    const secret = secretIn(world, "sign-in-link");
    expect(await allowed(world, visitor, followMailLink, { secret })).toHaveProperty("personId");
    expect(await refused(world, visitor, followMailLink, { secret })).toMatchObject({
      code: "link-spent", sentence: expect.stringContaining("used already"),
    });
  });

  it("is too old from its thirtieth minute on", async () => {
    const world = await confirmedAda();
    await allowed(world, visitor, askForSignInLink, { linkEmail: "ada@example.org" });
    const secret = secretIn(world, "sign-in-link");
    wait(world, 29);
    expect(await allowed(world, visitor, showMailLink, { secret })).toMatchObject({ state: "good" });
    wait(world, 1);
    expect(await refused(world, visitor, followMailLink, { secret })).toMatchObject({ sentence: expect.stringContaining("too old") });
  });

  it("can be looked at without using it up", async () => {
    const world = await confirmedAda();
    await allowed(world, visitor, askForSignInLink, { linkEmail: "ada@example.org" });
    const secret = secretIn(world, "sign-in-link");
    for (let n = 0; n < 3; n += 1) expect(await allowed(world, visitor, showMailLink, { secret })).toMatchObject({ state: "good" });
    expect((await ask(world, visitor, followMailLink, { secret })).ok).toBe(true);
  });

  it("comes five times an hour at most, and an address nobody has gets the same answer and no mail", async () => {
    const world = await confirmedAda();
    const asked = () => ask(world, visitor, askForSignInLink, { linkEmail: "ada@example.org" });
    for (let n = 0; n < 8; n += 1) expect(await asked()).toEqual({ ok: true, value: { email: "ada@example.org" } });
    expect(outbox(world, "sign-in-link")).toHaveLength(5);
    wait(world, 60);
    await asked();
    expect(outbox(world, "sign-in-link")).toHaveLength(6);
    const unknown = await ask(world, visitor, askForSignInLink, { linkEmail: "nobody@example.org" });
    expect(unknown).toEqual({ ok: true, value: { email: "nobody@example.org" } });
    expect(outbox(world).filter(({ to }) => to === "nobody@example.org")).toEqual([]);
  });

  it("that was guessed is not there, and an invitation's does not sign in", async () => {
    const world = await confirmedAda();
    expect((await refused(world, visitor, followMailLink, { secret: "x".repeat(43) })).kind).toBe("not-found");
    await allowed(world, makeAdmin(world), invite, { name: "Bo", email: "bo@example.org", role: "chaperone" });
    expect((await refused(world, visitor, followMailLink, { secret: secretIn(world, "invitation") })).kind).toBe("forbidden");
  });
});

describe("an invitation", () => {
  it("gives the role, and the account is the person's once they chose a name and a password", async () => {
    const world = makeWorld();
    await allowed(world, makeCoordinator(world), invite, { name: "Bo", email: "bo@example.org", role: "chaperone" });
    const secret = secretIn(world, "invitation");
    const { personId } = await allowed(world, visitor, acceptInvitation, { secret, name: "Bo Lind", password: "reeds and rain and salt" });
    expect(actorOf(world.conn, personId)).toMatchObject({ name: "Bo Lind", roles: ["chaperone"] });
    expect((await allowed(world, visitor, signIn, { email: "bo@example.org", password: "reeds and rain and salt" })).kind).toBe("signed-in");
    const again = await refused(world, visitor, acceptInvitation, { secret, name: "Mallory", password: "another password" });
    expect(again).toMatchObject({ code: "has-account" });
    expect(actorOf(world.conn, personId)?.name).toBe("Bo Lind");
  });

  it("cannot be turned into an account with a stranger's password, before or after it is accepted", async () => {
    const world = makeWorld();
    const theirs = { ...ada, email: "bo@example.org", password: "the stranger's password" };
    await allowed(world, visitor, signUp, theirs);
    const before = secretIn(world, "confirm-email");
    await allowed(world, makeAdmin(world), invite, { name: "Bo", email: "bo@example.org", role: "coordinator" });
    await allowed(world, visitor, signUp, theirs);
    expect(outbox(world, "confirm-email")).toHaveLength(1);
    const secret = secretIn(world, "invitation");
    await allowed(world, visitor, acceptInvitation, { secret, name: "Bo Lind", password: "reeds and rain and salt" });
    expect(await refused(world, visitor, followMailLink, { secret: before })).toMatchObject({ code: "link-spent" });
    expect(await allowed(world, visitor, signIn, { email: "bo@example.org", password: theirs.password })).toEqual({ kind: "wrong" });
  });

  it("by a coordinator is for chaperones and leaders; only an admin makes coordinators and admins", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const admin = makeAdmin(world);
    const asked = async (actor: typeof admin, role: string) => {
      const outcome = await ask(world, actor, invite, { name: "Bo", email: `${role}@example.org`, role });
      return outcome.ok ? "ok" : outcome.refusal.kind;
    };
    for (const role of ["chaperone", "leader"]) expect(await asked(coordinator, role)).toBe("ok");
    for (const role of ["guardian", "coordinator", "admin"]) expect(await asked(coordinator, role)).toBe("forbidden");
    for (const role of ["chaperone", "leader", "coordinator", "admin"]) expect(await asked(admin, role)).toBe("ok");
  });

  it("to somebody with an account adds the role and leaves the rest", async () => {
    const world = await confirmedAda();
    await allowed(world, makeCoordinator(world), invite, { name: "A. Moss", email: "ada@example.org", role: "leader" });
    expect(findPersonByEmail(world.conn, "ada@example.org")).toMatchObject({ name: "Ada Moss", roles: ["guardian", "leader"] });
    expect((await allowed(world, visitor, signIn, credentials)).kind).toBe("signed-in");
  });
});

it("everybody may say how they read, within what a page can hold", async () => {
  const world = makeWorld();
  const guardian = makeGuardian(world);
  await allowed(world, guardian, changeReading, { readingFormat: "contracted braille", textSizePt: "24" });
  expect(await allowed(world, guardian, showMe, {})).toMatchObject({ readingFormat: "contracted braille", textSizePt: 24 });
  for (const textSizePt of ["13", "37", "18.5", "big"]) {
    expect((await refused(world, guardian, changeReading, { readingFormat: "print", textSizePt })).kind).toBe("invalid");
  }
});
