import { knex, type Connection } from "@/db/connection";
import type { HelperAnswerRow, HelperRecordRow } from "@/db/tables";
import { newId } from "@/lib/shared/ids";
import type { Answer, HelperAnswer, HelperRecord, Task } from "./helper";

const recordColumns = [
  "person_id", "is_adult", "cleared_until", "guides_left", "guides_right", "pushes_chair", "first_aid", "drives", "updated_at",
] as const;

function recordFrom(row: HelperRecordRow): HelperRecord {
  return {
    personId: row.person_id,
    isAdult: row.is_adult === 1,
    clearedUntil: row.cleared_until,
    guidesLeft: row.guides_left === 1,
    guidesRight: row.guides_right === 1,
    pushesChair: row.pushes_chair === 1,
    firstAid: row.first_aid === 1,
    drives: row.drives === 1,
  };
}

/** An empty record: able to do nothing and cleared for nothing until somebody says so. */
export function insertHelperRecord(conn: Connection, now: string, personId: string): void {
  conn.run(
    knex("helper_records")
      .insert({
        person_id: personId, is_adult: 0, cleared_until: null, guides_left: 0, guides_right: 0, pushes_chair: 0, first_aid: 0, drives: 0, updated_at: now,
      })
      .onConflict("person_id")
      .ignore(),
  );
}

export function findHelperRecord(conn: Connection, personId: string): HelperRecord | null {
  const row = conn.first(knex("helper_records").where({ person_id: personId }).select(...recordColumns));
  return row ? recordFrom(row) : null;
}

export function listHelperRecords(conn: Connection): HelperRecord[] {
  return conn.all(knex("helper_records").select(...recordColumns)).map(recordFrom);
}

export function setAbilities(conn: Connection, now: string, personId: string, can: Omit<HelperRecord, "personId" | "clearedUntil">): void {
  insertHelperRecord(conn, now, personId);
  conn.run(
    knex("helper_records").where({ person_id: personId }).update({
      is_adult: Number(can.isAdult),
      guides_left: Number(can.guidesLeft),
      guides_right: Number(can.guidesRight),
      pushes_chair: Number(can.pushesChair),
      first_aid: Number(can.firstAid),
      drives: Number(can.drives),
      updated_at: now,
    }),
  );
}

export function setClearance(conn: Connection, now: string, personId: string, clearedUntil: string | null): void {
  insertHelperRecord(conn, now, personId);
  conn.run(knex("helper_records").where({ person_id: personId }).update({ cleared_until: clearedUntil, updated_at: now }));
}

type AnswerRow = HelperAnswerRow & { name: string; email: string };

function answersQuery() {
  return knex("helper_answers as a")
    .join("people as p", "p.id", "a.person_id")
    .select("a.id", "a.outing_id", "a.person_id", "a.task", "a.state", "a.asked_at", "a.answered_at", "p.name", "p.email")
    .orderBy("p.name");
}

function answerFrom(conn: Connection, row: AnswerRow): HelperAnswer {
  return {
    id: row.id,
    outingId: row.outing_id,
    personId: row.person_id,
    name: row.name,
    email: row.email,
    task: row.task,
    state: row.state,
    askedAt: row.asked_at,
    answeredAt: row.answered_at,
    record: findHelperRecord(conn, row.person_id),
  };
}

export function listAnswersOf(conn: Connection, outingId: string): HelperAnswer[] {
  return conn.all(answersQuery().where("a.outing_id", outingId)).map((row) => answerFrom(conn, row as AnswerRow));
}

export function listAnswersBy(conn: Connection, personId: string): HelperAnswer[] {
  return conn.all(answersQuery().where("a.person_id", personId)).map((row) => answerFrom(conn, row as AnswerRow));
}

export function findAnswer(conn: Connection, answerId: string): HelperAnswer | null {
  const row = conn.first(answersQuery().where("a.id", answerId));
  return row ? answerFrom(conn, row as AnswerRow) : null;
}

/** Asks somebody once; asking again for another task changes the task, not the answer. */
export function insertAnswer(conn: Connection, now: string, asked: { outingId: string; personId: string; task: Task }): { id: string; isNew: boolean } {
  const before = conn.first(
    knex("helper_answers").where({ outing_id: asked.outingId, person_id: asked.personId }).select("id"),
  );
  if (before) {
    conn.run(knex("helper_answers").where({ id: before.id }).update({ task: asked.task }));
    return { id: before.id, isNew: false };
  }
  const id = newId();
  conn.run(
    knex("helper_answers").insert({
      id, outing_id: asked.outingId, person_id: asked.personId, task: asked.task, state: "asked", asked_at: now, answered_at: null,
    }),
  );
  return { id, isNew: true };
}

export function setAnswer(conn: Connection, now: string, answerId: string, answer: Answer): void {
  conn.run(knex("helper_answers").where({ id: answerId }).update({ state: answer, answered_at: now }));
}

/** Somebody who is not coming has nobody to go with. */
export function unpairHelper(conn: Connection, outingId: string, personId: string): void {
  const ofOuting = knex("registrations").where({ outing_id: outingId }).select("id");
  conn.run(knex("pairings").where({ person_id: personId }).whereIn("registration_id", ofOuting).del());
}
