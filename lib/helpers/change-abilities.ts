import { isSignedIn } from "@/lib/shared/actor";
import { forbidden, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { mayHelp } from "./helper-policy";
import { abilitiesSchema } from "./helper-schema";
import { setAbilities } from "./helper-store";

/** A helper says what they can do. */
export const changeAbilities = defineCommand({
  input: abilitiesSchema,
  load: () => ({}),
  allow: (actor) => mayHelp(actor),
  run: ({ conn, now, actor, input }) => {
    if (!isSignedIn(actor)) return forbidden();
    setAbilities(conn, now, actor.personId, input);
    return ok({});
  },
});
