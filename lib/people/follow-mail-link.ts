import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { findMailLink, spendMailLink } from "./mail-link-store";
import { secretSchema } from "./person-schema";
import { confirmEmail } from "./person-store";

/** Signs in whoever holds a link from our mail: the address is theirs, so it is confirmed as well. */
export const followMailLink = defineCommand({
  input: secretSchema,
  load: (conn, _actor, input, now) => findMailLink(conn, input.secret, now),
  allow: (_actor, link) => link.purpose === "confirm-email" || link.purpose === "sign-in",
  run: ({ conn, now, found: link, input }) => {
    if (link.state !== "good") return conflict("link-spent", spentSentence(link.state));
    spendMailLink(conn, input.secret, now);
    confirmEmail(conn, link.personId, now);
    return ok({ personId: link.personId });
  },
});

export function spentSentence(state: "used" | "late"): string {
  const why = state === "used" ? "This link has been used already." : "This link is too old.";
  return `${why} Ask for a new one on the sign-in page; it comes by e-mail in a minute.`;
}
