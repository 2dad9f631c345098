import { z } from "zod";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { findModel } from "./teaching-model-store";

export const showTeachingModel = defineQuery({
  input: z.object({ slug: z.string().min(1).max(80) }),
  load: (conn, _actor, { slug }) => findModel(conn, slug),
  allow: () => true,
  run: ({ found: model }) => ok(model),
});
