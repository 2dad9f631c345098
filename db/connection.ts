import { mkdirSync } from "node:fs";
import path from "node:path";
import Database from "better-sqlite3";
import createKnex, { type Knex } from "knex";
import "./tables";

/** Builds queries; it never runs one. What it builds is run by a Connection, synchronously, on the one handle. */
export const knex = createKnex({ client: "better-sqlite3", useNullAsDefault: true });

type Query = Knex.QueryBuilder | Knex.Raw;

/**
 * The one handle on the database. Everything on it is synchronous, so nothing can slip into a
 * transaction: an async one was measured to take other people's writes along, and a second
 * connection to stop the process for five seconds.
 */
export type Connection = {
  first: <Q extends Query>(query: Q) => Row<Awaited<Q>> | undefined;
  all: <Q extends Query>(query: Q) => Row<Awaited<Q>>[];
  run: (query: Query) => { changes: number };
  /** IMMEDIATE; kept only if the answer is ok. An exception undoes it and is thrown on. */
  transaction: <T extends { ok: boolean }>(work: () => T) => T;
  raw: Database.Database;
  close: () => void;
};

type Row<Result> = Result extends (infer One)[] ? One : NonNullable<Result>;

class Undo extends Error {
  constructor(readonly outcome: { ok: boolean }) {
    super("undo");
  }
}

export function openConnection(file: string): Connection {
  if (file !== ":memory:") mkdirSync(path.dirname(file), { recursive: true });
  const raw = new Database(file);
  raw.pragma("journal_mode = WAL");
  raw.pragma("foreign_keys = ON");
  raw.pragma("synchronous = FULL");
  raw.pragma("busy_timeout = 5000");
  return connectionOn(raw);
}

function connectionOn(raw: Database.Database): Connection {
  const prepared = new Map<string, Database.Statement>();
  const statement = (query: Query): { statement: Database.Statement; bindings: readonly unknown[] } => {
    const { sql, bindings } = query.toSQL().toNative();
    const known = prepared.get(sql);
    if (known) return { statement: known, bindings };
    const made = raw.prepare(sql);
    prepared.set(sql, made);
    return { statement: made, bindings };
  };
  const bound = (bindings: readonly unknown[]) => bindings.map((value) => (typeof value === "boolean" ? Number(value) : value));

  return {
    first(query) {
      const { statement: made, bindings } = statement(query);
      return made.get(...bound(bindings)) as never;
    },
    all(query) {
      const { statement: made, bindings } = statement(query);
      return made.all(...bound(bindings)) as never;
    },
    run(query) {
      const { statement: made, bindings } = statement(query);
      return { changes: made.run(...bound(bindings)).changes };
    },
    transaction<T extends { ok: boolean }>(work: () => T): T {
      try {
        return raw
          .transaction(() => {
            const outcome = work();
            if (!outcome.ok) throw new Undo(outcome);
            return outcome;
          })
          .immediate();
      } catch (error) {
        if (error instanceof Undo) return error.outcome as T;
        throw error;
      }
    },
    raw,
    close: () => raw.close(),
  };
}
