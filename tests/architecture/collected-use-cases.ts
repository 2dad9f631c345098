import type { Context, AnyUseCase } from "@/lib/shared/use-case";
import type { Outcome } from "@/lib/shared/outcome";
import type { Actor } from "@/lib/shared/actor";
import type { DecidedWorld } from "./decided-world";

const modules = import.meta.glob<Record<string, unknown>>("../../lib/**/*.ts", { eager: true });

function isUseCase(value: unknown): value is AnyUseCase {
  return typeof value === "function" && "kind" in value && (value.kind === "command" || value.kind === "query") && "input" in value;
}

/** Every use case of the program by the name it is exported under. */
export const useCases: ReadonlyMap<string, AnyUseCase> = new Map(
  Object.values(modules)
    .flatMap((module) => Object.entries(module))
    .filter((entry): entry is [string, AnyUseCase] => isUseCase(entry[1])),
);

/** How many exports there are, to notice two use cases of one name. */
export const exportedUseCases = Object.values(modules).flatMap((module) => Object.values(module)).filter(isUseCase);

/** Asks as somebody and undoes whatever came of it, so that one world serves them all. */
export async function askAndUndo(given: DecidedWorld, actor: Actor, useCase: AnyUseCase, input: unknown): Promise<Outcome<unknown>> {
  const { conn, now } = given.world;
  const context: Context = { conn, now, actor };
  conn.raw.exec("begin");
  try {
    return await useCase(context, input);
  } finally {
    conn.raw.exec("rollback");
  }
}
