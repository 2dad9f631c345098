import { z } from "zod";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";

/** Up, and the database answers. */
export const checkHealth = defineQuery({
  input: z.object({}),
  load: (conn) => ({ answer: conn.raw.prepare("select 1 as one").get() }),
  allow: () => true,
  run: () => ok({ status: "ok" }),
});
