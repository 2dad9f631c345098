import { cancelQueued, queueMessage } from "@/lib/messages/message-store";
import { publicOutingFacts } from "@/lib/outings/outing-facts";
import { mayPlanOutings } from "@/lib/outings/outing-policy";
import { callOffSchema } from "@/lib/outings/outing-schema";
import { findOuting, setOutingState } from "@/lib/outings/outing-store";
import { calendarOf } from "@/lib/outings/show-outing-calendar";
import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { addresseesOf } from "./addressees";

/** Calls the day off and tells every family and helper, each in a mail of their own. */
export const callOffOuting = defineCommand({
  input: callOffSchema,
  load: (conn, _actor, { slug }, now) => findOuting(conn, { slug }, now),
  allow: (actor) => mayPlanOutings(actor),
  run: ({ conn, now, found: outing, input }) => {
    if (outing.state === "called off") return ok({ title: outing.title, told: 0 });
    if (outing.endsAt <= now) return conflict("over", "This outing is over and cannot be called off.");
    const wasPublic = outing.state !== "draft";
    setOutingState(conn, now, outing.id, "called off", input.because);
    cancelQueued(conn, outing.id);
    const addressees = wasPublic ? addresseesOf(conn, now, outing) : [];
    const calendar = calendarOf({ ...outing, state: "called off", edition: outing.edition + 1 }, now);
    for (const person of addressees) {
      queueMessage(conn, now, {
        kind: "called-off",
        facts: { name: person.name, outing: publicOutingFacts(outing), because: input.because, calendar },
        toAddress: person.email,
        toPersonId: person.id,
        outingId: outing.id,
      });
    }
    return ok({ title: outing.title, told: addressees.length });
  },
});
