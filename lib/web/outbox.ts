import { composeLetter } from "@/emails/compose-letter";
import { deliverDue } from "@/lib/messages/deliver-due";
import { releaseLapsedHolds } from "@/lib/registrations/release-lapsed-holds";
import { forgetOldSignInAttempts } from "@/lib/people/person-store";
import { theClock } from "@/lib/shared/actor";
import { minutesLater } from "@/lib/shared/dates";
import { env } from "@/lib/shared/env";
import { log } from "@/lib/shared/log";
import { database } from "./database";
import { systemContext } from "./http-handler";
import { createMailTransport } from "./mail-transport";

type Post = { running: Promise<unknown> | null; timer: NodeJS.Timeout | null; send: ReturnType<typeof createMailTransport> | null };

const place = globalThis as typeof globalThis & { dunlinPost?: Post };

function post(): Post {
  place.dunlinPost ??= { running: null, timer: null, send: null };
  return place.dunlinPost;
}

/** Sends what is due. One round at a time; a second call waits for the one under way and then makes its own. */
export async function deliverOutbox(): Promise<void> {
  const here = post();
  while (here.running) await here.running;
  here.send ??= createMailTransport(env());
  const mailer = { compose: composeLetter, send: here.send, clock: () => new Date().toISOString() };
  here.running = deliverDue(database().conn, mailer).catch((error: unknown) => {
    log.error({ problem: String(error) }, "the outbox stopped");
  });
  await here.running;
  here.running = null;
}

/** The program's own clock: sends mail and gives up lapsed holds even when nobody opens a page. */
export function startClock(): void {
  const here = post();
  here.timer ??= setInterval(() => void tick(), env().OUTBOX_SECONDS * 1000).unref();
}

async function tick(): Promise<void> {
  try {
    await releaseLapsedHolds(systemContext(theClock), {});
    await tidySessions();
    if (!post().running) await deliverOutbox();
  } catch (error) {
    log.error({ problem: String(error) }, "the clock's round did not finish");
  }
}

/** Sessions nobody used for thirty days, and wrong tries to sign in that are past counting. */
async function tidySessions(): Promise<void> {
  const { conn, sessions } = database();
  await sessions.deleteExpiredSessions();
  forgetOldSignInAttempts(conn, minutesLater(new Date().toISOString(), -24 * 60));
}
