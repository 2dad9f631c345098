import { describe, expect, it } from "vitest";
import { z } from "zod";
import { knex, type Connection } from "@/db/connection";
import { insertHousehold } from "@/lib/families/household-store";
import { conflict, ok } from "@/lib/shared/outcome";
import { visitor } from "@/lib/shared/actor";
import { defineCommand, defineQuery } from "@/lib/shared/use-case";
import { makeGuardian } from "../../support/actors";
import { ask, makeWorld } from "../../support/world";

const households = (conn: Connection) => conn.all(knex("households").select("id")).length;

/** A command that writes and then ends as it is told to. */
function ending(how: "ok" | "conflict" | "throw") {
  return defineCommand({
    input: z.object({ personId: z.string("Say who.") }),
    load: (_conn, _actor, input) => (input.personId === "" ? null : input),
    allow: (actor) => actor.kind === "person",
    run: ({ conn, now, input }) => {
      insertHousehold(conn, now, input.personId);
      if (how === "throw") throw new Error("a bug");
      return how === "ok" ? ok({}) : conflict("no", "Not after all.");
    },
  });
}

describe("a command", () => {
  it("keeps what it wrote only if its outcome is ok", async () => {
    const world = makeWorld();
    const guardian = makeGuardian(world);
    const before = households(world.conn);
    expect(await ask(world, guardian, ending("conflict"), guardian)).toMatchObject({ refusal: { kind: "conflict" } });
    await expect(ask(world, guardian, ending("throw"), guardian)).rejects.toThrow("a bug");
    expect(households(world.conn)).toBe(before);
    await ask(world, guardian, ending("ok"), guardian);
    expect(households(world.conn)).toBe(before + 1);
    expect(world.conn.raw.inTransaction).toBe(false);
  });

  it("asks its four questions in order: what is meant, is it there, is it allowed, what comes of it", async () => {
    const world = makeWorld();
    const guardian = makeGuardian(world);
    const kindOf = async (actor: typeof guardian | typeof visitor, raw: unknown) => {
      const outcome = await ask(world, actor, ending("ok"), raw);
      return outcome.ok ? "ok" : outcome.refusal.kind;
    };
    expect(await kindOf(visitor, {})).toBe("invalid");
    expect(await kindOf(visitor, { personId: "" })).toBe("not-found");
    expect(await kindOf(visitor, guardian)).toBe("forbidden");
    expect(await kindOf(guardian, guardian)).toBe("ok");
  });

  it("does its slow work before the transaction, so nothing else waits for it", async () => {
    const world = makeWorld();
    const seen: boolean[] = [];
    const slow = defineCommand({
      input: z.object({}),
      prepare: async ({ conn }) => {
        seen.push(conn.raw.inTransaction);
        return "prepared";
      },
      load: (conn) => ({ inside: conn.raw.inTransaction }),
      allow: () => true,
      run: ({ found, prepared }) => ok({ ...found, prepared }),
    });
    expect(await ask(world, visitor, slow, {})).toEqual({ ok: true, value: { inside: true, prepared: "prepared" } });
    expect(seen).toEqual([false]);
  });
});

it("a query opens no transaction", async () => {
  const world = makeWorld();
  const query = defineQuery({ input: z.object({}), load: (conn) => ({ inside: conn.raw.inTransaction }), allow: () => true, run: ({ found }) => ok(found) });
  expect(await ask(world, visitor, query, {})).toEqual({ ok: true, value: { inside: false } });
});
