import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { spentSentence } from "./follow-mail-link";
import { findMailLink, spendMailLink } from "./mail-link-store";
import { hashPassword } from "./passwords";
import { acceptInvitationSchema } from "./person-schema";
import { confirmEmail, setNameAndPassword } from "./person-store";

/** An invited person says what they are called and chooses a password. */
export const acceptInvitation = defineCommand({
  input: acceptInvitationSchema,
  prepare: ({ input }) => hashPassword(input.password),
  load: (conn, _actor, input, now) => findMailLink(conn, input.secret, now),
  allow: (_actor, link) => link.purpose === "invitation",
  run: ({ conn, now, found: link, input, prepared: passwordHash }) => {
    if (link.state !== "good") return conflict("link-spent", spentSentence(link.state));
    spendMailLink(conn, input.secret, now);
    confirmEmail(conn, link.personId, now);
    setNameAndPassword(conn, link.personId, input.name, passwordHash);
    return ok({ personId: link.personId });
  },
});
