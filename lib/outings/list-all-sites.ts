import { z } from "zod";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { mayPlanOutings } from "./outing-policy";
import { listSites } from "./outing-store";

export const listAllSites = defineQuery({
  input: z.object({}),
  load: (conn) => ({ sites: listSites(conn) }),
  allow: (actor) => mayPlanOutings(actor),
  run: ({ found: { sites } }) => ok(sites),
});
