import { insertProfile } from "@/lib/families/participant-store";
import { isSignedIn, personIdOf } from "@/lib/shared/actor";
import { conflict, forbidden, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { isLive } from "./registration";
import { mayChangeRegistration } from "./registration-policy";
import { confirmNeedsSchema } from "./registration-schema";
import { findOwnRegistration, setNeeds } from "./registration-store";
import { broughtUpToNow, confirmIfComplete } from "./settle-seats";

/** What the child needs on this outing: the profile confirmed or changed, and what is different this time. */
export const confirmNeeds = defineCommand({
  input: confirmNeedsSchema,
  load: (conn, actor, input, now) => findOwnRegistration(conn, personIdOf(actor) ?? "", input.registrationId, now),
  allow: (actor, registration) => mayChangeRegistration(actor, registration),
  run: ({ conn, now, actor, found, input }) => {
    if (!isSignedIn(actor)) return forbidden();
    const registration = broughtUpToNow(conn, now, found);
    const { registrationId, guardianStays, thisTime, ...answers } = input;
    if (!isLive(registration.state)) {
      return conflict("not-live", "The time to finish this registration is over. Register again from the outing's page.");
    }
    const profile = insertProfile(conn, now, { participantId: registration.participant.id, answers, writtenBy: actor.personId });
    setNeeds(conn, now, registrationId, { profileId: profile.id, guardianStays, thisTime });
    confirmIfComplete(conn, now, registrationId);
    return ok({ registrationId });
  },
});
