import { describe, expect, it } from "vitest";
import { answerByLink, answerRequest } from "@/lib/helpers/answer-request";
import { askToHelp } from "@/lib/helpers/ask-to-help";
import { changeAbilities } from "@/lib/helpers/change-abilities";
import { changeClearance } from "@/lib/helpers/change-clearance";
import { listMyRequests } from "@/lib/helpers/list-my-requests";
import { listOutingHelpers } from "@/lib/helpers/list-outing-helpers";
import { sendMeetingPoint } from "@/lib/helpers/send-meeting-point";
import { showRequestByLink } from "@/lib/helpers/show-request-by-link";
import { callOffOuting } from "@/lib/registrations/call-off-outing";
import { pairPeople } from "@/lib/cover-board/pair-people";
import { listPairings } from "@/lib/cover-board/pairing-store";
import { changeOuting } from "@/lib/registrations/change-outing";
import { visitor } from "@/lib/shared/actor";
import { makeChaperone, makeCoordinator, makeGuardian, makeLeader } from "../../support/actors";
import { finish, makeFamily, outbox, register } from "../../support/registering";
import { allowed, makeOuting, makeWorld, refused } from "../../support/world";

async function askedChaperone() {
  const world = makeWorld();
  const coordinator = makeCoordinator(world);
  const chaperone = makeChaperone(world);
  const outing = makeOuting(world);
  await allowed(world, coordinator, askToHelp, { slug: outing.slug, personIds: chaperone.personId, task: "chaperone" });
  const link = String(outbox(world, "asked-to-help")[0]?.facts.link);
  return { world, coordinator, chaperone, outing, secret: link.slice(link.lastIndexOf("/") + 1) };
}

describe("asking somebody to help", () => {
  it("mails each person once, however often they are asked", async () => {
    const { world, coordinator, chaperone, outing } = await askedChaperone();
    const again = await allowed(world, coordinator, askToHelp, { slug: outing.slug, personIds: [chaperone.personId], task: "chaperone" });
    expect(again).toEqual({ asked: 0 });
    expect(outbox(world, "asked-to-help")).toHaveLength(1);
  });

  it("is for people invited for that task, and for days that are still to come", async () => {
    const { world, coordinator, chaperone, outing } = await askedChaperone();
    const asLeader = await refused(world, coordinator, askToHelp, { slug: outing.slug, personIds: chaperone.personId, task: "leader" });
    expect(asLeader).toMatchObject({ kind: "invalid", fields: { personIds: expect.stringContaining("Marcus Hale is not invited as a leader yet") } });
    const guardian = makeGuardian(world);
    const asGuardian = await refused(world, coordinator, askToHelp, { slug: outing.slug, personIds: guardian.personId, task: "chaperone" });
    expect(asGuardian.kind).toBe("invalid");
    const past = makeOuting(world, { day: "2027-01-02" });
    const late = await refused(world, coordinator, askToHelp, { slug: past.slug, personIds: chaperone.personId, task: "chaperone" });
    expect(late).toMatchObject({ code: "over" });
  });

  it("of whom one cannot be asked mails nobody", async () => {
    const { world, coordinator, outing } = await askedChaperone();
    const personIds = [makeChaperone(world, "Pia Lindqvist").personId, makeGuardian(world).personId];
    await refused(world, coordinator, askToHelp, { slug: outing.slug, personIds, task: "chaperone" });
    expect(outbox(world, "asked-to-help")).toHaveLength(1);
  });
});

describe("an answer by the link in the mail", () => {
  it("needs no account and can be changed as often as one likes until the outing is over", async () => {
    const { world, outing, secret, coordinator } = await askedChaperone();
    for (const answer of ["yes", "maybe", "no", "yes"]) {
      await allowed(world, visitor, answerByLink, { secret, answer });
      expect(await allowed(world, visitor, showRequestByLink, { secret })).toMatchObject({ name: "Marcus Hale", task: "chaperone", state: answer, late: false });
    }
    const { answers } = await allowed(world, coordinator, listOutingHelpers, { slug: outing.slug });
    expect(answers).toMatchObject([{ name: "Marcus Hale", state: "yes", clearedThatDay: true, abilities: "Guides on either side, first aid." }]);
    world.now = "2027-01-09T20:00:00.000Z";
    expect(await refused(world, visitor, answerByLink, { secret, answer: "no" })).toMatchObject({ code: "over" });
  });

  it("with a guessed secret, or an answer that is none, is refused", async () => {
    const { world, secret } = await askedChaperone();
    expect((await refused(world, visitor, answerByLink, { secret: "x".repeat(43), answer: "yes" })).kind).toBe("not-found");
    expect(await refused(world, visitor, answerByLink, { secret, answer: "perhaps" })).toMatchObject({ fields: { answer: "Choose yes, maybe or no." } });
  });

  it("is not wanted any more for a day that is called off", async () => {
    const { world, outing, secret, coordinator } = await askedChaperone();
    await allowed(world, coordinator, callOffOuting, { slug: outing.slug, because: "A storm is coming." });
    expect(await refused(world, visitor, answerByLink, { secret, answer: "yes" })).toMatchObject({ code: "called-off" });
  });
});

