import type { Connection } from "@/db/connection";
import { queueMessage } from "@/lib/messages/message-store";
import { outingDay, type Outing, type Site } from "@/lib/outings/outing";
import { publicOutingFacts } from "@/lib/outings/outing-facts";
import { mayPlanOutings } from "@/lib/outings/outing-policy";
import { changeOutingSchema } from "@/lib/outings/outing-schema";
import { findOuting, findPolicy, listSites, setSeatCount, updateOuting, type OutingFields } from "@/lib/outings/outing-store";
import { outingFieldsFrom } from "@/lib/outings/plan-outing";
import { calendarOf } from "@/lib/outings/show-outing-calendar";
import { ageOn, dayOf } from "@/lib/shared/dates";
import { conflict, invalid, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { addresseesOf } from "./addressees";
import { listRegistrationsOf } from "./registration-store";
import { settleSeats } from "./settle-seats";

/**
 * Changes an outing, unless somebody else changed it since this form was opened. Whoever has a seat, waits for
 * one or helps is told by mail when the day, the hours, the site or the meeting point change.
 */
export const changeOuting = defineCommand({
  input: changeOutingSchema,
  load: (conn, _actor, input, now) => {
    const outing = findOuting(conn, { slug: input.slug }, now);
    return outing && { outing, site: listSites(conn).find((site) => site.id === input.siteId), policy: findPolicy(conn, input.policyId) };
  },
  allow: (actor) => mayPlanOutings(actor),
  run: ({ conn, now, input, found: { outing, site, policy } }) => {
    if (!site) return invalid({ siteId: "Choose a site from the list." });
    if (!policy) return invalid({ policyId: "Choose a policy from the list." });
    if (outing.state === "called off" || outing.endsAt <= now) {
      return conflict("over", "This outing is over or called off, so it is not changed any more. Plan a new one.");
    }
    const fields = outingFieldsFrom(input, site);
    if (fields.startsAt !== outing.startsAt && fields.startsAt <= now) {
      return invalid({ day: "Enter a date that is still to come." });
    }
    const left = leftOut(conn, now, outing, site, fields);
    if (left) return invalid({ youngestAge: left });
    if (!updateOuting(conn, now, outing.id, input.edition, fields, input.modelIds)) {
      return conflict(
        "stale-edition",
        "Somebody else changed this outing after you opened it. What you typed is still here: open the outing in another tab, compare, and save again from there.",
      );
    }
    settleSeats(conn, now, outing);
    if (input.seats !== outing.seats && !setSeatCount(conn, outing.id, input.seats)) {
      return invalid({ seats: `${outing.seats - outing.seatsFree} seats are taken or held. Enter that many or more.` });
    }
    const changed = findOuting(conn, { id: outing.id }, now);
    if (changed) {
      settleSeats(conn, now, changed);
      if (outing.state !== "draft" && isOtherDay(outing, changed)) tellEverybody(conn, now, changed);
    }
    return ok({ slug: outing.slug });
  },
});

/** Who is in already and would be too young or too old: nobody is put out by an edit. */
function leftOut(conn: Connection, now: string, outing: Outing, site: Site, fields: OutingFields): string | null {
  const day = dayOf(fields.startsAt, site.zone);
  const isSameRule = day === outingDay(outing) && fields.youngestAge === outing.youngestAge && fields.oldestAge === outing.oldestAge;
  if (isSameRule) return null;
  const names = listRegistrationsOf(conn, outing.id, ["confirmed", "held", "waiting"], now)
    .map((one) => ({ name: one.participant.nameUsed, age: ageOn(one.participant.birthDate, day) }))
    .filter(({ age }) => age < fields.youngestAge || age > fields.oldestAge)
    .map(({ name, age }) => `${name} (${age})`);
  if (names.length === 0) return null;
  return `These ages would leave out who is registered: ${names.join(", ")}. Widen the ages, or talk to the families first.`;
}

function isOtherDay(before: Outing, after: Outing): boolean {
  return (
    before.startsAt !== after.startsAt || before.endsAt !== after.endsAt || before.site.id !== after.site.id || before.meetingText !== after.meetingText
  );
}

function tellEverybody(conn: Connection, now: string, outing: Outing): void {
  for (const person of addresseesOf(conn, now, outing)) {
    queueMessage(conn, now, {
      kind: "outing-changed",
      facts: { name: person.name, outing: publicOutingFacts(outing), calendar: calendarOf(outing, now) },
      toAddress: person.email,
      toPersonId: person.id,
      outingId: outing.id,
      onceKey: `outing-changed ${outing.id} ${outing.edition} ${person.id}`,
    });
  }
}
