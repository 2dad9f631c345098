import { conflict, invalid, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mayPlanOutings } from "./outing-policy";
import { outingFieldsFrom } from "./plan-outing";
import { changeOutingSchema } from "./outing-schema";
import { findOuting, findPolicy, listSites, setSeatCount, updateOuting } from "./outing-store";

/** Changes an outing, unless somebody else changed it since this form was opened. */
export const changeOuting = defineCommand({
  input: changeOutingSchema,
  load: (conn, _actor, input, now) => {
    const outing = findOuting(conn, { slug: input.slug }, now);
    return outing && { outing, site: listSites(conn).find((site) => site.id === input.siteId), policy: findPolicy(conn, input.policyId) };
  },
  allow: (actor) => mayPlanOutings(actor),
  run: ({ conn, now, input, found: { outing, site, policy } }) => {
    if (!site) return invalid({ siteId: "Choose a site from the list." });
    if (!policy) return invalid({ policyId: "Choose a policy from the list." });
    const fields = outingFieldsFrom(input, site);
    if (fields.startsAt !== outing.startsAt && fields.startsAt <= now) {
      return invalid({ day: "Enter a date that is still to come." });
    }
    if (!updateOuting(conn, now, outing.id, input.edition, fields, input.modelIds)) {
      return conflict(
        "stale-edition",
        "Somebody else changed this outing after you opened it. What you typed is still here: open the outing in another tab, compare, and save again from there.",
      );
    }
    if (input.seats !== outing.seats && !setSeatCount(conn, outing.id, input.seats)) {
      return invalid({ seats: `${outing.seats - outing.seatsFree} seats are taken or held. Enter that many or more.` });
    }
    return ok({ slug: outing.slug });
  },
});
