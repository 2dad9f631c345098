import { isSignedIn, personIdOf } from "@/lib/shared/actor";
import { forbidden, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mayChangeProfile } from "./family-policy";
import { writeProfileSchema } from "./family-schema";
import { findOwnParticipant, insertProfile } from "./participant-store";

/** Keeps what a family says about a child as the next version of the access profile. */
export const writeProfile = defineCommand({
  input: writeProfileSchema,
  load: (conn, actor, input) => findOwnParticipant(conn, personIdOf(actor) ?? "", input.participantId),
  allow: (actor, participant) => mayChangeProfile(actor, participant),
  run: ({ conn, now, actor, found: participant, input }) => {
    if (!isSignedIn(actor)) return forbidden();
    const { participantId, ...answers } = input;
    const { version } = insertProfile(conn, now, { participantId, answers, writtenBy: actor.personId });
    return ok({ participantId, nameUsed: participant.nameUsed, version });
  },
});
