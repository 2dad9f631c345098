import { knex, type Connection } from "@/db/connection";
import type { OutingRow, SiteRow } from "@/db/tables";
import { newId } from "@/lib/shared/ids";
import { slugFrom, type Outing, type OutingState, type Site } from "./outing";

const siteColumns = ["id", "slug", "name", "land_manager", "zone", "ground", "meeting_point"] as const;
const columns = [
  "id", "slug", "title", "theme", "summary", "site_id", "starts_at", "ends_at", "youngest_age", "oldest_age",
  "suggested_fee_cents", "currency", "policy_id", "meeting_text", "state", "called_off_because", "edition",
  "request_id", "created_at", "updated_at",
] as const;

function siteFrom(row: SiteRow): Site {
  return {
    id: row.id,
    slug: row.slug,
    name: row.name,
    landManager: row.land_manager,
    zone: row.zone,
    ground: row.ground,
    meetingPoint: row.meeting_point,
  };
}

type Room = { seats: number; seatsFree: number; waiting: number };

function outingFrom(row: OutingRow, site: Site, room: Room, modelIds: string[]): Outing {
  return {
    id: row.id,
    slug: row.slug,
    title: row.title,
    theme: row.theme,
    summary: row.summary,
    site,
    startsAt: row.starts_at,
    endsAt: row.ends_at,
    ...room,
    youngestAge: row.youngest_age,
    oldestAge: row.oldest_age,
    suggestedFeeCents: row.suggested_fee_cents,
    currency: row.currency,
    policyId: row.policy_id,
    meetingText: row.meeting_text,
    state: row.state,
    calledOffBecause: row.called_off_because,
    edition: row.edition,
    modelIds,
  };
}

/** Rows to outings with three more queries for all of them together, however many they are. */
function withRoom(conn: Connection, rows: OutingRow[], now: string): Outing[] {
  if (rows.length === 0) return [];
  const ids = rows.map((row) => row.id);
  const sites = listSites(conn);
  const seats = conn.all(
    knex("seats")
      .leftJoin("registrations as r", "r.id", "seats.registration_id")
      .whereIn("seats.outing_id", ids)
      .groupBy("seats.outing_id")
      .select("seats.outing_id")
      .select<{ outing_id: string; seats: number; free: number }[]>(
        knex.raw("count(*) as seats"),
        knex.raw("sum(seats.registration_id is null or (r.state = 'held' and r.hold_ends_at <= ?)) as free", [now]),
      ),
  );
  const waiting = conn.all(
    knex("registrations").whereIn("outing_id", ids).where({ state: "waiting" }).groupBy("outing_id").select("outing_id").count({ n: "*" }),
  );
  const models = conn.all(
    knex("outing_models as om").join("teaching_models as m", "m.id", "om.model_id").whereIn("om.outing_id", ids).orderBy("m.position").select("om.outing_id", "om.model_id"),
  );
  return rows.map((row) => {
    const site = sites.find((one) => one.id === row.site_id);
    if (!site) throw new Error(`outing ${row.id} has no site`);
    const room = seats.find((one) => one.outing_id === row.id);
    const queue = Number(waiting.find((one) => one.outing_id === row.id)?.n ?? 0);
    const modelIds = models.filter((one) => one.outing_id === row.id).map((one) => one.model_id);
    return outingFrom(row, site, { seats: room?.seats ?? 0, seatsFree: room?.free ?? 0, waiting: queue }, modelIds);
  });
}

export function listSites(conn: Connection): Site[] {
  return conn.all(knex("sites").select(...siteColumns).orderBy("name")).map(siteFrom);
}

export function findOuting(conn: Connection, where: { slug: string } | { id: string } | { request_id: string }, now: string): Outing | null {
  const row = conn.first(knex("outings").where(where).select(...columns));
  return row ? (withRoom(conn, [row], now)[0] ?? null) : null;
}

export function listOutingsBetween(conn: Connection, from: string, to: string, states: readonly OutingState[], now: string): Outing[] {
  const rows = conn.all(
    knex("outings").where("ends_at", ">", from).where("starts_at", "<", to).whereIn("state", states).orderBy("starts_at").select(...columns),
  );
  return withRoom(conn, rows, now);
}

export type OutingFields = {
  title: string;
  theme: string;
  summary: string;
  siteId: string;
  startsAt: string;
  endsAt: string;
  youngestAge: number;
  oldestAge: number;
  suggestedFeeCents: number;
  policyId: string;
  meetingText: string;
};

