import { knex, type Connection } from "@/db/connection";
import type { PaymentRow } from "@/db/tables";
import { newId } from "@/lib/shared/ids";

const columns = [
  "id", "registration_id", "kind", "amount_cents", "currency", "state", "checkout_session_id", "checkout_url",
  "payment_intent_id", "created_at", "settled_at",
] as const;

export function findPayment(conn: Connection, where: { id: string } | { checkout_session_id: string }): PaymentRow | null {
  return conn.first(knex("payments").where(where).select(...columns)) ?? null;
}

export function insertPayment(
  conn: Connection,
  now: string,
  payment: { registrationId: string; amountCents: number; currency: string },
): string {
  const id = newId();
  const isFree = payment.amountCents === 0;
  conn.run(
    knex("payments").insert({
      id,
      registration_id: payment.registrationId,
      kind: isFree ? "no-fee" : "checkout",
      amount_cents: payment.amountCents,
      currency: payment.currency,
      state: isFree ? "settled" : "pending",
      checkout_session_id: null,
      checkout_url: null,
      payment_intent_id: null,
      created_at: now,
      settled_at: isFree ? now : null,
    }),
  );
  return id;
}

export function abandonPayment(conn: Connection, paymentId: string): void {
  conn.run(knex("payments").where({ id: paymentId, state: "pending" }).update({ state: "abandoned" }));
}

export function attachSession(conn: Connection, paymentId: string, sessionId: string, url: string): void {
  conn.run(knex("payments").where({ id: paymentId }).update({ checkout_session_id: sessionId, checkout_url: url }));
}

export function settlePayment(conn: Connection, now: string, paymentId: string, paymentIntentId: string | null): void {
  conn.run(
    knex("payments").where({ id: paymentId }).update({ state: "settled", settled_at: now, payment_intent_id: paymentIntentId }),
  );
}

/** Keeps that money came for a payment that no longer counts, so that staff can give it back. */
export function noteExtraPayment(conn: Connection, now: string, paymentId: string, paymentIntentId: string | null): void {
  conn.run(
    knex("payments").where({ id: paymentId }).update({ state: "abandoned", settled_at: now, payment_intent_id: paymentIntentId }),
  );
}

export function hasSettledPayment(conn: Connection, registrationId: string): boolean {
  return conn.first(knex("payments").where({ registration_id: registrationId, state: "settled" }).select("id")) !== undefined;
}

/** False when this event was taken already: a webhook comes once, twice or late. */
export function noteEvent(conn: Connection, now: string, event: { id: string; type: string }): boolean {
  const { changes } = conn.run(
    knex("payment_events").insert({ id: event.id, type: event.type, received_at: now }).onConflict("id").ignore(),
  );
  return changes === 1;
}

export type MoneyToReturn = { paymentId: string; nameUsed: string; amountCents: number; currency: string; why: "withdrawn" | "called off" | "paid without need" };

/** Paid, and nothing for it: a withdrawn seat, an outing called off, or the second of two payments. */
export function listMoneyToReturn(conn: Connection): MoneyToReturn[] {
  const rows = conn.all(
    knex("payments as p")
      .join("registrations as r", "r.id", "p.registration_id")
      .join("participants as c", "c.id", "r.participant_id")
      .join("outings as o", "o.id", "r.outing_id")
      .where({ "p.kind": "checkout" })
      .whereNotNull("p.settled_at")
      .whereIn("p.state", ["settled", "abandoned"])
      .where((either) => {
        either.where("p.state", "abandoned").orWhereIn("r.state", ["withdrawn", "turned away"]).orWhere("o.state", "called off");
      })
      .orderBy("p.settled_at")
      .select("p.id", "c.name_used", "p.amount_cents", "p.currency", "p.state as payment", "o.state as outing"),
  );
  return rows.map((row) => ({
    paymentId: row.id,
    nameUsed: row.name_used,
    amountCents: row.amount_cents,
    currency: row.currency,
    why: row.payment === "abandoned" ? "paid without need" : row.outing === "called off" ? "called off" : "withdrawn",
  }));
}

/** The money was given back at the payment service: the payment no longer buys a seat. */
export function notePaymentReturned(conn: Connection, paymentId: string): void {
  conn.run(knex("payments").where({ id: paymentId }).whereNotNull("settled_at").update({ state: "returned" }));
}
