import { existsSync, mkdirSync, renameSync, writeFileSync } from "node:fs";
import path from "node:path";
import { knex, type Connection } from "@/db/connection";
import { newId, sha256 } from "@/lib/shared/ids";

/** Where a file lies: named by its own hash, so the same bytes are kept once and nobody can swap them unseen. */
export function filePath(folder: string, hash: string): string {
  if (!/^[0-9a-f]{64}$/.test(hash)) throw new Error("not a SHA-256");
  return path.join(folder, hash.slice(0, 2), hash);
}

/** Keeps bytes in the folder outside the web root and their row beside them. Whole or not at all. */
export function storeFile(conn: Connection, now: string, folder: string, file: { bytes: Uint8Array; mediaType: string }): string {
  const hash = sha256(file.bytes);
  const place = filePath(folder, hash);
  if (!existsSync(place)) {
    mkdirSync(path.dirname(place), { recursive: true });
    const unfinished = `${place}.${newId()}`;
    writeFileSync(unfinished, file.bytes);
    renameSync(unfinished, place);
  }
  conn.run(
    knex("files")
      .insert({ sha256: hash, media_type: file.mediaType, bytes: file.bytes.byteLength, stored_at: now })
      .onConflict("sha256")
      .ignore(),
  );
  return hash;
}
