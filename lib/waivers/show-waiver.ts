import { z } from "zod";
import { dayOf } from "@/lib/shared/dates";
import { env } from "@/lib/shared/env";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { findWaiverInForce } from "./waiver-store";

/** The waiver's text is public: anybody may read it before they have to decide. */
export const showWaiver = defineQuery({
  input: z.object({}),
  load: (conn, _actor, _input, now) => findWaiverInForce(conn, dayOf(now, env().PROGRAMME_ZONE)),
  allow: () => true,
  run: ({ found: text }) => ok(text),
});
