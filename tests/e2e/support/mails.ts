import { expect } from "@playwright/test";
import ICAL from "ical.js";
import { place } from "./place";

type Attachment = { contentType: string; fileName?: string; generatedFileName?: string };
export type Mail = { id: string; subject: string; text: string; html: string; to: { address: string }[]; attachments?: Attachment[] };

/** Every mail to an address, oldest first. */
export async function mailsTo(address: string, mailApi = place().mailApi): Promise<Mail[]> {
  const response = await fetch(mailApi);
  const all = (await response.json()) as Mail[];
  return all.filter((mail) => mail.to.some((to) => to.address === address));
}

/** The newest mail to an address whose subject fits, waited for. */
export async function mailTo(address: string, subject: RegExp, mailApi = place().mailApi): Promise<Mail> {
  let found: Mail | undefined;
  await expect
    .poll(
      async () => {
        found = (await mailsTo(address, mailApi)).findLast((mail) => subject.test(mail.subject));
        return found?.subject ?? "no such mail";
      },
      { message: `a mail to ${address} about ${String(subject)}`, timeout: 20_000 },
    )
    .toMatch(subject);
  if (!found) throw new Error("unreachable: the mail was found");
  return found;
}

/** Where the link of a mail leads, taken from its plain text: everything must be in there. */
export function linkIn(mail: Mail): string {
  const link = /https?:\/\/\S+\/link\/[\w-]+/.exec(mail.text)?.[0];
  if (!link) throw new Error(`no link in: ${mail.text}`);
  return link;
}

/** The calendar file of a mail, read by ical.js as RFC 5545. */
export async function eventIn(mail: Mail, mailApi = place().mailApi): Promise<ICAL.Event> {
  const file = mail.attachments?.find((one) => /ics|calendar/.test(`${one.contentType} ${one.fileName ?? ""}`));
  const name = file?.generatedFileName ?? file?.fileName;
  if (!name) throw new Error(`no calendar file with: ${mail.subject}`);
  const response = await fetch(`${mailApi}/${mail.id}/attachment/${encodeURIComponent(name)}`);
  const root = new ICAL.Component(ICAL.parse(await response.text()) as [string, unknown[], unknown[]]);
  const event = root.getFirstSubcomponent("vevent");
  if (!event) throw new Error("the calendar file has no event");
  return new ICAL.Event(event);
}
