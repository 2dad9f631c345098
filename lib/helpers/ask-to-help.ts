import { publicOutingFacts } from "@/lib/outings/outing-facts";
import { findOuting } from "@/lib/outings/outing-store";
import { queueMessage } from "@/lib/messages/message-store";
import { makeMailLink } from "@/lib/people/mail-link-store";
import { findPerson } from "@/lib/people/person-store";
import { isSignedIn } from "@/lib/shared/actor";
import { publicAddress } from "@/lib/shared/addresses";
import { minutesLater } from "@/lib/shared/dates";
import { conflict, invalid, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mayAskHelpers } from "./helper-policy";
import { askToHelpSchema } from "./helper-schema";
import { insertAnswer } from "./helper-store";

/** Long enough for an outing that is put off; whether an answer is still wanted is judged by the outing itself. */
const answerLinkDays = 180;

/** Asks chaperones or a leader to an outing by mail, with a link that answers without signing in. */
export const askToHelp = defineCommand({
  input: askToHelpSchema,
  load: (conn, _actor, input, now) => {
    const outing = findOuting(conn, { slug: input.slug }, now);
    return outing && { outing, people: input.personIds.map((id) => findPerson(conn, id)) };
  },
  allow: (actor) => mayAskHelpers(actor),
  run: ({ conn, now, actor, input, found: { outing, people } }) => {
    if (outing.state === "called off" || outing.endsAt <= now) {
      return conflict("over", "This outing takes no helpers now: it is over or called off.");
    }
    let asked = 0;
    for (const person of people) {
      if (!person?.roles.includes(input.task === "leader" ? "leader" : "chaperone")) {
        return invalid({ personIds: `${person?.name ?? "Somebody chosen"} is not invited as a ${input.task} yet. Invite them under People first.` });
      }
      const answer = insertAnswer(conn, now, { outingId: outing.id, personId: person.id, task: input.task });
      if (!answer.isNew) continue;
      const secret = makeMailLink(conn, { purpose: "answer", personId: person.id, aboutId: answer.id, madeAt: now, expiresAt: minutesLater(outing.endsAt, answerLinkDays * 24 * 60) });
      queueMessage(conn, now, {
        kind: "asked-to-help",
        facts: {
          name: person.name,
          outing: publicOutingFacts(outing),
          task: input.task,
          from: isSignedIn(actor) ? actor.name : "",
          link: publicAddress(`/link/${secret}`),
        },
        toAddress: person.email,
        toPersonId: person.id,
        outingId: outing.id,
      });
      asked += 1;
    }
    return ok({ asked });
  },
});
