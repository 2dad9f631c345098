import { z } from "zod";
import { outingStates } from "@/lib/outings/outing";
import { listOutingsBetween } from "@/lib/outings/outing-store";
import { outingView } from "@/lib/outings/outing-view";
import { readinessOf, verdictOf } from "@/lib/readiness/readiness";
import { isStaff } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { readinessFacts } from "./show-outing-desk";

/** Every outing for the desk; those to come with the verdict on whether they are ready. */
export const listDesk = defineQuery({
  input: z.object({}),
  load: (conn, actor, _input, now) => ({
    // Judging every outing is work; it is not done for somebody who may not see it.
    outings: (isStaff(actor) ? listOutingsBetween(conn, "0000", "9999", outingStates, now) : []).map((outing) => ({
      outing,
      verdict: outing.endsAt > now && outing.state !== "called off" ? verdictOf(readinessOf(readinessFacts(conn, outing, now))) : null,
    })),
  }),
  allow: (actor) => isStaff(actor),
  run: ({ found: { outings }, now }) => {
    const views = outings.map(({ outing, verdict }) => ({ outing: outingView(outing, now), verdict }));
    return ok({
      toCome: views.filter((one) => one.outing.endsAt > now),
      past: views.filter((one) => one.outing.endsAt <= now).reverse(),
    });
  },
});
