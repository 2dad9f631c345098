import { ageOn, dayOf } from "@/lib/shared/dates";
import { isSignedIn, personIdOf } from "@/lib/shared/actor";
import { env } from "@/lib/shared/env";
import { conflict, forbidden, invalid, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mayKeepFamily } from "./family-policy";
import { addChildSchema } from "./family-schema";
import { findHouseholdOf, insertHousehold } from "./household-store";
import { findParticipantByRequest, insertParticipant, listOwnParticipants } from "./participant-store";

/** Adds a child to the guardian's household. The same form sent twice adds one. */
export const addChild = defineCommand({
  input: addChildSchema,
  load: (conn, actor, input) => ({
    before: findParticipantByRequest(conn, input.requestId),
    householdId: findHouseholdOf(conn, personIdOf(actor) ?? ""),
    children: listOwnParticipants(conn, personIdOf(actor) ?? ""),
  }),
  allow: (actor, { before }) => mayKeepFamily(actor) && (!before || before.guardianIds.includes(personIdOf(actor) ?? "")),
  run: ({ conn, now, actor, input, found: { before, householdId, children } }) => {
    if (!isSignedIn(actor)) return forbidden();
    if (before) return ok({ participantId: before.id });
    const age = ageOn(input.birthDate, dayOf(now, env().PROGRAMME_ZONE));
    if (age < 0) return invalid({ birthDate: "This date is still to come. Enter the date of birth." });
    if (age > 25) return invalid({ birthDate: "Our outings are for children and teenagers. Check the year of birth." });
    const twin = children.find((child) => child.birthDate === input.birthDate && child.legalName === input.legalName);
    if (twin) {
      return conflict("already-there", `${twin.nameUsed}, born on the same day, is in your family already. Choose them from the list.`);
    }
    const home = householdId ?? insertHousehold(conn, now, actor.personId);
    return ok({ participantId: insertParticipant(conn, now, { ...input, householdId: home }) });
  },
});
