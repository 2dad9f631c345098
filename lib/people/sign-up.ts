import { insertHousehold } from "@/lib/families/household-store";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { spendOlderLinks } from "./mail-link-store";
import { mailConfirmation, mailSignInLink } from "./mail-links";
import { findPersonByEmail, giveRole, insertPerson, setNameAndPassword } from "./person-store";
import { hashPassword } from "./passwords";
import { signUpSchema } from "./person-schema";

/**
 * Makes a guardian's account. The answer is the same whether or not the address has one already,
 * so nobody learns who has: an address with an account gets a sign-in link instead.
 */
export const signUp = defineCommand({
  input: signUpSchema,
  prepare: ({ input }) => hashPassword(input.password),
  load: (conn, _actor, input) => ({ known: findPersonByEmail(conn, input.email) }),
  allow: () => true,
  run: ({ conn, now, found: { known }, input, prepared: passwordHash }) => {
    if (known?.emailConfirmed) {
      mailSignInLink(conn, now, known, "already-registered");
      return ok({ email: input.email });
    }
    if (known) {
      // Whoever signs up last before the address is proved sets the password, and only the newest link works.
      setNameAndPassword(conn, known.id, input.name, passwordHash);
      spendOlderLinks(conn, known.id, "confirm-email", now);
      mailConfirmation(conn, now, known);
      return ok({ email: input.email });
    }
    const id = insertPerson(conn, now, { email: input.email, name: input.name, phone: input.phone, passwordHash });
    giveRole(conn, id, "guardian");
    insertHousehold(conn, now, id);
    mailConfirmation(conn, now, { id, name: input.name, email: input.email });
    return ok({ email: input.email });
  },
});
