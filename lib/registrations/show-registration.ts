import { personIdOf } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { mayChangeRegistration } from "./registration-policy";
import { registrationIdSchema } from "./registration-schema";
import { findOwnRegistration } from "./registration-store";
import { registrationView } from "./registration-view";

export const showRegistration = defineQuery({
  input: registrationIdSchema,
  load: (conn, actor, input, now) => findOwnRegistration(conn, personIdOf(actor) ?? "", input.registrationId, now),
  allow: (actor, registration) => mayChangeRegistration(actor, registration),
  run: ({ found: registration, now }) => ok(registrationView(registration, now)),
});
