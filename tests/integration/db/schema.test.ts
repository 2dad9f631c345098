import { describe, expect, it } from "vitest";
import { knex } from "@/db/connection";
import { insertPayment } from "@/lib/payments/payment-store";
import { makeFamilies, register } from "../../support/registering";
import { makeOuting, makeWorld } from "../../support/world";

async function twoSeats() {
  const world = makeWorld();
  const outing = makeOuting(world, { seats: 2 });
  const [first, second] = makeFamilies(world, 2);
  if (!first || !second) throw new Error("two families were asked for");
  const one = await register(world, first, outing.slug);
  const other = await register(world, second, outing.slug);
  return { conn: world.conn, world, outing, one: one.registrationId, other: other.registrationId };
}

describe("what the database itself makes impossible", () => {
  it("one child on two seats", async () => {
    const { conn, outing, one, other } = await twoSeats();
    conn.run(knex("seats").where({ registration_id: other }).update({ registration_id: null }));
    const again = knex("seats").where({ outing_id: outing.id, number: 2 }).update({ registration_id: one });
    expect(() => conn.run(again)).toThrow(/UNIQUE/);
  });

  it("two live registrations of one child for one outing", async () => {
    const { conn, one } = await twoSeats();
    const row = conn.first(knex("registrations").where({ id: one }).select("outing_id", "participant_id", "registered_by", "created_at", "updated_at"));
    if (!row) throw new Error("the registration is gone");
    expect(() => conn.run(knex("registrations").insert({ ...row, id: "twin", state: "confirmed" }))).toThrow(/UNIQUE/);
  });

  it("a held seat without an end, or a place in the queue without a moment", async () => {
    const { conn, one } = await twoSeats();
    expect(() => conn.run(knex("registrations").where({ id: one }).update({ hold_ends_at: null }))).toThrow(/CHECK/);
    expect(() => conn.run(knex("registrations").where({ id: one }).update({ state: "waiting", hold_ends_at: null }))).toThrow(/CHECK/);
  });

  it("two settled or two open payments for one registration, or a no-fee place that costs something", async () => {
    const { conn, world, one } = await twoSeats();
    insertPayment(conn, world.now, { registrationId: one, amountCents: 0, currency: "usd" });
    expect(() => insertPayment(conn, world.now, { registrationId: one, amountCents: 0, currency: "usd" })).toThrow(/UNIQUE/);
    insertPayment(conn, world.now, { registrationId: one, amountCents: 500, currency: "usd" });
    expect(() => insertPayment(conn, world.now, { registrationId: one, amountCents: 700, currency: "usd" })).toThrow(/UNIQUE/);
    expect(() => conn.run(knex("payments").where({ kind: "no-fee" }).update({ amount_cents: 5 }))).toThrow(/CHECK/);
  });

  it("a registration of nobody, or for no outing", async () => {
    const { conn, one } = await twoSeats();
    expect(() => conn.run(knex("registrations").where({ id: one }).update({ participant_id: "nobody" }))).toThrow(/FOREIGN KEY/);
  });

  it("a state nobody has decided on", async () => {
    const { conn, outing } = await twoSeats();
    const dreamt = knex("outings").where({ id: outing.id }).update({ state: knex.raw("'dreamt'") });
    expect(() => conn.run(dreamt)).toThrow(/CHECK/);
  });
});

it("the connection writes ahead, keeps foreign keys and waits for a lock", () => {
  const { conn } = makeWorld();
  expect(conn.raw.pragma("journal_mode", { simple: true })).toBe("wal");
  expect(conn.raw.pragma("foreign_keys", { simple: true })).toBe(1);
  expect(conn.raw.pragma("busy_timeout", { simple: true })).toBe(5000);
});
