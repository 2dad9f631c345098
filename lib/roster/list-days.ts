import { z } from "zod";
import { listAnswersBy } from "@/lib/helpers/helper-store";
import { findOuting } from "@/lib/outings/outing-store";
import { outingView } from "@/lib/outings/outing-view";
import { hasRole, personIdOf } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";

/** The days somebody leads, soonest first, until three days after each. */
export const listDays = defineQuery({
  input: z.object({}),
  load: (conn, actor, _input, now) => ({
    outings: listAnswersBy(conn, personIdOf(actor) ?? "")
      .filter((one) => one.task === "leader" && one.state === "yes")
      .flatMap((one) => findOuting(conn, { id: one.outingId }, now) ?? []),
  }),
  allow: (actor) => hasRole(actor, "leader"),
  run: ({ found: { outings }, now }) => {
    const since = new Date(Date.parse(now) - 3 * 86_400_000).toISOString();
    return ok(
      outings
        .filter((outing) => outing.endsAt >= since)
        .sort((a, b) => a.startsAt.localeCompare(b.startsAt))
        .map((outing) => outingView(outing, now)),
    );
  },
});
