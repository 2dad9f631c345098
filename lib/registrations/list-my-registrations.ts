import { z } from "zod";
import { mayKeepFamily } from "@/lib/families/family-policy";
import { personIdOf } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { listOwnRegistrations } from "./registration-store";
import { registrationView } from "./registration-view";

export const listMyRegistrations = defineQuery({
  input: z.object({}),
  load: (conn, actor, _input, now) => ({ registrations: listOwnRegistrations(conn, personIdOf(actor) ?? "", now) }),
  allow: (actor) => mayKeepFamily(actor),
  run: ({ found: { registrations }, now }) => ok(registrations.map((one) => registrationView(one, now))),
});
