import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { spentSentence } from "./follow-mail-link";
import { findMailLink, spendMailLink, spendOlderLinks } from "./mail-link-store";
import { hashPassword } from "./passwords";
import { acceptInvitationSchema } from "./person-schema";
import { confirmEmail, findPerson, setNameAndPassword } from "./person-store";

/** An invited person says what they are called and chooses a password. */
export const acceptInvitation = defineCommand({
  input: acceptInvitationSchema,
  prepare: ({ input }) => hashPassword(input.password),
  load: (conn, _actor, input, now) => {
    const link = findMailLink(conn, input.secret, now);
    const person = link && findPerson(conn, link.personId);
    return link && person ? { link, person } : null;
  },
  allow: (_actor, { link }) => link.purpose === "invitation",
  run: ({ conn, now, found: { link, person }, input, prepared: passwordHash }) => {
    if (person.hasPassword) return conflict("has-account", "You have an account already. Sign in with it; what you were invited to is open to you.");
    if (link.state !== "good") return conflict("link-spent", spentSentence(link.state));
    spendMailLink(conn, input.secret, now);
    spendOlderLinks(conn, link.personId, "confirm-email", now);
    confirmEmail(conn, link.personId, now);
    setNameAndPassword(conn, link.personId, input.name, passwordHash);
    return ok({ personId: link.personId });
  },
});
