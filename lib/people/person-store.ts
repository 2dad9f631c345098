import { knex, type Connection } from "@/db/connection";
import type { PersonRow } from "@/db/tables";
import type { Role, SignedIn } from "@/lib/shared/actor";
import { newId } from "@/lib/shared/ids";
import type { Person, ReadingFormat } from "./person";

const columns = [
  "id",
  "email",
  "name",
  "phone",
  "password_hash",
  "email_confirmed_at",
  "reading_format",
  "text_size_pt",
  "created_at",
] as const;

function personFrom(row: PersonRow, roles: Role[]): Person {
  return {
    id: row.id,
    email: row.email,
    name: row.name,
    phone: row.phone,
    roles,
    emailConfirmed: row.email_confirmed_at !== null,
    hasPassword: row.password_hash !== null,
    readingFormat: row.reading_format as ReadingFormat,
    textSizePt: row.text_size_pt,
  };
}

function rolesOf(conn: Connection, personId: string): Role[] {
  return conn.all(knex("person_roles").where({ person_id: personId }).select("role").orderBy("role")).map((row) => row.role);
}

export function findPerson(conn: Connection, personId: string): Person | null {
  const row = conn.first(knex("people").where({ id: personId }).select(...columns));
  return row ? personFrom(row, rolesOf(conn, row.id)) : null;
}

export function findPersonByEmail(conn: Connection, email: string): Person | null {
  const row = conn.first(knex("people").where({ email }).select(...columns));
  return row ? personFrom(row, rolesOf(conn, row.id)) : null;
}

export function findPasswordHash(conn: Connection, email: string): string | null {
  return conn.first(knex("people").where({ email }).select("password_hash"))?.password_hash ?? null;
}

export function actorOf(conn: Connection, personId: string): SignedIn | null {
  const person = findPerson(conn, personId);
  return person && { kind: "person", personId: person.id, name: person.name, email: person.email, roles: person.roles };
}

export function insertPerson(
  conn: Connection,
  now: string,
  facts: { email: string; name: string; phone?: string | null; passwordHash?: string | null },
): string {
  const id = newId();
  conn.run(
    knex("people").insert({
      id,
      email: facts.email,
      name: facts.name,
      phone: facts.phone ?? null,
      password_hash: facts.passwordHash ?? null,
      email_confirmed_at: null,
      reading_format: "print",
      text_size_pt: 18,
      created_at: now,
    }),
  );
  return id;
}

export function giveRole(conn: Connection, personId: string, role: Role): void {
  conn.run(knex("person_roles").insert({ person_id: personId, role }).onConflict(["person_id", "role"]).ignore());
}

export function takeRole(conn: Connection, personId: string, role: Role): void {
  conn.run(knex("person_roles").where({ person_id: personId, role }).del());
}

export function endSessionsOf(conn: Connection, personId: string): void {
  conn.run(knex("sessions").where({ user_id: personId }).del());
}

export function confirmEmail(conn: Connection, personId: string, now: string): void {
  conn.run(knex("people").where({ id: personId }).whereNull("email_confirmed_at").update({ email_confirmed_at: now }));
}

export function setNameAndPassword(conn: Connection, personId: string, name: string, passwordHash: string): void {
  conn.run(knex("people").where({ id: personId }).update({ name, password_hash: passwordHash }));
}

export function setReading(conn: Connection, personId: string, format: ReadingFormat, textSizePt: number): void {
  conn.run(knex("people").where({ id: personId }).update({ reading_format: format, text_size_pt: textSizePt }));
}

export function listPeopleWithRoles(conn: Connection): Person[] {
  const rows = conn.all(knex("people").select(...columns).orderBy("name"));
  const roles = conn.all(knex("person_roles").select("person_id", "role").orderBy("role"));
  return rows.map((row) => personFrom(row, roles.filter((r) => r.person_id === row.id).map((r) => r.role)));
}

export function noteSignInAttempt(conn: Connection, email: string, now: string): void {
  conn.run(knex("sign_in_attempts").insert({ email, at: now }));
}

export function countSignInAttempts(conn: Connection, email: string, since: string): number {
  const row = conn.first(knex("sign_in_attempts").where({ email }).where("at", ">", since).count({ n: "*" }));
  return Number(row?.n ?? 0);
}

export function forgetOldSignInAttempts(conn: Connection, before: string): void {
  conn.run(knex("sign_in_attempts").where("at", "<", before).del());
}

export function forgetSignInAttempts(conn: Connection, email: string): void {
  conn.run(knex("sign_in_attempts").where({ email }).del());
}