function fieldColumns(fields: OutingFields, now: string) {
  return {
    title: fields.title,
    theme: fields.theme,
    summary: fields.summary,
    site_id: fields.siteId,
    starts_at: fields.startsAt,
    ends_at: fields.endsAt,
    youngest_age: fields.youngestAge,
    oldest_age: fields.oldestAge,
    suggested_fee_cents: fields.suggestedFeeCents,
    policy_id: fields.policyId,
    meeting_text: fields.meetingText,
    updated_at: now,
  };
}

export function insertOuting(
  conn: Connection,
  now: string,
  outing: OutingFields & { seats: number; requestId: string; modelIds: string[]; state?: OutingState },
): { id: string; slug: string } {
  const id = newId();
  const slug = freeSlug(conn, slugFrom(outing.title));
  conn.run(
    knex("outings").insert({
      ...fieldColumns(outing, now),
      id,
      slug,
      currency: "usd",
      state: outing.state ?? "draft",
      called_off_because: null,
      edition: 1,
      request_id: outing.requestId,
      created_at: now,
    }),
  );
  addSeats(conn, id, 1, outing.seats);
  setModels(conn, id, outing.modelIds);
  return { id, slug };
}

/** Changes an outing if it is still the edition that was read. */
export function updateOuting(conn: Connection, now: string, id: string, edition: number, fields: OutingFields, modelIds: string[]): boolean {
  const { changes } = conn.run(
    knex("outings").where({ id, edition }).update({ ...fieldColumns(fields, now), edition: edition + 1 }),
  );
  if (changes === 1) setModels(conn, id, modelIds);
  return changes === 1;
}

export function setOutingState(conn: Connection, now: string, id: string, state: OutingState, because: string | null = null): void {
  conn.run(
    knex("outings")
      .where({ id })
      .update({ state, called_off_because: because, updated_at: now, edition: knex.raw("edition + 1") }),
  );
}

function setModels(conn: Connection, outingId: string, modelIds: string[]): void {
  conn.run(knex("outing_models").where({ outing_id: outingId }).del());
  for (const modelId of new Set(modelIds)) {
    conn.run(knex("outing_models").insert({ outing_id: outingId, model_id: modelId }));
  }
}

function addSeats(conn: Connection, outingId: string, from: number, to: number): void {
  for (let number = from; number <= to; number += 1) {
    conn.run(knex("seats").insert({ outing_id: outingId, number, registration_id: null }));
  }
}

/** Adds free seats, or takes away free ones from the highest number down. False: too few are free. */
export function setSeatCount(conn: Connection, outingId: string, wanted: number): boolean {
  const rows = conn.all(knex("seats").where({ outing_id: outingId }).orderBy("number", "desc").select("number", "registration_id"));
  if (wanted > rows.length) addSeats(conn, outingId, (rows[0]?.number ?? 0) + 1, (rows[0]?.number ?? 0) + wanted - rows.length);
  const tooMany = rows.length - wanted;
  const free = rows.filter((row) => row.registration_id === null).slice(0, Math.max(0, tooMany));
  if (free.length < tooMany) return false;
  for (const seat of free) conn.run(knex("seats").where({ outing_id: outingId, number: seat.number }).del());
  return true;
}

function freeSlug(conn: Connection, wished: string): string {
  const taken = new Set(
    conn.all(knex("outings").whereLike("slug", `${wished}%`).select("slug")).map((row) => row.slug),
  );
  if (!taken.has(wished)) return wished;
  let n = 2;
  while (taken.has(`${wished}-${n}`)) n += 1;
  return `${wished}-${n}`;
}

export function findPolicy(conn: Connection, id: string): { id: string; key: string; version: number; body: string } | null {
  return conn.first(knex("policies").where({ id }).select("id", "key", "version", "body")) ?? null;
}

/** The newest version of each policy, for choosing one. */
export function listPolicies(conn: Connection): { id: string; name: string }[] {
  const rows = conn.all(
    knex("policies as p")
      .whereRaw("p.version = (select max(version) from policies where key = p.key)")
      .orderBy("p.key")
      .select("p.id", "p.version", "p.body"),
  );
  return rows.map((row) => ({ id: row.id, name: `${(JSON.parse(row.body) as { name: string }).name}, version ${row.version}` }));
}

export function insertPolicy(conn: Connection, now: string, policy: { key: string; version: number }): string {
  const id = newId();
  conn.run(knex("policies").insert({ id, key: policy.key, version: policy.version, body: JSON.stringify(policy), created_at: now }));
  return id;
}

export function insertSite(conn: Connection, site: Omit<Site, "id">): string {
  const id = newId();
  conn.run(
    knex("sites").insert({
      id,
      slug: site.slug,
      name: site.name,
      land_manager: site.landManager,
      zone: site.zone,
      ground: site.ground,
      meeting_point: site.meetingPoint,
    }),
  );
  return id;
}
