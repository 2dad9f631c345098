import { personIdOf } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { mayChangeProfile } from "./family-policy";
import { participantIdSchema } from "./family-schema";
import { findOwnParticipant } from "./participant-store";

export const showChild = defineQuery({
  input: participantIdSchema,
  load: (conn, actor, { participantId }) => findOwnParticipant(conn, personIdOf(actor) ?? "", participantId),
  allow: (actor, participant) => mayChangeProfile(actor, participant),
  run: ({ found: child }) =>
    ok({ id: child.id, nameUsed: child.nameUsed, legalName: child.legalName, birthDate: child.birthDate, profile: child.profile }),
});
