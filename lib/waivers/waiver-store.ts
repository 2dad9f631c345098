import { knex, type Connection } from "@/db/connection";
import { newId, sha256 } from "@/lib/shared/ids";
import type { WaiverText } from "./waiver-text";

/** The text in force on a day: the newest whose first day has come. */
export function findWaiverInForce(conn: Connection, day: string): WaiverText | null {
  return (
    conn.first(
      knex("waiver_texts").where("in_force_from", "<=", day).orderBy("version", "desc").select("id", "version", "title", "body", "sha256"),
    ) ?? null
  );
}

export function insertWaiverText(conn: Connection, text: { version: number; title: string; body: string; inForceFrom: string }): void {
  conn.run(
    knex("waiver_texts").insert({
      id: newId(),
      version: text.version,
      title: text.title,
      body: text.body,
      sha256: waiverHash(text),
      in_force_from: text.inForceFrom,
    }),
  );
}

/** SHA-256 of the title, a line feed and the body, as UTF-8: what somebody signed can be proved letter by letter. */
export function waiverHash(text: { title: string; body: string }): string {
  return sha256(`${text.title}\n${text.body}`);
}

export function insertSignature(
  conn: Connection,
  now: string,
  signature: { registrationId: string; text: WaiverText; signedBy: string; typedName: string; typedDate: string },
): void {
  conn.run(
    knex("signatures").insert({
      id: newId(),
      registration_id: signature.registrationId,
      waiver_text_id: signature.text.id,
      text_sha256: signature.text.sha256,
      signed_by: signature.signedBy,
      typed_name: signature.typedName,
      typed_date: signature.typedDate,
      signed_at: now,
    }),
  );
}
