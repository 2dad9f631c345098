import type { OutingFacts } from "@/lib/messages/message";
import { dayInWords, hoursInWords } from "@/lib/shared/dates";
import type { Outing } from "./outing";

/** What a mail says of an outing. */
export function publicOutingFacts(outing: Outing): OutingFacts {
  return {
    title: outing.title,
    slug: outing.slug,
    siteName: outing.site.name,
    day: dayInWords(outing.startsAt, outing.site.zone),
    hours: hoursInWords(outing.startsAt, outing.endsAt, outing.site.zone),
    meetingText: outing.meetingText,
  };
}
