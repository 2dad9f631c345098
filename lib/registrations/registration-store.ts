import { knex, type Connection } from "@/db/connection";
import type { PaymentRow, RegistrationRow } from "@/db/tables";
import { findParticipant } from "@/lib/families/participant-store";
import type { Participant } from "@/lib/families/participant";
import type { Outing } from "@/lib/outings/outing";
import { findOuting } from "@/lib/outings/outing-store";
import { dayOf } from "@/lib/shared/dates";
import { newId } from "@/lib/shared/ids";
import { findWaiverInForce } from "@/lib/waivers/waiver-store";
import type { GuardianPlan, RegistrationState } from "./registration";

const columns = [
  "id", "outing_id", "participant_id", "registered_by", "state", "hold_ends_at", "waiting_since", "confirmed_at",
  "profile_id", "guardian_stays", "this_time", "created_at", "updated_at",
] as const;

export type Registration = {
  id: string;
  outing: Outing;
  participant: Participant;
  registeredBy: string;
  state: RegistrationState;
  holdEndsAt: string | null;
  waitingSince: string | null;
  placeInQueue: number | null;
  seatNumber: number | null;
  profileId: string | null;
  guardianStays: GuardianPlan | null;
  thisTime: string;
  hasNeeds: boolean;
  signature: { typedName: string; signedAt: string; version: number } | null;
  payment: Payment | null;
  feeSettled: boolean;
};

export type Payment = {
  id: string;
  kind: "checkout" | "no-fee";
  amountCents: number;
  currency: string;
  state: "pending" | "settled" | "abandoned" | "returned";
  checkoutUrl: string | null;
  checkoutSessionId: string | null;
  createdAt: string;
};

function paymentFrom(row: PaymentRow): Payment {
  return {
    id: row.id,
    kind: row.kind,
    amountCents: row.amount_cents,
    currency: row.currency,
    state: row.state,
    checkoutUrl: row.checkout_url,
    checkoutSessionId: row.checkout_session_id,
    createdAt: row.created_at,
  };
}

function registrationFrom(conn: Connection, row: RegistrationRow, now: string): Registration {
  const outing = findOuting(conn, { id: row.outing_id }, now);
  const participant = findParticipant(conn, row.participant_id);
  if (!outing || !participant) throw new Error(`registration ${row.id} has lost its outing or its child`);
  const seat = conn.first(knex("seats").where({ registration_id: row.id }).select("number"));
  const signature = countingSignature(conn, row, dayOf(now, outing.site.zone));
  const payment = livePayment(conn, row.id);
  return {
    id: row.id,
    outing,
    participant,
    registeredBy: row.registered_by,
    state: row.state,
    holdEndsAt: row.hold_ends_at,
    waitingSince: row.waiting_since,
    placeInQueue: row.waiting_since === null ? null : placeInQueue(conn, row),
    seatNumber: seat?.number ?? null,
    profileId: row.profile_id,
    guardianStays: row.guardian_stays,
    thisTime: row.this_time ?? "",
    hasNeeds: row.profile_id !== null && row.guardian_stays !== null,
    signature: signature ? { typedName: signature.typed_name, signedAt: signature.signed_at, version: signature.version } : null,
    payment,
    feeSettled: payment?.state === "settled",
  };
}

/** The newest signature. Before the seat is confirmed it counts only if its text is still the one in force. */
function countingSignature(conn: Connection, row: RegistrationRow, today: string) {
  const newest = conn.first(
    knex("signatures as s")
      .join("waiver_texts as w", "w.id", "s.waiver_text_id")
      .where("s.registration_id", row.id)
      .orderBy("w.version", "desc")
      .select("s.typed_name", "s.signed_at", "w.version"),
  );
  if (!newest || row.state === "confirmed") return newest;
  return newest.version === findWaiverInForce(conn, today)?.version ? newest : undefined;
}

