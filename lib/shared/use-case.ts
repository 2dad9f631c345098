import type { z } from "zod";
import type { Connection } from "@/db/connection";
import type { Actor } from "./actor";
import { fieldMessages } from "./field-messages";
import { forbidden, invalid, notFound, type Outcome } from "./outcome";

/** What a use case is given by whoever opens the door: the page, the action, the handler, the test. */
export type Context = { conn: Connection; actor: Actor; now: string };

type Given<Found, Input> = Context & { found: Found; input: Input };

type Spec<Schema extends z.ZodType, Found, Prepared, Value> = {
  /** What is asked for. Its messages are read by people. */
  input: Schema;
  /** Slow work that must not sit inside a transaction, such as hashing a password. It may read, never write. */
  prepare?: (given: Context & { input: z.output<Schema> }) => Promise<Prepared>;
  /** What it is about, scoped to who asks; null is answered as not found. */
  load: (conn: Connection, actor: Actor, input: z.output<Schema>, now: string) => Found | null;
  allow: (actor: Actor, found: Found, input: z.output<Schema>) => boolean;
  run: (given: Given<Found, z.output<Schema>> & { prepared: Prepared }) => Outcome<Value>;
};

export type UseCase<Schema extends z.ZodType, Value> = {
  kind: "command" | "query";
  input: Schema;
  (context: Context, raw: unknown): Promise<Outcome<Value>>;
};

export type AnyUseCase = UseCase<z.ZodType, unknown>;

/** Changes something: loads, asks and runs in one IMMEDIATE transaction, kept only if the outcome is ok. */
export function defineCommand<Schema extends z.ZodType, Found, Value, Prepared = undefined>(
  spec: Spec<Schema, Found, Prepared, Value>,
): UseCase<Schema, Value> {
  return makeUseCase("command", spec, (conn, work) => conn.transaction(work));
}

/** Reads something. No transaction, no writing. */
export function defineQuery<Schema extends z.ZodType, Found, Value>(
  spec: Omit<Spec<Schema, Found, undefined, Value>, "prepare">,
): UseCase<Schema, Value> {
  return makeUseCase("query", spec, (_conn, work) => work());
}

function makeUseCase<Schema extends z.ZodType, Found, Prepared, Value>(
  kind: "command" | "query",
  spec: Spec<Schema, Found, Prepared, Value>,
  within: (conn: Connection, work: () => Outcome<Value>) => Outcome<Value>,
): UseCase<Schema, Value> {
  const useCase = async (context: Context, raw: unknown): Promise<Outcome<Value>> => {
    const parsed = spec.input.safeParse(raw);
    if (!parsed.success) return invalid(fieldMessages(parsed.error));
    const input = parsed.data;
    const prepared = (await spec.prepare?.({ ...context, input })) as Prepared;
    return within(context.conn, () => {
      const found = spec.load(context.conn, context.actor, input, context.now);
      if (found === null) return notFound();
      if (!spec.allow(context.actor, found, input)) return forbidden();
      return spec.run({ ...context, found, input, prepared });
    });
  };
  return Object.assign(useCase, { kind, input: spec.input });
}
