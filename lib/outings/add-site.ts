import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { slugFrom } from "./outing";
import { mayPlanOutings } from "./outing-policy";
import { addSiteSchema } from "./outing-schema";
import { insertSite, listSites } from "./outing-store";

/** Adds a place to go to, with the time zone its clocks show. */
export const addSite = defineCommand({
  input: addSiteSchema,
  load: (conn) => ({ sites: listSites(conn) }),
  allow: (actor) => mayPlanOutings(actor),
  run: ({ conn, input, found: { sites } }) => {
    const slug = slugFrom(input.name);
    if (sites.some((site) => site.slug === slug)) return conflict("already-there", `${input.name} is in the list already.`);
    insertSite(conn, { ...input, slug });
    return ok({ name: input.name });
  },
});
