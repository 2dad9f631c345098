import { findOuting } from "@/lib/outings/outing-store";
import { meetingPointKey, publicOutingFacts } from "@/lib/outings/outing-facts";
import { slugSchema } from "@/lib/outings/outing-schema";
import { calendarOf } from "@/lib/outings/show-outing-calendar";
import { queueMessage } from "@/lib/messages/message-store";
import { env } from "@/lib/shared/env";
import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mayAskHelpers } from "./helper-policy";
import { listAnswersOf } from "./helper-store";

/**
 * Mails the meeting-point instructions to every adult who said yes, one address a mail.
 * The same text goes to a person once, however often the button is pressed.
 */
export const sendMeetingPoint = defineCommand({
  input: slugSchema,
  load: (conn, _actor, { slug }, now) => {
    const outing = findOuting(conn, { slug }, now);
    return outing && { outing, coming: listAnswersOf(conn, outing.id).filter((one) => one.state === "yes") };
  },
  allow: (actor) => mayAskHelpers(actor),
  run: ({ conn, now, found: { outing, coming } }) => {
    if (outing.state === "draft") return conflict("draft", "Publish the outing first; a draft is not sent to anybody.");
    if (outing.state === "called off" || outing.endsAt <= now) return conflict("over", "This outing is over or called off, so nobody is sent there.");
    if (coming.length === 0) return conflict("nobody", "Nobody has said yes yet. Ask people to help first.");
    for (const one of coming) {
      queueMessage(conn, now, {
        kind: "meeting-point",
        facts: { name: one.name, outing: publicOutingFacts(outing), task: one.task, phone: env().PROGRAMME_PHONE, calendar: calendarOf(outing, now) },
        toAddress: one.email,
        toPersonId: one.personId,
        outingId: outing.id,
        onceKey: meetingPointKey(outing, one.personId),
      });
    }
    return ok({ people: coming.length });
  },
});
