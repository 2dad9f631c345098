import { z } from "zod";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";

/** Anybody may leave, signed in or not; the door then ends the session of this device. */
export const signOut = defineQuery({
  input: z.object({}),
  load: () => ({}),
  allow: () => true,
  run: () => ok({}),
});
