import { knex, type Connection } from "@/db/connection";
import { newId, sha256 } from "@/lib/shared/ids";
import type { Paper, PaperForm } from "./paper";
import type { RosterFacts } from "./roster-facts";

type Stored = Paper & { facts: RosterFacts; factsSha256: string };

const columns = ["id", "outing_id", "kind", "form", "text_size_pt", "version", "facts_sha256", "facts", "printed_by", "printed_at"] as const;

function stored(conn: Connection, query: ReturnType<typeof papers>): Stored[] {
  return conn.all(query).map((row) => ({
    id: row.id,
    outingId: row.outing_id,
    form: row.form,
    textSizePt: row.text_size_pt,
    version: row.version,
    printedAt: row.printed_at,
    printedBy: row.printed_by,
    facts: JSON.parse(row.facts) as RosterFacts,
    factsSha256: row.facts_sha256,
  }));
}

function papers() {
  return knex("papers").where({ kind: "roster" }).orderBy("printed_at", "desc").select(...columns);
}

export function findPaper(conn: Connection, id: string): Stored | null {
  return stored(conn, papers().where({ id }))[0] ?? null;
}

export function listPapersOf(conn: Connection, outingId: string): Stored[] {
  return stored(conn, papers().where({ outing_id: outingId }));
}

/** The version these facts have: the last one if nothing changed, the next one otherwise. */
export function versionOf(conn: Connection, outingId: string, factsSha256: string): number {
  const last = listPapersOf(conn, outingId).toSorted((a, b) => b.version - a.version)[0];
  if (!last) return 1;
  return last.factsSha256 === factsSha256 ? last.version : last.version + 1;
}

/** The hash of what the roster says, without its version and the time it was printed. */
export function rosterHash(facts: RosterFacts): string {
  return sha256(JSON.stringify({ ...facts, version: 0, printedAt: "", printedAtInWords: "" }));
}

export function insertPaper(
  conn: Connection,
  paper: { outingId: string; form: PaperForm; textSizePt: number; facts: RosterFacts; printedBy: string },
): string {
  const same = listPapersOf(conn, paper.outingId).find(
    (one) => one.version === paper.facts.version && one.form === paper.form && one.textSizePt === paper.textSizePt,
  );
  if (same) return same.id;
  const id = newId();
  conn.run(
    knex("papers").insert({
      id,
      outing_id: paper.outingId,
      kind: "roster",
      form: paper.form,
      text_size_pt: paper.textSizePt,
      version: paper.facts.version,
      facts_sha256: rosterHash(paper.facts),
      facts: JSON.stringify(paper.facts),
      printed_by: paper.printedBy,
      printed_at: paper.facts.printedAt,
    }),
  );
  return id;
}

export function noteReading(conn: Connection, now: string, reading: { personId: string; what: string; aboutId: string }): void {
  conn.run(knex("access_log").insert({ person_id: reading.personId, what: reading.what, about_id: reading.aboutId, at: now }));
}
