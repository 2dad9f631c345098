import { z } from "zod";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { listModels } from "./teaching-model-store";

/** The public catalogue; with ids, only those, as an outing's page lists them. */
export const listTeachingModels = defineQuery({
  input: z.object({ ids: z.array(z.string()).optional() }),
  load: (conn) => ({ models: listModels(conn) }),
  allow: () => true,
  run: ({ found: { models }, input: { ids } }) =>
    ok(
      models
        .filter((model) => ids === undefined || ids.includes(model.id))
        .map(({ id, slug, title, concept, facts }) => ({ id, slug, title, concept, forWhom: facts.forWhom, pictureAlt: facts.pictureAlt })),
    ),
});
