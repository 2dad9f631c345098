import { knex, type Connection } from "@/db/connection";
import type { ParticipantRow } from "@/db/tables";
import { newId } from "@/lib/shared/ids";
import type { AccessProfile } from "./access-profile";
import type { Participant } from "./participant";

const columns = ["id", "household_id", "name_used", "legal_name", "birth_date", "created_at", "request_id"] as const;

function participantFrom(conn: Connection, row: ParticipantRow): Participant {
  const guardians = conn.all(knex("household_guardians").where({ household_id: row.household_id }).select("person_id"));
  const profile = conn.first(
    knex("access_profiles").where({ participant_id: row.id }).orderBy("version", "desc").select("id", "version", "answers"),
  );
  return {
    id: row.id,
    householdId: row.household_id,
    guardianIds: guardians.map((one) => one.person_id),
    nameUsed: row.name_used,
    legalName: row.legal_name,
    birthDate: row.birth_date,
    profile: profile ? { id: profile.id, version: profile.version, answers: JSON.parse(profile.answers) as AccessProfile } : null,
  };
}

/** Only within the guardian's own households: another family's child is not there at all. */
export function findOwnParticipant(conn: Connection, guardianId: string, participantId: string): Participant | null {
  const row = conn.first(ownParticipants(guardianId).where("participants.id", participantId));
  return row ? participantFrom(conn, row) : null;
}

export function listOwnParticipants(conn: Connection, guardianId: string): Participant[] {
  return conn.all(ownParticipants(guardianId).orderBy("participants.name_used")).map((row) => participantFrom(conn, row));
}

export function findParticipant(conn: Connection, participantId: string): Participant | null {
  const row = conn.first(knex("participants").where({ id: participantId }).select(...columns));
  return row ? participantFrom(conn, row) : null;
}

export function findParticipantByRequest(conn: Connection, requestId: string): Participant | null {
  const row = conn.first(knex("participants").where({ request_id: requestId }).select(...columns));
  return row ? participantFrom(conn, row) : null;
}

function ownParticipants(guardianId: string) {
  return knex("participants")
    .join("household_guardians as hg", "hg.household_id", "participants.household_id")
    .where("hg.person_id", guardianId)
    .select(
      "participants.id", "participants.household_id", "participants.name_used", "participants.legal_name",
      "participants.birth_date", "participants.created_at", "participants.request_id",
    );
}

export function insertParticipant(
  conn: Connection,
  now: string,
  facts: { householdId: string; nameUsed: string; legalName: string; birthDate: string; requestId: string },
): string {
  const id = newId();
  conn.run(
    knex("participants").insert({
      id,
      household_id: facts.householdId,
      name_used: facts.nameUsed,
      legal_name: facts.legalName,
      birth_date: facts.birthDate,
      created_at: now,
      request_id: facts.requestId,
    }),
  );
  return id;
}

/** Writes the next version of a profile; earlier ones stay as they were. */
export function insertProfile(
  conn: Connection,
  now: string,
  profile: { participantId: string; answers: AccessProfile; writtenBy: string },
): { id: string; version: number } {
  const last = conn.first(
    knex("access_profiles").where({ participant_id: profile.participantId }).orderBy("version", "desc").select("version", "id", "answers"),
  );
  const answers = JSON.stringify(profile.answers);
  if (last?.answers === answers) return { id: last.id, version: last.version };
  const id = newId();
  const version = (last?.version ?? 0) + 1;
  conn.run(
    knex("access_profiles").insert({
      id,
      participant_id: profile.participantId,
      version,
      answers,
      written_by: profile.writtenBy,
      written_at: now,
    }),
  );
  return { id, version };
}

export function findProfile(conn: Connection, profileId: string): AccessProfile | null {
  const row = conn.first(knex("access_profiles").where({ id: profileId }).select("answers"));
  return row ? (JSON.parse(row.answers) as AccessProfile) : null;
}
