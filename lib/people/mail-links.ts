import type { Connection } from "@/db/connection";
import { queueMessage } from "@/lib/messages/message-store";
import { publicAddress } from "@/lib/shared/addresses";
import { minutesLater } from "@/lib/shared/dates";
import { makeMailLink } from "./mail-link-store";
import { linkLifeMinutes, type Person } from "./person";

/** Mails somebody the link that proves the address is theirs. */
export function mailConfirmation(conn: Connection, now: string, person: Pick<Person, "id" | "name" | "email">): void {
  const link = freshLink(conn, now, "confirm-email", person.id);
  queueMessage(conn, now, {
    kind: "confirm-email",
    facts: { name: person.name, link },
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
  const link = freshLink(conn, now, "invitation", person.id);
  queueMessage(conn, now, {
    kind: "invitation",
    facts: { name: person.name, role, from, link },
    toAddress: person.email,
    toPersonId: person.id,
  });
}

function freshLink(conn: Connection, now: string, purpose: keyof typeof linkLifeMinutes, personId: string): string {
  const secret = makeMailLink(conn, { purpose, personId, madeAt: now, expiresAt: minutesLater(now, linkLifeMinutes[purpose]) });
  return publicAddress(`/link/${secret}`);
}
