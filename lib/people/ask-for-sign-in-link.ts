import { minutesLater } from "@/lib/shared/dates";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { countLinksMade } from "./mail-link-store";
import { mailsAnHour } from "./person";
import { mailSignInLink } from "./mail-links";
import { findPersonByEmail } from "./person-store";
import { askForLinkSchema } from "./person-schema";

/** Mails a link to whoever has this address. At most five an hour; the answer never tells whether anybody has. */
export const askForSignInLink = defineCommand({
  input: askForLinkSchema,
  load: (conn, _actor, input) => ({ person: findPersonByEmail(conn, input.linkEmail) }),
  allow: () => true,
  run: ({ conn, now, input, found: { person } }) => {
    if (person && countLinksMade(conn, person.id, "sign-in", minutesLater(now, -60)) < mailsAnHour) {
      mailSignInLink(conn, now, person, "sign-in-link");
    }
    return ok({ email: input.linkEmail });
  },
});
