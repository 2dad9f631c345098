import ical, { ICalCalendarMethod, ICalEventStatus } from "ical-generator";
import { publicAddress } from "@/lib/shared/addresses";
import { env } from "@/lib/shared/env";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { isPublic, type Outing } from "./outing";
import { slugSchema } from "./outing-schema";
import { findOuting } from "./outing-store";

/** One outing as an RFC 5545 calendar file, for everybody: so without where to meet, which is told to those who come. */
export const showOutingCalendar = defineQuery({
  input: slugSchema,
  load: (conn, _actor, { slug }, now) => {
    const outing = findOuting(conn, { slug }, now);
    return outing && isPublic(outing) ? outing : null;
  },
  allow: (_actor, outing) => isPublic(outing),
  run: ({ found: outing, now }) => ok({ slug: outing.slug, calendar: calendarOf(outing, now, outing.summary) }),
});

/**
 * The calendar file of an outing. Times are UTC instants, so every calendar shows the right moment
 * without a time-zone table; the edition is the SEQUENCE, so that a later file replaces an earlier one.
 */
export function calendarOf(outing: Outing, now: string, description = outing.meetingText): string {
  const calendar = ical({ prodId: { company: "Dunlin", product: "Outings", language: "EN" } });
  const isOff = outing.state === "called off";
  calendar.method(isOff ? ICalCalendarMethod.CANCEL : ICalCalendarMethod.PUBLISH);
  calendar.createEvent({
    id: `${outing.id}@dunlin`,
    sequence: outing.edition,
    stamp: new Date(now),
    start: new Date(outing.startsAt),
    end: new Date(outing.endsAt),
    summary: outing.title,
    location: outing.site.name,
    description,
    organizer: organizer(),
    url: publicAddress(`/outings/${outing.slug}`),
    status: isOff ? ICalEventStatus.CANCELLED : ICalEventStatus.CONFIRMED,
  });
  return `${calendar.toString()}\r\n`;
}

/** RFC 5546, 3.2, wants to know who publishes or cancels an event: the programme, by the address its mail comes from. */
function organizer(): { name: string; email: string } {
  const { PROGRAMME_NAME, MAIL_FROM } = env();
  return { name: PROGRAMME_NAME, email: /<([^>]+)>/.exec(MAIL_FROM)?.[1] ?? MAIL_FROM };
}
