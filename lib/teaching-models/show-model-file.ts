import { z } from "zod";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { modelFiles } from "./teaching-model";
import { findModel } from "./teaching-model-store";

const extensions = { picture: "png", audio: "wav", printable: "stl" } as const;

/** One of a model's three files, by its part in the model. */
export const showModelFile = defineQuery({
  input: z.object({ slug: z.string().min(1).max(80), part: z.enum(modelFiles) }),
  load: (conn, _actor, { slug }) => findModel(conn, slug),
  allow: () => true,
  run: ({ found: model, input: { part } }) => ok({ file: model[part], name: `${model.slug}.${extensions[part]}`, part }),
});
