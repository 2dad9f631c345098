import { describe, expect, it } from "vitest";
import { knex } from "@/db/connection";
import { addChild } from "@/lib/families/add-child";
import { listChildren } from "@/lib/families/list-children";
import { showChild } from "@/lib/families/show-child";
import { writeProfile } from "@/lib/registrations/write-profile";
import { confirmNeeds } from "@/lib/registrations/confirm-needs";
import { registerChild } from "@/lib/registrations/register-child";
import { findProfile } from "@/lib/families/participant-store";
import { makeFamilies, makeFamily, register, registrationOf } from "../../support/registering";
import { makeGuardian } from "../../support/actors";
import { allowed, makeChild, makeOuting, makeWorld, profile, refused, typedProfile, type World } from "../../support/world";

const bo = { nameUsed: "Bo", legalName: "Bo Reyes", birthDate: "2016-02-29", requestId: "form-1234" };

describe("adding a child", () => {
  it("by the same form sent twice, even at once, adds one", async () => {
    const world = makeWorld();
    const guardian = makeGuardian(world);
    const answers = await Promise.all(Array.from({ length: 5 }, () => allowed(world, guardian, addChild, bo)));
    expect(new Set(answers.map((answer) => answer.participantId)).size).toBe(1);
    expect(await allowed(world, guardian, listChildren, {})).toMatchObject([{ nameUsed: "Bo", hasProfile: false }]);
  });

  it("by another form with the same name and birthday is noticed", async () => {
    const world = makeWorld();
    const guardian = makeGuardian(world);
    await allowed(world, guardian, addChild, bo);
    expect(await refused(world, guardian, addChild, { ...bo, requestId: "form-5678" })).toMatchObject({ code: "already-there" });
    await allowed(world, guardian, addChild, { ...bo, legalName: "Wren Reyes", nameUsed: "Wren", requestId: "form-9012" });
    expect(await allowed(world, guardian, listChildren, {})).toHaveLength(2);
  });

  it("by a form whose number another family used is refused, and shows nothing of theirs", async () => {
    const world = makeWorld();
    await allowed(world, makeGuardian(world), addChild, bo);
    const refusal = await refused(world, makeGuardian(world, "Nils Holm"), addChild, { ...bo, nameUsed: "Pia" });
    expect(refusal.kind).toBe("forbidden");
  });

  it.each([
    ["2027-01-05", "This date is still to come. Enter the date of birth."],
    ["2000-01-01", "Our outings are for children and teenagers. Check the year of birth."],
    ["2015-02-29", "Enter the date of birth as year, month and day, such as 2015-03-28."],
    ["28 March 2015", "Enter the date of birth as year, month and day, such as 2015-03-28."],
  ])("born on %s says what to do", async (birthDate, sentence) => {
    const world = makeWorld();
    const refusal = await refused(world, makeGuardian(world), addChild, { ...bo, birthDate });
    expect(refusal).toMatchObject({ kind: "invalid", fields: { birthDate: sentence } });
  });

  it("born today, or with a name in any script, is fine", async () => {
    const world = makeWorld();
    const guardian = makeGuardian(world);
    await allowed(world, guardian, addChild, { nameUsed: "Ngọc", legalName: "阮氏玉", birthDate: "2027-01-04", requestId: "form-0001" });
    expect(await allowed(world, guardian, listChildren, {})).toMatchObject([{ nameUsed: "Ngọc" }]);
  });
});

