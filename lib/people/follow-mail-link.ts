import { findHouseholdOf, insertHousehold } from "@/lib/families/household-store";
import type { Connection } from "@/db/connection";
import { conflict, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { findMailLink, spendMailLink, spendOlderLinks, type Carried } from "./mail-link-store";
import { secretSchema } from "./person-schema";
import { confirmEmail, giveRole, setNameAndPassword } from "./person-store";

/** Signs in whoever holds a link from our mail: the address is theirs. A sign-up's own link makes the account. */
export const followMailLink = defineCommand({
  input: secretSchema,
  load: (conn, _actor, input, now) => findMailLink(conn, input.secret, now),
  allow: (_actor, link) => link.purpose === "confirm-email" || link.purpose === "sign-in",
  run: ({ conn, now, found: link, input }) => {
    if (link.state !== "good") return conflict("link-spent", spentSentence(link.state));
    spendMailLink(conn, input.secret, now);
    confirmEmail(conn, link.personId, now);
    // What somebody else typed with this address may not follow later and take the account over.
    if (link.carries) spendOlderLinks(conn, link.personId, "confirm-email", now);
    if (link.carries) makeGuardian(conn, now, link.personId, link.carries);
    return ok({ personId: link.personId, back: link.carries?.back ?? "" });
  },
});

function makeGuardian(conn: Connection, now: string, personId: string, { name, passwordHash }: Carried): void {
  setNameAndPassword(conn, personId, name, passwordHash);
  giveRole(conn, personId, "guardian");
  if (findHouseholdOf(conn, personId) === null) insertHousehold(conn, now, personId);
}

export function spentSentence(state: "used" | "late"): string {
  const why = state === "used" ? "This link has been used already." : "This link is too old.";
  return `${why} Ask for a new one on the sign-in page; it comes by e-mail in a minute.`;
}
