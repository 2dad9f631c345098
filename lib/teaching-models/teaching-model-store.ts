import { knex, type Connection } from "@/db/connection";
import type { TeachingModelRow } from "@/db/tables";
import { newId } from "@/lib/shared/ids";
import type { StoredFile, TeachingModel, TeachingModelFacts } from "./teaching-model";

const columns = ["id", "slug", "title", "concept", "facts", "picture_sha256", "audio_sha256", "printable_sha256", "position"] as const;

function modelFrom(conn: Connection, row: TeachingModelRow): TeachingModel {
  return {
    id: row.id,
    slug: row.slug,
    title: row.title,
    concept: row.concept,
    facts: JSON.parse(row.facts) as TeachingModelFacts,
    picture: fileFrom(conn, row.picture_sha256),
    audio: fileFrom(conn, row.audio_sha256),
    printable: fileFrom(conn, row.printable_sha256),
  };
}

function fileFrom(conn: Connection, sha256: string): StoredFile {
  const row = conn.first(knex("files").where({ sha256 }).select("bytes", "media_type"));
  return { sha256, bytes: row?.bytes ?? 0, mediaType: row?.media_type ?? "application/octet-stream" };
}

export function listModels(conn: Connection): TeachingModel[] {
  return conn.all(knex("teaching_models").orderBy("position").select(...columns)).map((row) => modelFrom(conn, row));
}

export function findModel(conn: Connection, slug: string): TeachingModel | null {
  const row = conn.first(knex("teaching_models").where({ slug }).select(...columns));
  return row ? modelFrom(conn, row) : null;
}

export function insertModel(
  conn: Connection,
  model: { slug: string; title: string; concept: string; facts: TeachingModelFacts; pictureSha256: string; audioSha256: string; printableSha256: string; position: number },
): string {
  const id = newId();
  conn.run(
    knex("teaching_models").insert({
      id,
      slug: model.slug,
      title: model.title,
      concept: model.concept,
      facts: JSON.stringify(model.facts),
      picture_sha256: model.pictureSha256,
      audio_sha256: model.audioSha256,
      printable_sha256: model.printableSha256,
      position: model.position,
    }),
  );
  return id;
}
