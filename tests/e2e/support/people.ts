import { randomBytes } from "node:crypto";
import { openConnection, type Connection } from "@/db/connection";
import { insertHousehold } from "@/lib/families/household-store";
import { insertHelperRecord } from "@/lib/helpers/helper-store";
import { createLucia } from "@/lib/people/lucia";
import { actorOf, confirmEmail, findPersonByEmail, giveRole, insertPerson } from "@/lib/people/person-store";
import type { Role, SignedIn } from "@/lib/shared/actor";
import type { Context } from "@/lib/shared/use-case";
import { accountOf, place, type Ground } from "./place";

const connections = new Map<string, Connection>();

/** The running program's own database, beside it: what a test prepares goes through the same commands. */
export function databaseOf({ databaseFile }: Ground = place()): Connection {
  const conn = connections.get(databaseFile) ?? openConnection(databaseFile);
  connections.set(databaseFile, conn);
  return conn;
}

export function contextOf(actor: SignedIn, ground: Ground = place()): Context {
  return { conn: databaseOf(ground), actor, now: new Date().toISOString() };
}

/** The demo world's account of a role. */
export function demoPerson(role: Role, ground: Ground = place()): SignedIn {
  const conn = databaseOf(ground);
  const person = findPersonByEmail(conn, accountOf(role).email);
  return known(person && actorOf(conn, person.id), role);
}

/** Somebody of this test's own, with an address nobody else has. */
export function somebody(name: string, role: Role, ground: Ground = place()): SignedIn {
  const conn = databaseOf(ground);
  const now = new Date().toISOString();
  const id = insertPerson(conn, now, { name, email: freshAddress(role) });
  confirmEmail(conn, id, now);
  giveRole(conn, id, role);
  if (role === "guardian") insertHousehold(conn, now, id);
  if (role === "chaperone" || role === "leader") insertHelperRecord(conn, now, id);
  return known(actorOf(conn, id), name);
}

export function freshAddress(who: string): string {
  return `${who}.${randomBytes(5).toString("hex")}@saltgrass.example`;
}

/** Signs somebody in without the form, as the form would. */
export async function sessionCookie(who: SignedIn, ground: Ground) {
  const sessions = createLucia(databaseOf(ground), false);
  const { id } = await sessions.createSession(who.personId, {});
  const { name, value } = sessions.createSessionCookie(id);
  return { name, value, url: ground.app };
}

function known(person: SignedIn | null | undefined, what: string): SignedIn {
  if (!person) throw new Error(`there is no account for ${what}`);
  return person;
}
