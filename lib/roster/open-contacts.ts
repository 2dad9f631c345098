import { z } from "zod";
import { findPerson } from "@/lib/people/person-store";
import { findProfile } from "@/lib/families/participant-store";
import { slugSchema } from "@/lib/outings/outing-schema";
import { outingView } from "@/lib/outings/outing-view";
import { maySeeRoster } from "@/lib/registrations/registration-policy";
import { listRegistrationsOf } from "@/lib/registrations/registration-store";
import { isSignedIn, isStaff } from "@/lib/shared/actor";
import { forbidden, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { noteReading } from "./paper-store";
import { findRosterOuting } from "./roster-access";

/**
 * Whom to call and who may collect, for the people of a day: for staff, and for its leader until three days
 * after. Legal names, vehicles and reading stay with staff. Every reading is noted, so it is a command.
 */
export const openContacts = defineCommand({
  input: slugSchema.extend({ at: z.enum(["desk", "field"]).default("field") }),
  load: (conn, actor, { slug }, now) => {
    const scope = findRosterOuting(conn, actor, slug, now);
    if (!scope) return null;
    const people = listRegistrationsOf(conn, scope.outing.id, ["confirmed"], now).map((registration) => ({
      registration,
      profile: registration.profileId ? findProfile(conn, registration.profileId) : null,
      guardian: findPerson(conn, registration.registeredBy),
    }));
    return { ...scope, people };
  },
  // The desk is for staff, also where a leader could read the same on their own page.
  allow: (actor, { access }, { at }) => (at === "field" || isStaff(actor)) && maySeeRoster(actor, access, access.now),
  run: ({ conn, now, actor, found: { outing, people } }) => {
    if (!isSignedIn(actor)) return forbidden();
    noteReading(conn, now, { personId: actor.personId, what: "opened contacts and pick-up list", aboutId: outing.id });
    const forStaff = isStaff(actor);
    return ok({
      outing: outingView(outing, now),
      people: people
        .toSorted((one, other) => (one.registration.seatNumber ?? 0) - (other.registration.seatNumber ?? 0))
        .map(({ registration, profile, guardian }) => ({
          id: registration.id,
          number: registration.seatNumber,
          nameUsed: registration.participant.nameUsed,
          guardian: guardian && { name: guardian.name, phone: guardian.phone },
          guardianStays: registration.guardianStays,
          contacts: profile?.contacts ?? [],
          pickUp: profile?.pickUp ?? [],
          staffOnly: forStaff
            ? { legalName: registration.participant.legalName, transfer: profile?.transfer ?? null, reading: profile?.reading ?? "not told" }
            : null,
        })),
    });
  },
});