function placeInQueue(conn: Connection, row: RegistrationRow): number {
  const before = conn.first(
    knex("registrations")
      .where({ outing_id: row.outing_id, state: "waiting" })
      .whereRaw("(waiting_since, id) < (?, ?)", [row.waiting_since, row.id])
      .count({ n: "*" }),
  );
  return Number(before?.n ?? 0) + 1;
}

function livePayment(conn: Connection, registrationId: string): Payment | null {
  const row = conn.first(
    knex("payments")
      .where({ registration_id: registrationId })
      .whereIn("state", ["settled", "pending"])
      .orderByRaw("state = 'settled' desc")
      .select(
        "id", "registration_id", "kind", "amount_cents", "currency", "state", "checkout_session_id", "checkout_url",
        "payment_intent_id", "created_at", "settled_at",
      ),
  );
  return row ? paymentFrom(row) : null;
}

export function findRegistration(conn: Connection, id: string, now: string): Registration | null {
  const row = conn.first(knex("registrations").where({ id }).select(...columns));
  return row ? registrationFrom(conn, row, now) : null;
}

/** Only a guardian's own; another family's is not there at all. */
export function findOwnRegistration(conn: Connection, guardianId: string, id: string, now: string): Registration | null {
  const registration = findRegistration(conn, id, now);
  return registration?.participant.guardianIds.includes(guardianId) ? registration : null;
}

export function listOwnRegistrations(conn: Connection, guardianId: string, now: string): Registration[] {
  const rows = conn.all(
    knex("registrations as r")
      .join("participants as p", "p.id", "r.participant_id")
      .join("household_guardians as hg", "hg.household_id", "p.household_id")
      .join("outings as o", "o.id", "r.outing_id")
      .where("hg.person_id", guardianId)
      .orderBy("o.starts_at")
      .select(...columns.map((column) => `r.${column}` as const)),
  ) as RegistrationRow[];
  return rows.map((row) => registrationFrom(conn, row, now));
}

export function listRegistrationsOf(conn: Connection, outingId: string, states: RegistrationState[], now: string): Registration[] {
  const rows = conn.all(
    knex("registrations").where({ outing_id: outingId }).whereIn("state", states).orderBy("created_at").select(...columns),
  );
  return rows.map((row) => registrationFrom(conn, row, now));
}

/** The newest registration of a child for an outing, in whatever state. */
export function findRegistrationOfChild(conn: Connection, outingId: string, participantId: string): { id: string; state: RegistrationState } | null {
  return (
    conn.first(
      knex("registrations").where({ outing_id: outingId, participant_id: participantId }).orderBy("created_at", "desc").select("id", "state"),
    ) ?? null
  );
}

export function insertRegistration(
  conn: Connection,
  now: string,
  facts: { outingId: string; participantId: string; registeredBy: string },
): string {
  const id = newId();
  conn.run(
    knex("registrations").insert({
      id,
      outing_id: facts.outingId,
      participant_id: facts.participantId,
      registered_by: facts.registeredBy,
      state: "withdrawn",
      hold_ends_at: null,
      waiting_since: null,
      confirmed_at: null,
      profile_id: null,
      guardian_stays: null,
      this_time: null,
      created_at: now,
      updated_at: now,
    }),
  );
  return id;
}

export function setNeeds(
  conn: Connection,
  now: string,
  id: string,
  needs: { profileId: string; guardianStays: GuardianPlan; thisTime: string },
): void {
  conn.run(
    knex("registrations").where({ id }).update({
      profile_id: needs.profileId,
      guardian_stays: needs.guardianStays,
      this_time: needs.thisTime,
      updated_at: now,
    }),
  );
}

/** Outings to come are planned with the newest profile, where an earlier one had been given. */
export function followProfile(conn: Connection, now: string, participantId: string, profileId: string): void {
  const toCome = knex("outings").where("ends_at", ">", now).select("id");
  conn.run(
    knex("registrations")
      .where({ participant_id: participantId })
      .whereIn("state", ["held", "waiting", "confirmed"])
      .whereIn("outing_id", toCome)
      .whereNotNull("profile_id")
      .update({ profile_id: profileId, updated_at: now }),
  );
}
