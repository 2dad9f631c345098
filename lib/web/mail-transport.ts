import nodemailer from "nodemailer";
import type { Letter } from "@/lib/messages/message";
import type { Env } from "@/lib/shared/env";

/** Mail through SMTP. The connection is kept, since opening one takes longer than sending. */
export function createMailTransport(settings: Pick<Env, "SMTP_URL" | "MAIL_FROM">) {
  const url = new URL(settings.SMTP_URL);
  const transport = nodemailer.createTransport({
    host: url.hostname,
    port: Number(url.port || (url.protocol === "smtps:" ? 465 : 587)),
    secure: url.protocol === "smtps:",
    ...(url.username ? { auth: { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) } } : {}),
    pool: true,
    connectionTimeout: 5_000,
    greetingTimeout: 5_000,
    socketTimeout: 20_000,
  });
  return async (to: string, letter: Letter, messageId: string): Promise<void> => {
    await transport.sendMail({
      from: settings.MAIL_FROM,
      to,
      subject: letter.subject,
      text: letter.text,
      html: letter.html,
      // The same message sent again by a retry keeps its id, so a mail program shows it once.
      messageId: `<${messageId}@dunlin>`,
      ...(letter.calendar ? { icalEvent: { method: methodOf(letter.calendar), filename: "outing.ics", content: letter.calendar } } : {}),
    });
  };
}

/** The mail part and the file inside have to name the same method (RFC 6047, 2.4). */
function methodOf(calendar: string): string {
  return /^METHOD:(\w+)/m.exec(calendar)?.[1] ?? "PUBLISH";
}
