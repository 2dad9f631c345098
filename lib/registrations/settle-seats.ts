import type { Connection } from "@/db/connection";
import { publicOutingFacts } from "@/lib/outings/outing-facts";
import { takesRegistrations, type Outing } from "@/lib/outings/outing";
import { calendarOf } from "@/lib/outings/show-outing-calendar";
import { queueMessage } from "@/lib/messages/message-store";
import { findPerson } from "@/lib/people/person-store";
import { minutesLater, momentInWords } from "@/lib/shared/dates";
import { moneyInWords } from "@/lib/shared/money";
import { offerMinutes, stepsLeft } from "./registration";
import { findRegistration, type Registration } from "./registration-store";
import { confirmSeat, firstInQueue, giveUpSeat, holdSeat, listLapsedHolds } from "./seat-store";

/**
 * Brings an outing's seats up to now: holds that ran out are given up, and whoever has waited longest is
 * offered what is free. Called before every decision about a seat, and by the clock.
 */
export function settleSeats(conn: Connection, now: string, outing: Outing): void {
  for (const id of listLapsedHolds(conn, outing.id, now)) giveUpSeat(conn, now, id);
  if (takesRegistrations(outing, now)) offerFreeSeats(conn, now, outing);
}

/** A registration as it is once its outing's seats are brought up to now: a hold that ran out is none any more. */
export function broughtUpToNow(conn: Connection, now: string, registration: Registration): Registration {
  settleSeats(conn, now, registration.outing);
  return findRegistration(conn, registration.id, now) ?? registration;
}

function offerFreeSeats(conn: Connection, now: string, outing: Outing): void {
  const twoDays = minutesLater(now, offerMinutes);
  const until = twoDays < outing.startsAt ? twoDays : outing.startsAt;
  for (let next = firstInQueue(conn, outing.id); next !== null; next = firstInQueue(conn, outing.id)) {
    if (!holdSeat(conn, now, outing.id, next, until)) return;
    const registration = findRegistration(conn, next, now);
    if (registration && !confirmIfComplete(conn, now, registration.id)) mailOffer(conn, now, registration, until);
  }
}

/** Confirms a held seat once the needs are known, the waiver is signed and the fee is settled. */
export function confirmIfComplete(conn: Connection, now: string, registrationId: string): boolean {
  const registration = findRegistration(conn, registrationId, now);
  if (!registration || registration.state !== "held" || registration.outing.state === "called off") return false;
  const left = stepsLeft({
    hasNeeds: registration.hasNeeds,
    signed: registration.signature !== null,
    feeSettled: registration.feeSettled,
  });
  if (left.length > 0) return false;
  confirmSeat(conn, now, registrationId);
  mailConfirmation(conn, now, registration);
  return true;
}

function mailConfirmation(conn: Connection, now: string, registration: Registration): void {
  const guardian = findPerson(conn, registration.registeredBy);
  if (!guardian) return;
  const { outing, payment } = registration;
  queueMessage(conn, now, {
    kind: "registration-confirmed",
    facts: {
      name: guardian.name,
      outing: publicOutingFacts(outing),
      registrationId: registration.id,
      amount: payment && payment.amountCents > 0 ? moneyInWords({ cents: payment.amountCents, currency: payment.currency }) : "",
      calendar: calendarOf(outing, now),
    },
    toAddress: guardian.email,
    toPersonId: guardian.id,
    outingId: outing.id,
  });
}

function mailOffer(conn: Connection, now: string, registration: Registration, until: string): void {
  const guardian = findPerson(conn, registration.registeredBy);
  if (!guardian) return;
  queueMessage(conn, now, {
    kind: "seat-offered",
    facts: {
      name: guardian.name,
      outing: publicOutingFacts(registration.outing),
      registrationId: registration.id,
      until: momentInWords(until, registration.outing.site.zone),
    },
    toAddress: guardian.email,
    toPersonId: guardian.id,
    outingId: registration.outing.id,
  });
}
