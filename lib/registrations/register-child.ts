import { isPublic, outingDay, roomInWords, takesRegistrations, type Outing } from "@/lib/outings/outing";
import { agesInWords } from "@/lib/outings/outing";
import { findOuting } from "@/lib/outings/outing-store";
import { publicOutingFacts } from "@/lib/outings/outing-facts";
import { findOwnParticipant } from "@/lib/families/participant-store";
import type { Participant } from "@/lib/families/participant";
import { queueMessage } from "@/lib/messages/message-store";
import { isSignedIn, personIdOf, type SignedIn } from "@/lib/shared/actor";
import type { Connection } from "@/db/connection";
import { ageOn } from "@/lib/shared/dates";
import { conflict, forbidden, invalid, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { holdEnd, isLive } from "./registration";
import { mayRegister } from "./registration-policy";
import { registerChildSchema } from "./registration-schema";
import { findRegistration, findRegistrationOfChild, insertRegistration } from "./registration-store";
import { firstInQueue, holdSeat, joinQueue } from "./seat-store";
import { confirmIfComplete, settleSeats } from "./settle-seats";

/** Holds a seat for a child while the form is finished, or puts the child on the waiting list. */
export const registerChild = defineCommand({
  input: registerChildSchema,
  load: (conn, actor, input, now) => {
    const outing = findOuting(conn, { slug: input.slug }, now);
    const participant = findOwnParticipant(conn, personIdOf(actor) ?? "", input.participantId);
    return outing && isPublic(outing) && participant ? { outing, participant } : null;
  },
  allow: (actor, { participant }) => mayRegister(actor, participant),
  run: ({ conn, now, actor, found: { outing, participant } }) => {
    if (!isSignedIn(actor)) return forbidden();
    const before = findRegistrationOfChild(conn, outing.id, participant.id);
    settleSeats(conn, now, outing);
    const after = before && findRegistration(conn, before.id, now);
    if (after && isLive(after.state)) return ok({ registrationId: after.id, state: after.state });
    if (after?.state === "turned away") {
      return conflict("turned-away", "We could not take this registration. Call or write to us and we will talk it over.");
    }
    if (!takesRegistrations(outing, now)) {
      return conflict("not-open", `${roomInWords(outing, now)}: this outing takes no registrations now. Have a look at the next ones.`);
    }
    const refusal = ageRefusal(outing, participant);
    if (refusal) return invalid({ participantId: refusal });
    const id = after?.id ?? insertRegistration(conn, now, { outingId: outing.id, participantId: participant.id, registeredBy: actor.personId });
    return ok({ registrationId: id, state: seatOrQueue(conn, now, { id, outing, actor }) });
  },
});

function seatOrQueue(conn: Connection, now: string, given: { id: string; outing: Outing; actor: SignedIn }): "held" | "waiting" | "confirmed" {
  const { id, outing, actor } = given;
  const nobodyWaits = firstInQueue(conn, outing.id) === null;
  if (nobodyWaits && holdSeat(conn, now, outing.id, id, holdEnd(now, outing.startsAt))) {
    return confirmIfComplete(conn, now, id) ? "confirmed" : "held";
  }
  joinQueue(conn, now, id);
  queueMessage(conn, now, {
    kind: "on-the-waiting-list",
    facts: {
      name: actor.name,
      outing: publicOutingFacts(outing),
      registrationId: id,
      place: findRegistration(conn, id, now)?.placeInQueue ?? 1,
    },
    toAddress: actor.email,
    toPersonId: actor.personId,
    outingId: outing.id,
  });
  return "waiting";
}

function ageRefusal(outing: Outing, participant: Participant): string | null {
  const age = ageOn(participant.birthDate, outingDay(outing));
  if (age >= outing.youngestAge && age <= outing.oldestAge) return null;
  return `${participant.nameUsed} will be ${age} on the day, and this outing is for ${agesInWords(outing)}. Choose another outing, or call us if you think it would fit.`;
}
