import { describe, expect, it } from "vitest";
import { callOffOuting } from "@/lib/registrations/call-off-outing";
import { changeOuting } from "@/lib/registrations/change-outing";
import { closeOuting } from "@/lib/outings/close-outing";
import { listOutings } from "@/lib/outings/list-outings";
import { planOuting } from "@/lib/outings/plan-outing";
import { publishOuting } from "@/lib/outings/publish-outing";
import { showOuting } from "@/lib/outings/show-outing";
import { showOutingForm } from "@/lib/outings/show-outing-form";
import { askToHelp } from "@/lib/helpers/ask-to-help";
import { visitor } from "@/lib/shared/actor";
import { makeChaperone, makeCoordinator } from "../../support/actors";
import { makeFamilies, outbox, register } from "../../support/registering";
import { allowed, makeOuting, makeWorld, refused, type World } from "../../support/world";

const typed = (world: World, changes: Record<string, unknown> = {}) => ({
  title: "Owls at Cinder Hill", theme: "Owls", summary: "We wait for owls.", siteId: world.siteId, day: "2027-02-13", startTime: "17:00",
  endTime: "19:00", seats: "6", youngestAge: "8", oldestAge: "14", suggestedFee: "12.50", policyId: world.policyId,
  meetingText: "At the gate.", requestId: "form-1234", ...changes,
});

describe("planning an outing", () => {
  it("makes a draft at the site's own time, which the public cannot see until it is published", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const { slug } = await allowed(world, coordinator, planOuting, typed(world));
    expect(slug).toBe("owls-at-cinder-hill");
    expect((await refused(world, visitor, showOuting, { slug })).kind).toBe("not-found");
    await allowed(world, coordinator, publishOuting, { slug });
    expect(await allowed(world, visitor, showOuting, { slug })).toMatchObject({
      startsAt: "2027-02-14T01:00:00.000Z", endsAt: "2027-02-14T03:00:00.000Z", day: "2027-02-13", hours: "5 p.m. to 7 p.m.",
      when: "Saturday 13 February 2027, 5 p.m. to 7 p.m.", fee: "$12.50", roomInWords: "6 places left", ages: "ages 8 to 14",
    });
  });

  it("by the same form twice makes one; by another form of the same title gets an address of its own", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const first = await allowed(world, coordinator, planOuting, typed(world));
    expect(await allowed(world, coordinator, planOuting, typed(world))).toEqual(first);
    expect(await allowed(world, coordinator, planOuting, typed(world, { requestId: "form-5678" }))).toEqual({ slug: "owls-at-cinder-hill-2" });
  });

  it.each([
    [{ day: "2027-01-04", startTime: "09:59" }, "day", "Enter a date that is still to come."],
    [{ day: "2027-02-29" }, "day", "Enter a date as year, month and day, such as 2027-01-09."],
    [{ startTime: "5 pm" }, "startTime", "Enter a time on the 24-hour clock, such as 09:00 or 15:30."],
    [{ endTime: "17:00" }, "endTime", "Enter an end that is later than the start."],
    [{ oldestAge: "7" }, "oldestAge", "Enter an oldest age that is not below the youngest."],
    [{ seats: "0" }, "seats", "Enter 1 or more."],
    [{ seats: "many" }, "seats", "Enter the number of seats as a number."],
    [{ suggestedFee: "twelve" }, "suggestedFee", "Enter an amount in dollars, such as 12 or 12.50."],
    [{ siteId: "gone" }, "siteId", "Choose a site from the list."],
    [{ policyId: "gone" }, "policyId", "Choose a policy from the list."],
    [{ title: " " }, "title", "Enter a title."],
  ])("with %j is refused beside %s", async (change, field, sentence) => {
    const world = makeWorld();
    const refusal = await refused(world, makeCoordinator(world), planOuting, typed(world, change));
    expect(refusal).toMatchObject({ kind: "invalid", fields: { [field]: sentence } });
  });
});

describe("changing an outing", () => {
  it("from a form that somebody else's change has overtaken is refused, and their change stays", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const { slug } = makeOuting(world);
    const edit = (title: string) => ({ ...typed(world), slug, edition: "1", title });
    await allowed(world, coordinator, changeOuting, edit("Owls, second thought"));
    expect(await refused(world, coordinator, changeOuting, edit("Owls, stale"))).toMatchObject({ kind: "conflict", code: "stale-edition" });
    const { values } = await allowed(world, coordinator, showOutingForm, { slug });
    expect(values).toMatchObject({ title: "Owls, second thought", edition: "2" });
  });

  it("from two tabs at once keeps one of them", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const { slug } = makeOuting(world);
    const edits = ["One", "Two"].map((title) =>
      changeOuting({ conn: world.conn, actor: coordinator, now: world.now }, { ...typed(world), slug, edition: "1", title }),
    );
    expect((await Promise.all(edits)).map((outcome) => outcome.ok)).toEqual([true, false]);
  });

  it("shows in the form what was saved, ready to be sent again unchanged", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const { slug } = await allowed(world, coordinator, planOuting, typed(world));
    const { values } = await allowed(world, coordinator, showOutingForm, { slug });
    expect({ ...values, requestId: "form-1234" }).toEqual({ ...typed(world), slug, edition: "1", modelIds: [] });
    await allowed(world, coordinator, changeOuting, values);
  });

  it("cannot move its start into the past, but may correct a text after the start", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const { slug } = makeOuting(world);
    const edit = { ...typed(world), slug, edition: "1", startTime: "09:00", endTime: "12:00" };
    const refusal = await refused(world, coordinator, changeOuting, { ...edit, day: "2027-01-02" });
    expect(refusal).toMatchObject({ kind: "invalid", fields: { day: "Enter a date that is still to come." } });
    world.now = "2027-01-09T18:00:00.000Z";
    await allowed(world, coordinator, changeOuting, { ...edit, day: "2027-01-09" });
  });
});

