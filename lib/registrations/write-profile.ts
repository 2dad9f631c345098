import { isSignedIn, personIdOf } from "@/lib/shared/actor";
import { forbidden, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mayChangeProfile } from "@/lib/families/family-policy";
import { writeProfileSchema } from "@/lib/families/family-schema";
import { findOwnParticipant, insertProfile } from "@/lib/families/participant-store";
import { followProfile } from "./registration-store";

/**
 * Keeps what a family says about a child as the next version of the access profile. Outings to come that relied
 * on an earlier version are planned with this one from now on.
 */
export const writeProfile = defineCommand({
  input: writeProfileSchema,
  load: (conn, actor, input) => findOwnParticipant(conn, personIdOf(actor) ?? "", input.participantId),
  allow: (actor, participant) => mayChangeProfile(actor, participant),
  run: ({ conn, now, actor, found: participant, input }) => {
    if (!isSignedIn(actor)) return forbidden();
    const { participantId, ...answers } = input;
    const { id, version } = insertProfile(conn, now, { participantId, answers, writtenBy: actor.personId });
    followProfile(conn, now, participantId, id);
    return ok({ participantId, nameUsed: participant.nameUsed, version });
  },
});
