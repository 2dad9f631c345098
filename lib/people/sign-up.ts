import { minutesLater } from "@/lib/shared/dates";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { countLinksMade } from "./mail-link-store";
import { mailConfirmation, mailSignInLink } from "./mail-links";
import { mailsAnHour } from "./person";
import { findPersonByEmail, insertPerson } from "./person-store";
import { hashPassword } from "./passwords";
import { signUpSchema } from "./person-schema";

/**
 * Begins a guardian's account; following the mailed link makes it. The answer is the same whether or not the
 * address has an account already, so nobody learns who has: such an address gets a sign-in link instead.
 */
export const signUp = defineCommand({
  input: signUpSchema,
  prepare: ({ input }) => hashPassword(input.password),
  load: (conn, _actor, input, now) => {
    const known = findPersonByEmail(conn, input.email);
    const since = minutesLater(now, -60);
    const mails = known ? countLinksMade(conn, known.id, "confirm-email", since) + countLinksMade(conn, known.id, "sign-in", since) : 0;
    return { known, mails };
  },
  allow: () => true,
  run: ({ conn, now, found: { known, mails }, input, prepared: passwordHash }) => {
    if (mails >= mailsAnHour) return ok({ email: input.email });
    // Whoever was invited has a role already: only their own links may open that account, not a password typed here.
    if (known && (known.emailConfirmed || known.roles.length > 0)) {
      mailSignInLink(conn, now, known, "already-registered");
      return ok({ email: input.email });
    }
    const id = known?.id ?? insertPerson(conn, now, { email: input.email, name: input.name, phone: input.phone });
    mailConfirmation(conn, now, { id, email: input.email }, { name: input.name, passwordHash, back: input.back });
    return ok({ email: input.email });
  },
});
