import { knex, type Connection } from "@/db/connection";
import type { MailLinkRow } from "@/db/tables";
import { newSecret, sha256 } from "@/lib/shared/ids";

/** What a confirmation brings into being when it is followed: nothing of it holds before. */
export type Carried = { name: string; passwordHash: string; back: string };

export type MailLink = {
  purpose: MailLinkRow["purpose"];
  personId: string;
  aboutId: string | null;
  carries: Carried | null;
  state: "good" | "used" | "late";
};

/** Makes a link's secret; only its hash is kept, so the database opens nothing but what still waits in the outbox. */
export function makeMailLink(
  conn: Connection,
  link: { purpose: MailLinkRow["purpose"]; personId: string; aboutId?: string; carries?: Carried; madeAt: string; expiresAt: string },
): string {
  const secret = newSecret();
  conn.run(
    knex("mail_links").insert({
      secret_hash: sha256(secret),
      purpose: link.purpose,
      person_id: link.personId,
      about_id: link.aboutId ?? null,
      carries: link.carries ? JSON.stringify(link.carries) : null,
      made_at: link.madeAt,
      expires_at: link.expiresAt,
      used_at: null,
    }),
  );
  return secret;
}

export function findMailLink(conn: Connection, secret: string, now: string): MailLink | null {
  const row = conn.first(
    knex("mail_links")
      .where({ secret_hash: sha256(secret) })
      .select("purpose", "person_id", "about_id", "carries", "expires_at", "used_at"),
  );
  if (!row) return null;
  const state = row.used_at !== null ? "used" : row.expires_at <= now ? "late" : "good";
  return { purpose: row.purpose, personId: row.person_id, aboutId: row.about_id, carries: row.carries ? (JSON.parse(row.carries) as Carried) : null, state };
}

export function spendMailLink(conn: Connection, secret: string, now: string): void {
  conn.run(knex("mail_links").where({ secret_hash: sha256(secret) }).whereNull("used_at").update({ used_at: now, carries: null }));
}

/** How many links of a purpose were made for somebody since an instant. */
export function countLinksMade(conn: Connection, personId: string, purpose: MailLinkRow["purpose"], since: string): number {
  const row = conn.first(
    knex("mail_links").where({ person_id: personId, purpose }).where("made_at", ">", since).count({ n: "*" }),
  );
  return Number(row?.n ?? 0);
}

/** Makes every unused link of a purpose useless, before a newer one is sent. */
export function spendOlderLinks(conn: Connection, personId: string, purpose: MailLinkRow["purpose"], now: string): void {
  conn.run(knex("mail_links").where({ person_id: personId, purpose }).whereNull("used_at").update({ used_at: now, carries: null }));
}
