import { z } from "zod";
import { listModels } from "@/lib/teaching-models/teaching-model-store";
import { timeOf } from "@/lib/shared/dates";
import { typedFromCents } from "@/lib/shared/money";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { outingDay } from "./outing";
import { mayPlanOutings } from "./outing-policy";
import { findOuting, listPolicies, listSites } from "./outing-store";

/** What the form for planning or changing an outing offers, and, for changing one, what it holds now. */
export const showOutingForm = defineQuery({
  input: z.object({ slug: z.string().optional() }),
  load: (conn, _actor, { slug }, now) => {
    const outing = slug === undefined ? undefined : findOuting(conn, { slug }, now);
    if (outing === null) return null;
    return { outing, sites: listSites(conn), policies: listPolicies(conn), models: listModels(conn) };
  },
  allow: (actor) => mayPlanOutings(actor),
  run: ({ found: { outing, sites, policies, models } }) =>
    ok({
      sites: sites.map((site) => ({ id: site.id, name: site.name, meetingPoint: site.meetingPoint })),
      policies,
      models: models.map((model) => ({ id: model.id, title: model.title, concept: model.concept })),
      values: outing && {
        slug: outing.slug,
        edition: String(outing.edition),
        title: outing.title,
        theme: outing.theme,
        summary: outing.summary,
        siteId: outing.site.id,
        day: outingDay(outing),
        startTime: timeOf(outing.startsAt, outing.site.zone),
        endTime: timeOf(outing.endsAt, outing.site.zone),
        seats: String(outing.seats),
        youngestAge: String(outing.youngestAge),
        oldestAge: String(outing.oldestAge),
        suggestedFee: typedFromCents(outing.suggestedFeeCents),
        policyId: outing.policyId,
        meetingText: outing.meetingText,
        modelIds: outing.modelIds,
      },
    }),
});
