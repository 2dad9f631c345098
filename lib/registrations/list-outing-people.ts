import { isStaff } from "@/lib/shared/actor";
import { ageOn } from "@/lib/shared/dates";
import { findProfile } from "@/lib/families/participant-store";
import { slugSchema } from "@/lib/outings/outing-schema";
import { outingDay } from "@/lib/outings/outing";
import { findOuting } from "@/lib/outings/outing-store";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { stepsLeft } from "./registration";
import { listRegistrationsOf } from "./registration-store";

/** Who is coming, held or waiting, for the desk. */
export const listOutingPeople = defineQuery({
  input: slugSchema,
  load: (conn, _actor, { slug }, now) => {
    const outing = findOuting(conn, { slug }, now);
    if (!outing) return null;
    const registrations = listRegistrationsOf(conn, outing.id, ["confirmed", "held", "waiting", "withdrawn"], now);
    const profiles = registrations.map((one) => (one.profileId ? findProfile(conn, one.profileId) : null));
    return { outing, registrations, profiles };
  },
  allow: (actor) => isStaff(actor),
  run: ({ found: { outing, registrations, profiles } }) =>
    ok(
      registrations.map((one, index) => ({
        id: one.id,
        nameUsed: one.participant.nameUsed,
        age: ageOn(one.participant.birthDate, outingDay(outing)),
        state: one.state,
        number: one.seatNumber,
        placeInQueue: one.placeInQueue,
        profile: profiles[index] ?? null,
        guardianStays: one.guardianStays,
        thisTime: one.thisTime,
        missing: stepsLeft({ hasNeeds: one.hasNeeds, signed: one.signature !== null, feeSettled: one.feeSettled }),
        fee: one.payment?.state === "settled" ? (one.payment.kind === "no-fee" ? "no-fee place" : "paid") : "open",
      })),
    ),
});
