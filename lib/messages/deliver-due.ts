import type { Connection } from "@/db/connection";
import { log } from "@/lib/shared/log";
import { noteProblem, noteSent, takeDueMessage, type DueMessage } from "./message-store";
import type { Letter, Message } from "./message";

export type Mailer = {
  compose: (message: Message) => Promise<Letter> | Letter;
  send: (to: string, letter: Letter, messageId: string) => Promise<void>;
  clock: () => string;
};

/** Sends what is due, one after another, until nothing is. A mail that fails waits its turn and never stops the rest. */
export async function deliverDue(conn: Connection, mailer: Mailer, atMost = 200): Promise<{ sent: number; failed: number }> {
  const counts = { sent: 0, failed: 0 };
  for (let round = 0; round < atMost; round += 1) {
    const due = takeDueMessage(conn, mailer.clock());
    if (!due) break;
    const went = await deliverOne(conn, mailer, due);
    counts[went ? "sent" : "failed"] += 1;
  }
  return counts;
}

async function deliverOne(conn: Connection, mailer: Mailer, due: DueMessage): Promise<boolean> {
  try {
    const letter = await mailer.compose(due.message);
    await mailer.send(due.toAddress, letter, due.id);
    noteSent(conn, due.id, letter, mailer.clock());
    return true;
  } catch (error) {
    const problem = error instanceof Error ? error.message : String(error);
    log.warn({ messageId: due.id, attempts: due.attempts, code: codeOf(error) }, "a mail could not be sent");
    noteProblem(conn, due, problem, mailer.clock());
    return false;
  }
}

/** What a mail server says often quotes an address, which has no place in a log. */
function codeOf(error: unknown): string {
  const code = typeof error === "object" && error !== null && "code" in error ? error.code : undefined;
  return typeof code === "string" ? code : "unknown";
}
