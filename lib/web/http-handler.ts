import type { NextRequest } from "next/server";
import type { z } from "zod";
import type { Refusal } from "@/lib/shared/outcome";
import { isSignedIn, payments, type Actor } from "@/lib/shared/actor";
import type { Context, UseCase } from "@/lib/shared/use-case";
import { database } from "./database";
import { currentContext } from "./session";

type Params = Record<string, string | string[] | undefined>;
type Handler = (request: NextRequest, route: { params: Promise<Params> }) => Promise<Response>;

type Options<Value> = {
  read: (request: NextRequest, params: Params) => unknown;
  respond?: (value: Value, request: NextRequest, context: Context) => Response | Promise<Response>;
};

/** A use case as a route handler: JSON unless `respond` says otherwise, refusals as application/problem+json (RFC 9457). */
export function httpHandler<Schema extends z.ZodType, Value>(useCase: UseCase<Schema, Value>, options: Options<Value>): Handler {
  return async (request, route) => {
    const context = await currentContext();
    const outcome = await useCase(context, options.read(request, await route.params));
    if (!outcome.ok) return signInFirst(request, context, outcome.refusal) ?? problemResponse(outcome.refusal);
    return options.respond ? options.respond(outcome.value, request, context) : Response.json(outcome.value);
  };
}

/** A person who opens a private document while signed out is sent to sign in; a program gets its answer. */
function signInFirst(request: NextRequest, { actor }: Context, { kind }: Refusal): Response | null {
  const isPerson = request.headers.get("accept")?.includes("text/html") ?? false;
  if (!isPerson || isSignedIn(actor) || kind === "invalid" || kind === "conflict") return null;
  const back = encodeURIComponent(request.nextUrl.pathname + request.nextUrl.search);
  return new Response(null, { status: 303, headers: { location: `/sign-in?back=${back}` } });
}

/**
 * A route whose caller proves itself by a signature over the body instead of a session.
 * `verify` answers what the use case is asked, a response of its own, or null for nothing to do.
 */
export function signedHandler<Schema extends z.ZodType, Value>(
  useCase: UseCase<Schema, Value>,
  verify: (request: NextRequest) => Promise<z.input<Schema> | Response | null>,
  done?: () => void,
): (request: NextRequest) => Promise<Response> {
  return async (request) => {
    const verified = await verify(request);
    if (verified instanceof Response) return verified;
    if (verified === null) return Response.json({ received: true });
    const outcome = await useCase(systemContext(payments), verified);
    if (!outcome.ok) return problemResponse(outcome.refusal);
    done?.();
    return Response.json({ received: true });
  };
}

/** The program asking itself, after a signature or the clock has spoken for it. */
export function systemContext(actor: Actor): Context {
  return { conn: database().conn, actor, now: new Date().toISOString() };
}

const statusOf = { invalid: 400, "not-found": 404, forbidden: 403, conflict: 409 } as const;

export function problemResponse(refusal: Refusal): Response {
  const status = statusOf[refusal.kind];
  const details = refusal.kind === "invalid" ? { fields: refusal.fields } : refusal.kind === "conflict" ? { code: refusal.code } : {};
  return Response.json(
    { type: "about:blank", title: refusal.kind, status, detail: refusal.sentence, ...details },
    { status, headers: { "content-type": "application/problem+json" } },
  );
}
