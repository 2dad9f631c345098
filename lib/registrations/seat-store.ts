import { knex, type Connection } from "@/db/connection";

/**
 * Seats are rows: each has one holder or none, so selling one twice is not a mistake somebody could make.
 * Every function here runs inside its caller's IMMEDIATE transaction.
 */

/** Gives the lowest free seat to a registration. False: none is free. */
function takeSeat(conn: Connection, outingId: string, registrationId: string): boolean {
  const lowest = knex("seats").where({ outing_id: outingId }).whereNull("registration_id").min("number");
  const { changes } = conn.run(
    knex("seats").where({ outing_id: outingId }).whereNull("registration_id").where("number", "=", lowest).update({ registration_id: registrationId }),
  );
  return changes === 1;
}

export function holdSeat(conn: Connection, now: string, outingId: string, registrationId: string, until: string): boolean {
  if (!takeSeat(conn, outingId, registrationId)) return false;
  conn.run(
    knex("registrations").where({ id: registrationId }).update({ state: "held", hold_ends_at: until, waiting_since: null, updated_at: now }),
  );
  return true;
}

/** Never past the start of the outing. */
export function extendHold(conn: Connection, now: string, registrationId: string, wished: string, startsAt: string): void {
  const until = wished < startsAt ? wished : startsAt;
  conn.run(
    knex("registrations")
      .where({ id: registrationId, state: "held" })
      .where("hold_ends_at", "<", until)
      .update({ hold_ends_at: until, updated_at: now }),
  );
}

/** Behind everybody who waits already: of those who come in the same millisecond, nobody slips in front later. */
export function joinQueue(conn: Connection, now: string, registrationId: string): void {
  const outingId = knex("registrations").where({ id: registrationId }).select("outing_id");
  const last = conn.first(
    knex("registrations").where({ state: "waiting" }).where("outing_id", "=", outingId).max({ since: "waiting_since" }),
  )?.since as string | null | undefined;
  const since = last != null && last >= now ? new Date(Date.parse(last) + 1).toISOString() : now;
  conn.run(
    knex("registrations").where({ id: registrationId }).update({ state: "waiting", waiting_since: since, hold_ends_at: null, updated_at: now }),
  );
}

export function confirmSeat(conn: Connection, now: string, registrationId: string): void {
  conn.run(
    knex("registrations").where({ id: registrationId, state: "held" }).update({ state: "confirmed", hold_ends_at: null, confirmed_at: now, updated_at: now }),
  );
}

export function giveUpSeat(conn: Connection, now: string, registrationId: string, state: "withdrawn" | "turned away" = "withdrawn"): void {
  conn.run(knex("seats").where({ registration_id: registrationId }).update({ registration_id: null }));
  conn.run(knex("pairings").where({ registration_id: registrationId }).del());
  conn.run(
    knex("registrations").where({ id: registrationId }).update({ state, hold_ends_at: null, waiting_since: null, updated_at: now }),
  );
}

/** Holds of this outing whose time is over. */
export function listLapsedHolds(conn: Connection, outingId: string, now: string): string[] {
  return conn
    .all(knex("registrations").where({ outing_id: outingId, state: "held" }).where("hold_ends_at", "<=", now).select("id"))
    .map((row) => row.id);
}

/** Who has waited longest, or null. */
export function firstInQueue(conn: Connection, outingId: string): string | null {
  return (
    conn.first(
      knex("registrations").where({ outing_id: outingId, state: "waiting" }).orderBy(["waiting_since", "id"]).select("id"),
    )?.id ?? null
  );
}

/** Outings with something to settle: a hold whose time is over, or a seat that became free while somebody waits. */
export function listOutingsToSettle(conn: Connection, now: string): string[] {
  const lapsed = conn.all(knex("registrations").where({ state: "held" }).where("hold_ends_at", "<=", now).distinct("outing_id"));
  const waitedFor = knex("registrations").where({ state: "waiting" }).select("outing_id");
  const free = conn.all(knex("seats").whereNull("registration_id").whereIn("outing_id", waitedFor).distinct("outing_id"));
  return [...new Set([...lapsed, ...free].map((row) => row.outing_id))];
}