describe("publishing, closing and calling off", () => {
  it("opens a draft and a closed outing, never one that is past or called off", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const { slug } = makeOuting(world, { state: "draft" });
    await allowed(world, coordinator, publishOuting, { slug });
    await allowed(world, coordinator, closeOuting, { slug });
    expect((await allowed(world, visitor, showOuting, { slug })).roomInWords).toBe("Registration closed");
    await allowed(world, coordinator, publishOuting, { slug });
    await allowed(world, coordinator, callOffOuting, { slug, because: "A storm is coming." });
    expect(await refused(world, coordinator, publishOuting, { slug })).toMatchObject({ code: "not-open-again" });
    const past = makeOuting(world, { state: "draft", day: "2027-01-02" });
    expect(await refused(world, coordinator, publishOuting, past)).toMatchObject({ code: "in-the-past" });
  });

  it("tells every family and every helper who has not said no, one mail each, however often it is pressed", async () => {
    const world = makeWorld();
    const coordinator = makeCoordinator(world);
    const outing = makeOuting(world, { seats: 1 });
    const families = makeFamilies(world, 2);
    for (const family of families) await register(world, family, outing.slug);
    const chaperone = makeChaperone(world);
    await allowed(world, coordinator, askToHelp, { slug: outing.slug, personIds: chaperone.personId, task: "chaperone" });
    const told = await allowed(world, coordinator, callOffOuting, { slug: outing.slug, because: "A storm is coming." });
    expect(told).toEqual({ title: "Low tide at Heron Spit", told: 3 });
    await allowed(world, coordinator, callOffOuting, { slug: outing.slug, because: "Again." });
    const mails = outbox(world, "called-off");
    expect(mails.map(({ to }) => to).sort()).toEqual([...families.map(({ guardian }) => guardian.email), chaperone.email].sort());
    expect(mails.map(({ facts }) => facts.because)).toEqual(Array(3).fill("A storm is coming."));
    expect(await allowed(world, visitor, showOuting, { slug: outing.slug })).toMatchObject({ roomInWords: "Called off", calledOffBecause: "A storm is coming." });
  });

  it("tells nobody about a draft", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { state: "draft" });
    const told = await allowed(world, makeCoordinator(world), callOffOuting, { slug: outing.slug, because: "Nobody can lead it." });
    expect(told.told).toBe(0);
  });
});

describe("the public list", () => {
  it("holds what touches the range, earliest first, and no draft", async () => {
    const world = makeWorld();
    makeOuting(world, { title: "Third", day: "2027-01-23" });
    makeOuting(world, { title: "First", day: "2027-01-09" });
    makeOuting(world, { title: "Second", day: "2027-01-16", state: "called off" });
    makeOuting(world, { title: "Hidden", day: "2027-01-17", state: "draft" });
    makeOuting(world, { title: "Too late", day: "2027-02-06" });
    const list = await allowed(world, visitor, listOutings, { from: "2027-01-01", to: "2027-02-01" });
    expect(list.map((one) => one.title)).toEqual(["First", "Second", "Third"]);
    const during = await allowed(world, visitor, listOutings, { from: "2027-01-09T19:00:00Z", to: "2027-01-09T19:30:00Z" });
    expect(during.map((one) => one.title)).toEqual(["First"]);
    const justAfter = await allowed(world, visitor, listOutings, { from: "2027-01-09T20:00:00Z", to: "2027-01-10T00:00:00Z" });
    expect(justAfter).toEqual([]);
  });

  it.each([
    { from: "2027-02-01", to: "2027-01-01" },
    { from: "2027-01-01", to: "2029-01-01" },
    { from: "yesterday", to: "2027-01-01" },
    { from: "2027-01-01" },
    {},
  ])("refuses the range %j", async (range) => {
    expect((await refused(makeWorld(), visitor, listOutings, range)).kind).toBe("invalid");
  });

  it("calls an open outing without a free seat full, and one with a lapsed hold not", async () => {
    const world = makeWorld();
    const outing = makeOuting(world, { seats: 1 });
    const [family] = makeFamilies(world, 1);
    if (!family) throw new Error("one family was asked for");
    await register(world, family, outing.slug);
    expect((await allowed(world, visitor, showOuting, { slug: outing.slug })).roomInWords).toBe("Full");
    world.now = "2027-01-04T18:45:00.000Z";
    expect((await allowed(world, visitor, showOuting, { slug: outing.slug })).roomInWords).toBe("1 place left");
  });
});
