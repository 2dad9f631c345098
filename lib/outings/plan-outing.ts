import { instantAt } from "@/lib/shared/dates";
import { invalid, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import type { z } from "zod";
import type { Site } from "./outing";
import { mayPlanOutings } from "./outing-policy";
import { planOutingSchema, type changeOutingSchema } from "./outing-schema";
import { findOuting, findPolicy, insertOuting, listSites, type OutingFields } from "./outing-store";

/** Makes a draft. The same form sent twice makes one outing. */
export const planOuting = defineCommand({
  input: planOutingSchema,
  load: (conn, _actor, input, now) => ({
    before: findOuting(conn, { request_id: input.requestId }, now),
    site: listSites(conn).find((site) => site.id === input.siteId),
    policy: findPolicy(conn, input.policyId),
  }),
  allow: (actor) => mayPlanOutings(actor),
  run: ({ conn, now, input, found: { before, site, policy } }) => {
    if (before) return ok({ slug: before.slug });
    if (!site) return invalid({ siteId: "Choose a site from the list." });
    if (!policy) return invalid({ policyId: "Choose a policy from the list." });
    const fields = outingFieldsFrom(input, site);
    if (fields.startsAt <= now) return invalid({ day: "Enter a date that is still to come." });
    const { slug } = insertOuting(conn, now, { ...fields, seats: input.seats, requestId: input.requestId, modelIds: input.modelIds });
    return ok({ slug });
  },
});

type Typed = z.output<typeof planOutingSchema> | z.output<typeof changeOutingSchema>;

export function outingFieldsFrom(input: Typed, site: Site): OutingFields {
  return {
    title: input.title,
    theme: input.theme,
    summary: input.summary,
    siteId: site.id,
    policyId: input.policyId,
    startsAt: instantAt(input.day, input.startTime, site.zone),
    endsAt: instantAt(input.day, input.endTime, site.zone),
    youngestAge: input.youngestAge,
    oldestAge: input.oldestAge,
    suggestedFeeCents: input.suggestedFee,
    meetingText: input.meetingText,
  };
}