describe("an answer on the helper's own page", () => {
  it("is theirs alone: to anybody else the request is not there", async () => {
    const { world, chaperone, coordinator } = await askedChaperone();
    const { requests } = await allowed(world, chaperone, listMyRequests, {});
    const answerId = requests[0]?.answerId;
    for (const other of [coordinator, makeChaperone(world, "Pia Lindqvist"), visitor]) {
      expect((await refused(world, other, answerRequest, { answerId, answer: "no" })).kind).toBe("not-found");
    }
    await allowed(world, chaperone, answerRequest, { answerId, answer: "yes" });
    expect((await allowed(world, chaperone, listMyRequests, {})).requests).toMatchObject([{ state: "yes" }]);
  });

  it("tells where to meet after a yes only", async () => {
    const { world, chaperone, secret } = await askedChaperone();
    const meetingText = async () => (await allowed(world, chaperone, listMyRequests, {})).requests[0]?.meetingText;
    expect(await meetingText()).toBeNull();
    await allowed(world, visitor, answerByLink, { secret, answer: "maybe" });
    expect(await meetingText()).toBeNull();
    await allowed(world, visitor, answerByLink, { secret, answer: "yes" });
    expect(await meetingText()).toBe("Come to the bench under the bell.\nThe gate is on your left.");
  });

  it("of maybe or no takes them off the people they would have looked after", async () => {
    const { world, outing, coordinator, chaperone, secret } = await askedChaperone();
    await allowed(world, visitor, answerByLink, { secret, answer: "yes" });
    const family = makeFamily(world);
    const { registrationId } = await register(world, family, outing.slug);
    await finish(world, family, registrationId);
    await allowed(world, coordinator, pairPeople, { slug: outing.slug, pair: { [registrationId]: chaperone.personId } });
    expect(listPairings(world.conn, outing.id)).toHaveLength(1);
    await allowed(world, visitor, answerByLink, { secret, answer: "maybe" });
    expect(listPairings(world.conn, outing.id)).toEqual([]);
  });
});

describe("the meeting-point mail", () => {
  const edition = (world: ReturnType<typeof makeWorld>, slug: string) => ({
    slug, edition: "1", title: "Low tide at Heron Spit", theme: "Dunlin", summary: "We listen.", siteId: world.siteId, policyId: world.policyId,
    day: "2027-01-09", startTime: "08:00", endTime: "11:00", seats: "5", youngestAge: "8", oldestAge: "14", suggestedFee: "12",
    meetingText: "At the other gate.",
  });

  it("goes once to each adult who said yes, and again when what it says was changed", async () => {
    const { world, outing, secret, coordinator, chaperone } = await askedChaperone();
    expect(await refused(world, coordinator, sendMeetingPoint, { slug: outing.slug })).toMatchObject({ code: "nobody" });
    await allowed(world, visitor, answerByLink, { secret, answer: "yes" });
    for (let pressed = 0; pressed < 3; pressed += 1) await allowed(world, coordinator, sendMeetingPoint, { slug: outing.slug });
    expect(outbox(world, "meeting-point").map(({ to }) => to)).toEqual([chaperone.email]);
    await allowed(world, coordinator, changeOuting, edition(world, outing.slug));
    await allowed(world, coordinator, sendMeetingPoint, { slug: outing.slug });
    const mails = outbox(world, "meeting-point");
    expect(mails.map(({ facts }) => (facts.outing as { meetingText: string }).meetingText)).toEqual([
      "Come to the bench under the bell.\nThe gate is on your left.", "At the other gate.",
    ]);
  });

  it("is not sent for a draft or a day that is called off or over", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const asked = (slug: string) => refused(world, coordinator, sendMeetingPoint, { slug });
    expect(await asked(makeOuting(world, { state: "draft" }).slug)).toMatchObject({ code: "draft" });
    expect(await asked(makeOuting(world, { state: "called off" }).slug)).toMatchObject({ code: "over" });
    expect(await asked(makeOuting(world, { day: "2027-01-02" }).slug)).toMatchObject({ code: "over" });
  });
});

describe("what a helper can do", () => {
  it("is said by themselves; until when they are cleared, by staff alone", async () => {
    const world = makeWorld();
    const leader = makeLeader(world);
    await allowed(world, leader, changeAbilities, { isAdult: "yes", guidesRight: "yes", drives: "on", clearedUntil: "2099-01-01" });
    const { record } = await allowed(world, leader, listMyRequests, {});
    expect(record).toEqual({
      personId: leader.personId, isAdult: true, clearedUntil: "2027-12-31", guidesLeft: false, guidesRight: true, pushesChair: false, firstAid: false, drives: true,
    });
    expect((await refused(world, leader, changeClearance, { personId: leader.personId, clearedUntil: "2099-01-01" })).kind).toBe("forbidden");
    await allowed(world, makeCoordinator(world), changeClearance, { personId: leader.personId, clearedUntil: "" });
    expect((await allowed(world, leader, listMyRequests, {})).record?.clearedUntil).toBeNull();
  });

  it.each([["2027-01-09", true], ["2027-01-08", false], ["", false]])("with a clearance whose last day is %j counts on 9 January: %s", async (clearedUntil, counts) => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const chaperone = makeChaperone(world);
    await allowed(world, coordinator, changeClearance, { personId: chaperone.personId, clearedUntil });
    const { others } = await allowed(world, coordinator, listOutingHelpers, { slug: makeOuting(world).slug });
    expect(others).toMatchObject([{ name: "Marcus Hale", clearedThatDay: counts }]);
  });
});
