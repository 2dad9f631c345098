import { headers } from "next/headers";
import { notFound, redirect } from "next/navigation";
import type { z } from "zod";
import { isSignedIn } from "@/lib/shared/actor";
import type { UseCase } from "@/lib/shared/use-case";
import { currentContext } from "./session";

/**
 * Asks a query from a page. What is not there, or not for this account, is not found;
 * a visitor who is not allowed is sent to sign in and comes back.
 */
export async function ask<Schema extends z.ZodType, Value>(query: UseCase<Schema, Value>, input: z.input<Schema>): Promise<Value> {
  const context = await currentContext();
  const outcome = await query(context, input);
  if (outcome.ok) return outcome.value;
  const { kind } = outcome.refusal;
  if (kind !== "invalid" && !isSignedIn(context.actor)) {
    const back = (await headers()).get("x-dunlin-path");
    if (kind === "forbidden" || isForMembers(back)) redirect(`/sign-in?back=${encodeURIComponent(back ?? "/")}`);
  }
  notFound();
}

function isForMembers(path: string | null): boolean {
  return path !== null && /^\/(family|helping|desk|field|account)(\/|$)|\/register$/.test(path);
}
