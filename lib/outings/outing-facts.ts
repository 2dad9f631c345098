import type { OutingFacts } from "@/lib/messages/message";
import { dayInWords, hoursInWords } from "@/lib/shared/dates";
import { sha256 } from "@/lib/shared/ids";
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

/** The same for the same person and the same words: a meeting-point mail whose text changed is another mail. */
export function meetingPointKey(outing: Outing, personId: string): string {
  return `meeting-point ${outing.id} ${personId} ${sha256(JSON.stringify(publicOutingFacts(outing)))}`;
}
