import { cache } from "react";
import { cookies } from "next/headers";
import { actorOf } from "@/lib/people/person-store";
import { visitor, type Actor } from "@/lib/shared/actor";
import type { Context } from "@/lib/shared/use-case";
import { database } from "./database";

/** Who is asking, once a request. */
export const currentActor = cache(async (): Promise<Actor> => {
  const jar = await cookies(); // first: reading it tells the build that this page cannot be made beforehand
  const { conn, sessions } = database();
  const cookie = jar.get(sessions.sessionCookieName)?.value;
  if (!cookie) return visitor;
  const { session, user } = await sessions.validateSession(cookie);
  return (session && user && actorOf(conn, user.id)) ?? visitor;
});

/** What a use case needs, for this request. Reading the cookie also keeps every page with data from being baked in at build. */
export async function currentContext(): Promise<Context> {
  const actor = await currentActor();
  return { conn: database().conn, actor, now: new Date().toISOString() };
}

/** Signs somebody in on this device. Only a server action or route handler may set the cookie. */
export async function startSession(personId: string): Promise<void> {
  const { sessions } = database();
  const session = await sessions.createSession(personId, {});
  const cookie = sessions.createSessionCookie(session.id);
  (await cookies()).set(cookie.name, cookie.value, cookie.attributes);
}

export async function endSession(): Promise<void> {
  const { sessions } = database();
  const jar = await cookies();
  const id = jar.get(sessions.sessionCookieName)?.value;
  if (id) await sessions.invalidateSession(id);
  const blank = sessions.createBlankSessionCookie();
  jar.set(blank.name, blank.value, blank.attributes);
}
