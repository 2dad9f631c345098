import { describe, expect, it } from "vitest";
import { createHash } from "node:crypto";
import { knex } from "@/db/connection";
import { registrationOf, makeFamilies, makeFamily, register, sign, signature } from "../../support/registering";
import { allowed, ask, makeOuting, makeWorld, refused, wait } from "../../support/world";
import { showWaiver } from "@/lib/waivers/show-waiver";
import { signWaiver } from "@/lib/waivers/sign-waiver";
import { insertWaiverText } from "@/lib/waivers/waiver-store";
import { visitor } from "@/lib/shared/actor";
import { withdraw } from "@/lib/registrations/withdraw";

async function heldSeat() {
  const world = makeWorld();
  const outing = makeOuting(world);
  const family = makeFamily(world);
  const { registrationId } = await register(world, family, outing.slug);
  return { world, outing, family, registrationId };
}

const secondText = { version: 2, title: "Release for a day outdoors", body: "Everything is different now.", inForceFrom: "2027-01-01" };

describe("a signature", () => {
  it("keeps who signed which text, letter for letter by its hash, the name and date as typed, and when", async () => {
    const { world, family, registrationId } = await heldSeat();
    await sign(world, family, registrationId);
    const [kept, ...more] = world.conn.all(
      knex("signatures").select("registration_id", "signed_by", "text_sha256", "typed_name", "typed_date", "signed_at"),
    );
    expect(more).toEqual([]);
    const { title, body } = world.waiver;
    expect(kept).toEqual({
      registration_id: registrationId,
      signed_by: family.guardian.personId,
      text_sha256: createHash("sha256").update(`${title}\n${body}`, "utf8").digest("hex"),
      typed_name: "Rosa Reyes",
      typed_date: "2027-01-04",
      signed_at: world.now,
    });
  });

  it("given twice is the first one: neither name nor moment changes", async () => {
    const { world, family, registrationId } = await heldSeat();
    await sign(world, family, registrationId);
    wait(world, 5);
    await allowed(world, family.guardian, signWaiver, { ...signature(world, registrationId), typedName: "Somebody Else" });
    expect(registrationOf(world, registrationId).signature).toEqual({ typedName: "Rosa Reyes", signedAt: "2027-01-04T18:00:00.000Z", version: 1 });
  });

  it("given twice at once is kept once", async () => {
    const { world, family, registrationId } = await heldSeat();
    await Promise.all(Array.from({ length: 10 }, () => sign(world, family, registrationId)));
    expect(world.conn.all(knex("signatures").select("id"))).toHaveLength(1);
  });

  it("under a text that was replaced meanwhile is refused, and the new text can be signed", async () => {
    const { world, family, registrationId } = await heldSeat();
    const old = signature(world, registrationId);
    insertWaiverText(world.conn, secondText);
    expect(await refused(world, family.guardian, signWaiver, old)).toMatchObject({ kind: "conflict", code: "other-text" });
    const text = await allowed(world, visitor, showWaiver, {});
    expect(text).toMatchObject({ version: 2, body: secondText.body });
    await allowed(world, family.guardian, signWaiver, { ...old, textSha256: text.sha256 });
    expect(registrationOf(world, registrationId).signature?.version).toBe(2);
  });

  it("of a day that is not today is refused with today's date at the site", async () => {
    const { world, family, registrationId } = await heldSeat();
    const refusal = await refused(world, family.guardian, signWaiver, { ...signature(world, registrationId), typedDate: "2027-01-05" });
    expect(refusal).toMatchObject({ kind: "invalid", fields: { typedDate: "Enter today's date: 2027-01-04." } });
  });

  it("in the evening at the site bears the site's day, though it is tomorrow in UTC", async () => {
    const world = makeWorld();
    world.now = "2027-01-05T06:30:00.000Z"; // 10.30 p.m. on 4 January
    const outing = makeOuting(world);
    const family = makeFamily(world);
    const { registrationId } = await register(world, family, outing.slug);
    expect((await ask(world, family.guardian, signWaiver, { ...signature(world, registrationId), typedDate: "2027-01-04" })).ok).toBe(true);
  });

  it.each([
    [{ agree: "no" }, "agree"],
    [{ agree: undefined }, "agree"],
    [{ typedName: "   " }, "typedName"],
    [{ typedDate: "4 January" }, "typedDate"],
    [{ typedDate: "2027-02-30" }, "typedDate"],
  ])("with %j is not one", async (change, field) => {
    const { world, family, registrationId } = await heldSeat();
    const refusal = await refused(world, family.guardian, signWaiver, { ...signature(world, registrationId), ...change });
    expect(refusal.kind === "invalid" && Object.keys(refusal.fields)).toEqual([field]);
  });

  it("may be in any script", async () => {
    const { world, family, registrationId } = await heldSeat();
    await allowed(world, family.guardian, signWaiver, { ...signature(world, registrationId), typedName: "Nguyễn Thị Ngọc 阮氏玉" });
    expect(registrationOf(world, registrationId).signature?.typedName).toBe("Nguyễn Thị Ngọc 阮氏玉");
  });

  it("for another family's child is not possible, and after withdrawing it is too late", async () => {
    const { world, outing, family, registrationId } = await heldSeat();
    const [stranger] = makeFamilies(world, 1);
    if (!stranger) throw new Error("one family was asked for");
    await register(world, stranger, outing.slug);
    expect((await refused(world, stranger.guardian, signWaiver, signature(world, registrationId))).kind).toBe("not-found");
    await allowed(world, family.guardian, withdraw, { registrationId, sure: "yes" });
    expect(await refused(world, family.guardian, signWaiver, signature(world, registrationId))).toMatchObject({ code: "not-live" });
  });
});

it("a text that is not in force yet is not shown", async () => {
  const world = makeWorld();
  insertWaiverText(world.conn, { ...secondText, inForceFrom: "2027-02-01" });
  expect(await allowed(world, visitor, showWaiver, {})).toMatchObject({ version: 1 });
});
