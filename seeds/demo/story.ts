import { addDays, format, parse, subDays, subYears } from "date-fns";
import type { Connection } from "@/db/connection";
import { composeLetter } from "@/emails/compose-letter";
import { deliverDue } from "@/lib/messages/deliver-due";
import { dayOf, instantAt } from "@/lib/shared/dates";
import { env } from "@/lib/shared/env";
import type { Outcome } from "@/lib/shared/outcome";

/** The day the world is made and everything that is counted from it. */
export type Story = {
  conn: Connection;
  zone: string;
  /** The wall clock at `time`, so many days before the day of seeding. */
  daysAgo: (days: number, time: string) => string;
  /** A Saturday as a day: 0 is the first one that has not passed, 5 is five weeks after it, -5 five weeks before. */
  saturday: (weeks: number) => string;
};

export function beginStory(conn: Connection, now: string): Story {
  const zone = env().PROGRAMME_ZONE;
  const today = dayOf(now, zone);
  const untilSaturday = (6 - dateOf(today).getDay() + 7) % 7;
  return {
    conn,
    zone,
    daysAgo: (days, time) => instantAt(daysLater(today, -days), time, zone),
    saturday: (weeks) => daysLater(today, untilSaturday + 7 * weeks),
  };
}

export function daysLater(day: string, days: number): string {
  return format(addDays(dateOf(day), days), "yyyy-MM-dd");
}

/** The birthday of somebody who is `age` on `day` and had the last birthday so many days before it. */
export function bornFor(day: string, age: number, daysSinceBirthday: number): string {
  return format(subDays(subYears(dateOf(day), age), daysSinceBirthday), "yyyy-MM-dd");
}

function dateOf(day: string): Date {
  return parse(day, "yyyy-MM-dd", new Date(0));
}

/** What a step of the story answers; a refused step means that the story itself is wrong. */
export function must<T>(outcome: Outcome<T>): T {
  if (outcome.ok) return outcome.value;
  const { refusal } = outcome;
  const fields = refusal.kind === "invalid" ? ` ${JSON.stringify(refusal.fields)}` : "";
  throw new Error(`A step of the demo world was refused (${refusal.kind}): ${refusal.sentence}${fields}`);
}

/**
 * Marks what was queued up to an instant as sent then, without sending it: the outbox shows a season of mail,
 * and starting the demo mails none of it.
 */
export async function sendPost(story: Story, at: string): Promise<void> {
  const { failed } = await deliverDue(story.conn, { compose: composeLetter, send: async () => {}, clock: () => at });
  if (failed > 0) throw new Error(`${failed} mails of the demo world could not be written.`);
}
