import type { Connection } from "@/db/connection";
import { findOuting } from "@/lib/outings/outing-store";
import { findMailLink } from "@/lib/people/mail-link-store";
import { personIdOf } from "@/lib/shared/actor";
import { conflict, ok, type Outcome } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import type { Answer, HelperAnswer } from "./helper";
import { mayAnswer } from "./helper-policy";
import { answerByLinkSchema, answerSchema } from "./helper-schema";
import { findAnswer, setAnswer, unpairHelper } from "./helper-store";

/** Yes, maybe or no from the helper's own page. */
export const answerRequest = defineCommand({
  input: answerSchema,
  load: (conn, actor, input) => {
    const asked = findAnswer(conn, input.answerId);
    return asked?.personId === personIdOf(actor) ? asked : null;
  },
  allow: (actor, asked) => mayAnswer(actor, asked),
  run: ({ conn, now, found: asked, input }) => answer(conn, now, asked, input.answer),
});

/** The same from the link in the mail: whoever holds it may answer, as often as they like, until the outing is over. */
export const answerByLink = defineCommand({
  input: answerByLinkSchema,
  load: (conn, _actor, input, now) => {
    const link = findMailLink(conn, input.secret, now);
    const asked = link?.purpose === "answer" && link.aboutId ? findAnswer(conn, link.aboutId) : null;
    return link && asked ? { link, asked } : null;
  },
  allow: (_actor, { link, asked }) => link.purpose === "answer" && link.personId === asked.personId,
  run: ({ conn, now, found: { link, asked }, input }) => {
    if (link.state === "late") return conflict("over", "This outing is over, so its answers are closed. Thank you all the same.");
    return answer(conn, now, asked, input.answer);
  },
});

function answer(conn: Connection, now: string, asked: HelperAnswer, given: Answer): Outcome<{ answer: Answer; title: string }> {
  const outing = findOuting(conn, { id: asked.outingId }, now);
  if (!outing) throw new Error(`answer ${asked.id} has lost its outing`);
  if (outing.state === "called off") return conflict("called-off", "This outing has been called off, so no answer is needed.");
  if (outing.endsAt <= now) return conflict("over", "This outing is over, so its answers are closed. Thank you all the same.");
  setAnswer(conn, now, asked.id, given);
  if (given !== "yes") unpairHelper(conn, outing.id, asked.personId);
  return ok({ answer: given, title: outing.title });
}
