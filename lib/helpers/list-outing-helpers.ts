import { findOuting } from "@/lib/outings/outing-store";
import { slugSchema } from "@/lib/outings/outing-schema";
import { outingDay } from "@/lib/outings/outing";
import { listPeopleWithRoles } from "@/lib/people/person-store";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { abilitiesInWords, isClearedOn } from "./helper";
import { mayAskHelpers } from "./helper-policy";
import { findHelperRecord, listAnswersOf } from "./helper-store";

/** Who was asked and what they said, and who could still be asked. */
export const listOutingHelpers = defineQuery({
  input: slugSchema,
  load: (conn, _actor, { slug }, now) => {
    const outing = findOuting(conn, { slug }, now);
    if (!outing) return null;
    const answers = listAnswersOf(conn, outing.id);
    const others = listPeopleWithRoles(conn)
      .filter((person) => person.roles.includes("chaperone") || person.roles.includes("leader"))
      .filter((person) => !answers.some((answer) => answer.personId === person.id))
      .map((person) => ({ person, record: findHelperRecord(conn, person.id) }));
    return { outing, answers, others };
  },
  allow: (actor) => mayAskHelpers(actor),
  run: ({ found: { outing, answers, others } }) => {
    const day = outingDay(outing);
    return ok({
      answers: answers.map((one) => ({
        id: one.id,
        personId: one.personId,
        name: one.name,
        task: one.task,
        state: one.state,
        abilities: abilitiesInWords(one.record),
        clearedThatDay: isClearedOn(one.record, day),
        clearedUntil: one.record?.clearedUntil ?? null,
      })),
      others: others.map(({ person, record }) => ({
        personId: person.id,
        name: person.name,
        roles: person.roles,
        abilities: abilitiesInWords(record),
        clearedThatDay: isClearedOn(record, day),
        clearedUntil: record?.clearedUntil ?? null,
      })),
    });
  },
});
