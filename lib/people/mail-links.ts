import type { Connection } from "@/db/connection";
import { queueMessage } from "@/lib/messages/message-store";
import { publicAddress } from "@/lib/shared/addresses";
import { minutesLater } from "@/lib/shared/dates";
import { makeMailLink, spendOlderLinks, type Carried } from "./mail-link-store";
import { linkLifeMinutes, type Person } from "./person";

/**
 * Mails the link that proves an address, and carries what was typed with it. The password takes effect only when
 * this very link is followed, so nobody can put a password on an address that is not theirs.
 */
export function mailConfirmation(conn: Connection, now: string, person: Pick<Person, "id" | "email">, carries: Carried): void {
  const link = freshLink(conn, now, "confirm-email", person.id, carries);
  queueMessage(conn, now, {
    kind: "confirm-email",
    facts: { name: carries.name, link },
    toAddress: person.email,
    toPersonId: person.id,
  });
}

export function mailSignInLink(conn: Connection, now: string, person: Person, kind: "sign-in-link" | "already-registered"): void {
  const link = freshLink(conn, now, "sign-in", person.id);
  queueMessage(conn, now, { kind, facts: { name: person.name, link }, toAddress: person.email, toPersonId: person.id });
}

export function mailInvitation(
  conn: Connection,
  now: string,
  invitation: { person: Pick<Person, "id" | "name" | "email">; role: string; from: string },
): void {
  const { person, role, from } = invitation;
  spendOlderLinks(conn, person.id, "invitation", now);
  const link = freshLink(conn, now, "invitation", person.id);
  queueMessage(conn, now, {
    kind: "invitation",
    facts: { name: person.name, role, from, link },
    toAddress: person.email,
    toPersonId: person.id,
  });
}

function freshLink(conn: Connection, now: string, purpose: keyof typeof linkLifeMinutes, personId: string, carries?: Carried): string {
  const secret = makeMailLink(conn, { purpose, personId, ...(carries ? { carries } : {}), madeAt: now, expiresAt: minutesLater(now, linkLifeMinutes[purpose]) });
  return publicAddress(`/link/${secret}`);
}
