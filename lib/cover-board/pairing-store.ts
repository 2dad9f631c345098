import { knex, type Connection } from "@/db/connection";

export function listPairings(conn: Connection, outingId: string) {
  return conn.all(
    knex("pairings as p").join("registrations as r", "r.id", "p.registration_id").where("r.outing_id", outingId).select("p.registration_id", "p.person_id"),
  );
}

export function setPairing(conn: Connection, registrationId: string, personId: string | null): void {
  conn.run(knex("pairings").where({ registration_id: registrationId }).del());
  if (personId !== null) conn.run(knex("pairings").insert({ registration_id: registrationId, person_id: personId }));
}
