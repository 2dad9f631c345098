import type { Connection } from "@/db/connection";
import { gatherCover } from "@/lib/cover-board/gather-cover";
import { checkCover } from "@/lib/cover/check-cover";
import { listStatesByKey } from "@/lib/messages/message-store";
import type { Outing } from "@/lib/outings/outing";
import { meetingPointKey } from "@/lib/outings/outing-facts";
import { slugSchema } from "@/lib/outings/outing-schema";
import { findOuting } from "@/lib/outings/outing-store";
import { outingView } from "@/lib/outings/outing-view";
import { readinessOf, verdictOf, type ReadinessFacts } from "@/lib/readiness/readiness";
import { listRegistrationsOf } from "@/lib/registrations/registration-store";
import { gatherRoster } from "@/lib/roster/gather-roster";
import { listPapersOf, rosterHash } from "@/lib/roster/paper-store";
import { isStaff } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";

/** An outing at the desk: whether it is ready, and what each thing waits for. */
export const showOutingDesk = defineQuery({
  input: slugSchema,
  load: (conn, _actor, { slug }, now) => {
    const outing = findOuting(conn, { slug }, now);
    return outing && { outing, facts: readinessFacts(conn, outing, now) };
  },
  allow: (actor) => isStaff(actor),
  run: ({ found: { outing, facts }, now }) => {
    const items = readinessOf(facts);
    return ok({ outing: outingView(outing, now), meetingText: outing.meetingText, items, verdict: verdictOf(items), facts });
  },
});

export function readinessFacts(conn: Connection, outing: Outing, now: string): ReadinessFacts {
  const registrations = listRegistrationsOf(conn, outing.id, ["confirmed", "held", "waiting"], now);
  const { input, answers } = gatherCover(conn, outing, now);
  const coming = answers.filter((one) => one.state === "yes");
  const count = (state: string) => registrations.filter((one) => one.state === state).length;
  return {
    outingState: outing.state,
    confirmed: count("confirmed"),
    held: count("held"),
    waiting: count("waiting"),
    cover: checkCover(input),
    helpers: {
      yes: coming.length,
      maybe: answers.filter((one) => one.state === "maybe").length,
      asked: answers.filter((one) => one.state === "asked").length,
      leaders: coming.filter((one) => one.task === "leader").length,
    },
    roster: rosterState(conn, outing, now),
    meetingPointMails: mailCounts(conn, outing, coming.map((one) => one.personId)),
  };
}

function rosterState(conn: Connection, outing: Outing, now: string): ReadinessFacts["roster"] {
  const [newest] = listPapersOf(conn, outing.id);
  if (!newest) return "none";
  return newest.factsSha256 === rosterHash(gatherRoster(conn, outing, now)) ? "current" : "outdated";
}

function mailCounts(conn: Connection, outing: Outing, personIds: string[]): ReadinessFacts["meetingPointMails"] {
  const states = listStatesByKey(conn, personIds.map((id) => meetingPointKey(outing, id)));
  const sent = states.filter((state) => state === "sent").length;
  return { wanted: personIds.length, sent, unsent: states.length - sent };
}
