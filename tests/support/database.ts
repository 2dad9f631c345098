import { copyFileSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { inject, onTestFinished } from "vitest";
import { openConnection, type Connection } from "@/db/connection";

/** A real, migrated, empty database of this test's own, gone when the test is. */
export function openTestDatabase(): Connection {
  const { conn, remove } = openDatabaseCopy();
  onTestFinished(remove);
  return conn;
}

/** The same for tests that share one over a whole file: whoever opens it removes it. */
export function openDatabaseCopy(): { conn: Connection; remove: () => void } {
  const folder = mkdtempSync(path.join(tmpdir(), "dunlin-test-"));
  const file = path.join(folder, "dunlin.sqlite");
  copyFileSync(inject("templateDatabase"), file);
  const conn = openConnection(file);
  conn.raw.pragma("synchronous = OFF"); // a test that is cut off has nothing to keep
  const remove = () => {
    conn.close();
    rmSync(folder, { recursive: true, force: true });
  };
  return { conn, remove };
}