describe("an access profile", () => {
  it("is kept as the family told it, version after version, and the same again is no new version", async () => {
    const world = makeWorld();
    const { guardian, childId } = makeFamily(world);
    const write = (changes: object) => allowed(world, guardian, writeProfile, { ...typedProfile, participantId: childId, ...changes });
    expect((await write({})).version).toBe(1);
    expect((await allowed(world, guardian, showChild, { participantId: childId })).profile?.answers).toEqual(profile);
    expect((await write({})).version).toBe(1);
    expect((await write({ support: "constant" })).version).toBe(2);
    const kept = world.conn.all(knex("access_profiles").orderBy("version").select("answers"));
    expect(kept.map((row) => (JSON.parse(row.answers) as typeof profile).support)).toEqual(["occasional", "constant"]);
  });

  it("that is changed later is what the outings to come are planned with; a day that is past keeps what it had", async () => {
    const world = makeWorld();
    const family = makeFamily(world);
    const { registrationId } = await register(world, family, makeOuting(world).slug);
    await allowed(world, family.guardian, confirmNeeds, { ...typedProfile, registrationId, guardianStays: "stays", thisTime: "a cold" });
    const supportOf = () => findProfile(world.conn, registrationOf(world, registrationId).profileId ?? "")?.support;
    const change = (support: string) => allowed(world, family.guardian, writeProfile, { ...typedProfile, participantId: family.childId, support });
    await change("close");
    expect(supportOf()).toBe("close");
    expect(registrationOf(world, registrationId).thisTime).toBe("a cold");
    world.now = "2027-01-09T20:00:00.000Z";
    await change("constant");
    expect(supportOf()).toBe("close");
  });

  it("asks for the chair's particulars with a wheelchair only, and forgets them without one", async () => {
    const world = makeWorld();
    const { guardian, childId } = makeFamily(world);
    const asked = { ...typedProfile, participantId: childId };
    const refusal = await refused(world, guardian, writeProfile, { ...asked, travel: ["wheelchair", "long cane"] });
    expect(refusal.kind === "invalid" && Object.keys(refusal.fields)).toEqual(["chair", "transfer"]);
    await allowed(world, guardian, writeProfile, { ...asked, travel: "wheelchair", chair: "pushed", transfer: "with one adult" });
    await allowed(world, guardian, writeProfile, { ...asked, travel: "walks", chair: "pushed", transfer: "with one adult" });
    expect((await allowed(world, guardian, showChild, { participantId: childId })).profile?.answers).toMatchObject({ chair: null, transfer: null });
  });

  it("names the very row and field of a contact that is not right, and asks nothing about an empty row", async () => {
    const world = makeWorld();
    const { guardian, childId } = makeFamily(world);
    const right = { name: "Rosa Reyes", relationship: "mother", phone: "360 555 0119" };
    const blank = { name: " ", relationship: "", phone: "" };
    const write = (contacts: object) => refused(world, guardian, writeProfile, { ...typedProfile, participantId: childId, contacts });
    const fieldsOf = async (contacts: object) => {
      const refusal = await write(contacts);
      return refusal.kind === "invalid" ? Object.keys(refusal.fields) : refusal.kind;
    };
    expect(await fieldsOf({ 0: blank, 1: { ...right, phone: "call me" } })).toEqual(["contacts.1.phone"]);
    expect(await fieldsOf({ 0: { ...right, name: "" }, 1: blank })).toEqual(["contacts.0.name"]);
    expect(await fieldsOf({ 0: blank, 1: blank })).toEqual(["contacts"]);
    expect(await fieldsOf([])).toEqual(["contacts"]);
    await allowed(world, guardian, writeProfile, { ...typedProfile, participantId: childId, contacts: { 0: blank, 1: right } });
    expect((await allowed(world, guardian, showChild, { participantId: childId })).profile?.answers.contacts).toEqual([right]);
  });

  it("of another family's child can be neither read nor written: the child is not there", async () => {
    const world = makeWorld();
    const [mine, theirs] = makeFamilies(world, 2);
    if (!mine || !theirs) throw new Error("two families were asked for");
    expect((await refused(world, mine.guardian, showChild, { participantId: theirs.childId })).kind).toBe("not-found");
    const written = await refused(world, mine.guardian, writeProfile, { ...typedProfile, participantId: theirs.childId });
    expect(written.kind).toBe("not-found");
  });
});

describe("the age on the day of the outing", () => {
  async function asked(world: World, birthDate: string, day = "2027-01-09") {
    const guardian = makeGuardian(world, `Guardian ${birthDate} ${day}`);
    const outing = makeOuting(world, { youngestAge: 8, oldestAge: 14, day });
    const participantId = makeChild(world, guardian, { birthDate });
    const outcome = await registerChild({ conn: world.conn, actor: guardian, now: world.now }, { slug: outing.slug, participantId });
    return outcome.ok ? "comes" : outcome.refusal.kind === "invalid" ? outcome.refusal.fields.participantId : outcome.refusal.kind;
  }

  it("is what counts, not the age today: whoever turns eight that very day may come", async () => {
    const world = makeWorld();
    expect(await asked(world, "2019-01-09")).toBe("comes");
    expect(await asked(world, "2019-01-10")).toContain("will be 7 on the day, and this outing is for ages 8 to 14");
  });

  it("is within the range up to the day before the fifteenth birthday", async () => {
    const world = makeWorld();
    expect(await asked(world, "2012-01-10")).toBe("comes");
    expect(await asked(world, "2012-01-09")).toContain("will be 15 on the day");
  });

  it("goes up on 1 March for somebody born on 29 February, but for leap years", async () => {
    const world = makeWorld();
    expect(await asked(world, "2020-02-29", "2028-02-28")).toContain("will be 7");
    expect(await asked(world, "2020-02-29", "2028-02-29")).toBe("comes");
    expect(await asked(world, "2020-02-29", "2027-03-01")).toContain("will be 7");
    expect(await asked(world, "2016-02-29", "2031-02-28")).toBe("comes");
    expect(await asked(world, "2016-02-29", "2031-03-01")).toContain("will be 15");
  });

  it("is taken by the site's calendar, not by UTC's", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { day: "2027-01-09", from: "17:00", to: "19:00" }); // 10 January in UTC
    const guardian = makeGuardian(world);
    const participantId = makeChild(world, guardian, { birthDate: "2019-01-10" });
    const refusal = await refused(world, guardian, registerChild, { slug: outing.slug, participantId });
    expect(refusal).toMatchObject({ kind: "invalid" });
  });
});
