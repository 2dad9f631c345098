import ICAL from "ical.js";
import { describe, expect, it } from "vitest";
import { findOuting } from "@/lib/outings/outing-store";
import { calendarOf, showOutingCalendar } from "@/lib/outings/show-outing-calendar";
import { callOffOuting } from "@/lib/registrations/call-off-outing";
import { visitor } from "@/lib/shared/actor";
import { makeCoordinator } from "../../support/actors";
import { allowed, makeOuting, makeWorld, refused, type World } from "../../support/world";

/** Read by ical.js, strictly, as RFC 5545. */
function read(calendar: string) {
  const root = new ICAL.Component(ICAL.parse(calendar) as [string, unknown[], unknown[]]);
  const [component, ...more] = root.getAllSubcomponents("vevent");
  if (!component || more.length > 0) throw new Error("one event was expected");
  return { root, component, event: new ICAL.Event(component) };
}

function fileOf(world: World, id: string): string {
  const outing = findOuting(world.conn, { id }, world.now);
  if (!outing) throw new Error("the outing is gone");
  return calendarOf(outing, world.now);
}

describe("the calendar file of an outing", () => {
  it("has what RFC 5545 asks of every event: PRODID, VERSION 2.0, UID, DTSTAMP and a start", () => {
    const world = makeWorld();
    const { id } = makeOuting(world);
    const { root, event, component } = read(fileOf(world, id));
    expect(root.getFirstPropertyValue("version")).toBe("2.0");
    expect(root.getFirstPropertyValue("prodid")).toBe("-//Dunlin//Outings//EN");
    expect(event.uid).toBe(`${id}@dunlin`);
    expect(String(component.getFirstPropertyValue("dtstamp"))).toBe("2027-01-04T18:00:00Z");
  });

  it("gives start and end as UTC instants that are the wall-clock hours at the site", () => {
    const world = makeWorld();
    const { event, component } = read(fileOf(world, makeOuting(world, { day: "2027-07-10", from: "09:00", to: "12:00" }).id));
    expect([event.startDate, event.endDate].map((at) => at.toJSDate().toISOString())).toEqual(["2027-07-10T16:00:00.000Z", "2027-07-10T19:00:00.000Z"]);
    expect(event.startDate.zone.tzid).toBe("UTC");
    expect(component.getFirstProperty("dtstart")?.getParameter("tzid")).toBeUndefined();
  });

  it("keeps every letter, comma, semicolon, backslash and line of the texts, in lines of at most 75 octets", () => {
    const world = makeWorld();
    const meetingText = "Gate; bench, bell \\ left.\nŁucja’s 鳥 sign, then 300 steps. ".repeat(6);
    const file = fileOf(world, makeOuting(world, { title: "Dunlin, turnstones; “and” a bell\\ringing", meetingText }).id);
    const { event } = read(file);
    expect(event.summary).toBe("Dunlin, turnstones; “and” a bell\\ringing");
    expect(event.description).toBe(meetingText);
    expect(event.location).toBe("Heron Spit");
    expect(Math.max(...file.split("\r\n").map((line) => Buffer.byteLength(line)))).toBeLessThanOrEqual(75);
    expect(file.replaceAll("\r\n", "")).not.toMatch(/[\r\n]/);
    expect(file.endsWith("END:VCALENDAR\r\n")).toBe(true);
  });

  it("replaces an earlier one: the same UID, a higher SEQUENCE, and CANCELLED once it is called off", async () => {
    const world = makeWorld();
    const outing = makeOuting(world);
    const before = read(fileOf(world, outing.id));
    expect(before.event.component.getFirstPropertyValue("status")).toBe("CONFIRMED");
    await allowed(world, makeCoordinator(world), callOffOuting, { slug: outing.slug, because: "A storm is coming." });
    const after = read(fileOf(world, outing.id));
    expect(after.event.uid).toBe(before.event.uid);
    expect(after.event.sequence).toBeGreaterThan(before.event.sequence);
    expect(after.event.component.getFirstPropertyValue("status")).toBe("CANCELLED");
  });

  it("for everybody says where and when, and leaves the meeting point to those who come", async () => {
    const world = makeWorld();
    const outing = makeOuting(world);
    const { calendar } = await allowed(world, visitor, showOutingCalendar, { slug: outing.slug });
    const { event } = read(calendar);
    expect(event.description).toBe("We listen to a flock turn.");
    expect(calendar).not.toContain("bench");
    expect((await refused(world, visitor, showOutingCalendar, makeOuting(world, { state: "draft" }))).kind).toBe("not-found");
  });
});
