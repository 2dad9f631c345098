import { knex, type Connection } from "@/db/connection";
import { newId } from "@/lib/shared/ids";

export function insertHousehold(conn: Connection, now: string, guardianId: string): string {
  const id = newId();
  conn.run(knex("households").insert({ id, created_at: now }));
  conn.run(knex("household_guardians").insert({ household_id: id, person_id: guardianId }));
  return id;
}

export function findHouseholdOf(conn: Connection, guardianId: string): string | null {
  return conn.first(knex("household_guardians").where({ person_id: guardianId }).select("household_id"))?.household_id ?? null;
}
