import { z } from "zod";
import { findOuting } from "@/lib/outings/outing-store";
import { outingView } from "@/lib/outings/outing-view";
import { personIdOf } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { mayHelp } from "./helper-policy";
import { findHelperRecord, listAnswersBy } from "./helper-store";

/** What a chaperone or leader is asked, soonest first, and what we have noted about them. */
export const listMyRequests = defineQuery({
  input: z.object({}),
  load: (conn, actor, _input, now) => {
    const personId = personIdOf(actor) ?? "";
    const asked = listAnswersBy(conn, personId).map((one) => ({ asked: one, outing: findOuting(conn, { id: one.outingId }, now) }));
    return { asked, record: findHelperRecord(conn, personId) };
  },
  allow: (actor) => mayHelp(actor),
  run: ({ found: { asked, record }, now }) =>
    ok({
      record,
      requests: asked
        .flatMap(({ asked: one, outing }) =>
          outing
            ? [{
                answerId: one.id,
                task: one.task,
                state: one.state,
                outing: outingView(outing, now),
                // Where to meet is for those who come; a maybe reads it once it is a yes.
                meetingText: one.state === "yes" ? outing.meetingText : null,
              }]
            : [],
        )
        .sort((a, b) => a.outing.startsAt.localeCompare(b.outing.startsAt)),
    }),
});
