import { knex, type Connection } from "@/db/connection";
import { newId } from "@/lib/shared/ids";
import { minutesLater } from "@/lib/shared/dates";
import { retryAfterMinutes, withoutSecrets, type DeliveryView, type Letter, type Message, type MessageKind } from "./message";

type Queued = Message & {
  toAddress: string;
  toPersonId?: string;
  outingId?: string;
  /** A message with the same key is queued once, however often this is asked. */
  onceKey?: string;
};

/** Puts a mail in the outbox, in the caller's transaction: if the caller's work is undone, so is the mail. */
export function queueMessage(conn: Connection, now: string, message: Queued): void {
  conn.run(
    knex("messages")
      .insert({
        id: newId(),
        kind: message.kind,
        facts: JSON.stringify(message.facts),
        to_person_id: message.toPersonId ?? null,
        to_address: message.toAddress,
        outing_id: message.outingId ?? null,
        once_key: message.onceKey ?? null,
        state: "queued",
        attempts: 0,
        next_attempt_at: now,
        last_problem: null,
        subject: null,
        text_body: null,
        created_at: now,
        sent_at: null,
      })
      .onConflict("once_key")
      .ignore(),
  );
}

export type DueMessage = { id: string; toAddress: string; attempts: number; message: Message };

/**
 * Takes the next message that is due and marks it as being sent, so that no other round takes it too.
 * One left in "sending" by a crash is due again after ten minutes.
 */
export function takeDueMessage(conn: Connection, now: string): DueMessage | null {
  const row = conn.first(
    knex("messages")
      .whereIn("state", ["queued", "sending"])
      .where("next_attempt_at", "<=", now)
      .orderBy("next_attempt_at")
      .select("id", "to_address", "attempts", "kind", "facts"),
  );
  if (!row) return null;
  conn.run(
    knex("messages")
      .where({ id: row.id })
      .update({ state: "sending", attempts: row.attempts + 1, next_attempt_at: minutesLater(now, 10) }),
  );
  return {
    id: row.id,
    toAddress: row.to_address,
    attempts: row.attempts + 1,
    message: { kind: row.kind, facts: JSON.parse(row.facts) } as Message,
  };
}

export function noteSent(conn: Connection, id: string, letter: Letter, now: string): void {
  conn.run(
    knex("messages").where({ id }).update({
      state: "sent",
      sent_at: now,
      subject: letter.subject,
      text_body: withoutSecrets(letter.text),
      facts: "{}",
      last_problem: null,
    }),
  );
}

/** Puts it back for a later try, or, after the last one, marks it failed. */
export function noteProblem(conn: Connection, due: DueMessage, problem: string, now: string): void {
  const wait = retryAfterMinutes[due.attempts - 1];
  conn.run(
    knex("messages")
      .where({ id: due.id })
      .update({
        state: wait === undefined ? "failed" : "queued",
        last_problem: problem.slice(0, 500),
        next_attempt_at: minutesLater(now, wait ?? 0),
      }),
  );
}

export function listDeliveries(conn: Connection, filter: { outingId?: string; unsentOnly?: boolean }): DeliveryView[] {
  const query = knex("messages")
    .orderBy("created_at", "desc")
    .limit(200)
    .select(
      "id", "kind", "to_address", "state", "attempts", "last_problem", "subject", "text_body", "created_at", "sent_at",
    );
  if (filter.outingId !== undefined) query.where({ outing_id: filter.outingId });
  if (filter.unsentOnly) query.whereIn("state", ["queued", "sending", "failed"]);
  return conn.all(query).map((row) => ({
    id: row.id,
    kind: row.kind as MessageKind,
    toAddress: row.to_address,
    state: row.state,
    attempts: row.attempts,
    lastProblem: row.last_problem,
    subject: row.subject,
    textBody: row.text_body,
    createdAt: row.created_at,
    sentAt: row.sent_at,
  }));
}

export function countUnsent(conn: Connection): { waiting: number; failed: number } {
  const rows = conn.all(
    knex("messages").whereIn("state", ["queued", "failed"]).where("attempts", ">", 0).select("state").count({ n: "*" }).groupBy("state"),
  );
  const failed = Number(rows.find((row) => row.state === "failed")?.n ?? 0);
  return { failed, waiting: rows.reduce((sum, row) => sum + Number(row.n), 0) - failed };
}

/** Sends a failed or waiting message again, now. */
export function retryMessages(conn: Connection, now: string): number {
  return conn.run(
    knex("messages")
      .where((due) => {
        due.where({ state: "failed" }).orWhere({ state: "queued" });
      })
      .update({ state: "queued", attempts: 0, next_attempt_at: now }),
  ).changes;
}

/** How far the messages with these keys have come; a key nobody queued yet has none. */
export function listStatesByKey(conn: Connection, keys: string[]): DeliveryView["state"][] {
  return conn.all(knex("messages").whereIn("once_key", keys).select("state")).map((row) => row.state);
}

/** What has not gone out yet about an outing is not sent any more, since it is no longer true. */
export function cancelQueued(conn: Connection, outingId: string): void {
  conn.run(knex("messages").where({ outing_id: outingId, state: "queued" }).update({ state: "cancelled" }));
}
