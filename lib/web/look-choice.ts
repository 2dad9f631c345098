import { z } from "zod";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { textSizes, themes } from "./look";

/** Text size and colours are the device's own affair: nothing is stored but a cookie. */
export const chooseLook = defineQuery({
  input: z.object({ theme: z.enum(themes, "Choose colours."), text: z.enum(textSizes, "Choose a text size."), back: z.string().optional() }),
  load: () => ({}),
  allow: () => true,
  run: ({ input }) => ok(input),
});
