import { describe, expect, it } from "vitest";
import { composeLetter } from "@/emails/compose-letter";
import { messageKindInWords, withoutSecrets, type Letter, type Message, type MessageFacts, type OutingFacts } from "@/lib/messages/message";
import { checkNeverOnPaper } from "@/lib/roster/never-on-paper";
import { paragraph } from "@/lib/sheets/sheet";

const outing: OutingFacts = {
  title: "Owls & “reeds” at <Heron Spit>",
  slug: "owls",
  siteName: "Heron Spit",
  day: "Saturday 9 January 2027",
  hours: "9 a.m. to noon",
  meetingText: "1. Face the bell.\n2. Walk 30 metres, gravel underfoot.",
};
const name = "Łucja O’Brien 阮";
const link = `http://127.0.0.1:3000/link/${"s".repeat(43)}`;
const calendar = "BEGIN:VCALENDAR\r\nEND:VCALENDAR\r\n";

/** One of each kind. A new kind does not compile until it is here. */
const facts: MessageFacts = {
  "confirm-email": { name, link },
  "already-registered": { name, link },
  "sign-in-link": { name, link },
  invitation: { name, role: "chaperone", from: "Ines Amari", link },
  "registration-confirmed": { name, outing, registrationId: "r1", amount: "$12.50", calendar },
  "on-the-waiting-list": { name, outing, registrationId: "r1", place: 7 },
  "seat-offered": { name, outing, registrationId: "r1", until: "Wednesday 6 January 2027, 10:45 a.m." },
  "asked-to-help": { name, outing, task: "chaperone", from: "Ines Amari", link },
  "meeting-point": { name, outing, task: "leader", phone: "360 555 0142", calendar },
  "called-off": { name, outing, because: "A storm is coming.", calendar },
  "outing-changed": { name, outing, calendar },
};

const messages = (Object.keys(facts) as (keyof MessageFacts)[]).map((kind) => ({ kind, facts: facts[kind] }) as Message);

/** The words a mail program shows of an HTML page, without its tags. */
function wordsOf(html: string): string {
  const body = /<body[^>]*>(.*)<\/body>/s.exec(html)?.[1] ?? "";
  const entities: Record<string, string> = { amp: "&", lt: "<", gt: ">", quot: '"', "#x27": "'" };
  return body
    .replace(/<(br|\/p|\/h2|\/div)[^>]*>/g, "\n")
    .replace(/<[^>]+>/g, "")
    .replace(/&([a-z0-9#]+);/g, (whole, entity: string) => entities[entity] ?? whole);
}

const hrefsOf = ({ html }: Letter) => [...html.matchAll(/href="([^"]*)"/g)].map(([, href]) => href ?? "");

/** Every text among the facts of a message, but for what only the program reads. */
function textsOf(value: unknown, key = ""): string[] {
  if (["calendar", "slug", "registrationId", "role", "task"].includes(key)) return [];
  if (typeof value === "object" && value !== null) return Object.entries(value).flatMap(([inner, one]) => textsOf(one, inner));
  return String(value).split("\n");
}

/** Facts a kind has and says otherwise or not at all, each for a reason. */
const unsaid: Partial<Record<Message["kind"], readonly string[]>> = {
  // Where to meet is for those who come.
  "on-the-waiting-list": outing.meetingText.split("\n"),
  "seat-offered": outing.meetingText.split("\n"),
  "asked-to-help": outing.meetingText.split("\n"),
  "called-off": outing.meetingText.split("\n"),
};

describe.each(messages)("the mail $kind", (message) => {
  it("says in plain text every line that its HTML says, and has every address written out", async () => {
    const letter = await composeLetter(message);
    const lines = wordsOf(letter.html).split("\n").map((line) => line.trim()).filter((line) => line !== "");
    expect(lines.length).toBeGreaterThan(3);
    expect(lines.filter((line) => !letter.text.includes(line))).toEqual([]);
    expect(hrefsOf(letter).length).toBeGreaterThan(0);
    expect(hrefsOf(letter).filter((href) => !letter.text.includes(href))).toEqual([]);
  });

  it("says every fact it was given, and nothing it was not", async () => {
    const { text, html, subject } = await composeLetter(message);
    const wanted = textsOf(message.facts).filter((fact) => fact !== "" && !unsaid[message.kind]?.includes(fact));
    expect(wanted.filter((fact) => !text.includes(fact))).toEqual([]);
    for (const fact of unsaid[message.kind] ?? []) expect(text).not.toContain(fact);
    for (const part of [text, html, subject]) expect(part).not.toMatch(/undefined|null|\[object|NaN/);
  });

  it("has a subject on one line, a language, and no markup of its readers' making", async () => {
    const { subject, html } = await composeLetter(message);
    expect(subject).toMatch(/^[^\r\n]{10,120}$/);
    expect(html).toMatch(/^<!doctype html><html lang="en">/);
    expect(html).not.toContain("<Heron Spit>");
    expect(html).not.toMatch(/<img|<table|<script/);
  });

  it("says nothing of anybody's health", async () => {
    const { text } = await composeLetter(message);
    const findings = checkNeverOnPaper({ title: "", language: "en-US", runningHead: "", runningFoot: "", blocks: [paragraph(text)] });
    const ofHealth = findings.filter(({ id }) => ["diagnosis", "medication", "toileting", "behaviour", "custody"].includes(id));
    expect(ofHealth).toEqual([]);
    expect(text).not.toMatch(/blind|wheelchair|cane|low vision/i);
  });

  it("has a name for the list of deliveries", () => expect(messageKindInWords[message.kind]).toMatch(/^[A-Z].{4,}/));
});

it("a calendar file goes along where there is one", async () => {
  const withCalendar: string[] = [];
  for (const message of messages) if ((await composeLetter(message)).calendar === calendar) withCalendar.push(message.kind);
  expect(withCalendar).toEqual(["registration-confirmed", "meeting-point", "called-off", "outing-changed"]);
});

it("a no-fee place reads like a paid one, without a word about money received", async () => {
  const { text } = await composeLetter({ kind: "registration-confirmed", facts: { ...facts["registration-confirmed"], amount: "" } });
  expect(text).not.toMatch(/received|\$|no.fee/i);
});

it("the log of what was sent keeps no link's secret", async () => {
  for (const message of messages) expect(withoutSecrets((await composeLetter(message)).text)).not.toContain("s".repeat(43));
});
