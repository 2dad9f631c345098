import { mayChangeRegistration } from "@/lib/registrations/registration-policy";
import { isLive } from "@/lib/registrations/registration";
import { findOwnRegistration } from "@/lib/registrations/registration-store";
import { broughtUpToNow, confirmIfComplete } from "@/lib/registrations/settle-seats";
import { isSignedIn, personIdOf } from "@/lib/shared/actor";
import { dayOf } from "@/lib/shared/dates";
import { conflict, forbidden, invalid, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { signWaiverSchema } from "./waiver-schema";
import { findWaiverInForce, insertSignature } from "./waiver-store";

/** Stores who signed which text, letter for letter by its hash, and when. Signing twice changes nothing. */
export const signWaiver = defineCommand({
  input: signWaiverSchema,
  load: (conn, actor, input, now) => {
    const registration = findOwnRegistration(conn, personIdOf(actor) ?? "", input.registrationId, now);
    const text = registration && findWaiverInForce(conn, dayOf(now, registration.outing.site.zone));
    return registration && text ? { registration, text } : null;
  },
  allow: (actor, { registration }) => mayChangeRegistration(actor, registration),
  run: ({ conn, now, actor, input, found: { registration: found, text } }) => {
    if (!isSignedIn(actor)) return forbidden();
    const registration = broughtUpToNow(conn, now, found);
    if (registration.signature) return ok({ registrationId: registration.id });
    if (!isLive(registration.state)) {
      return conflict("not-live", "The time to finish this registration is over. Register again from the outing's page.");
    }
    if (input.textSha256 !== text.sha256) {
      return conflict("other-text", "The waiver's text has changed since you opened this page. Load the page again and read the new text before you sign.");
    }
    const today = dayOf(now, registration.outing.site.zone);
    if (input.typedDate !== today) return invalid({ typedDate: `Enter today's date: ${today}.` });
    insertSignature(conn, now, {
      registrationId: registration.id,
      text,
      signedBy: actor.personId,
      typedName: input.typedName,
      typedDate: input.typedDate,
    });
    confirmIfComplete(conn, now, registration.id);
    return ok({ registrationId: registration.id });
  },
});
