import { counted } from "@/lib/shared/words";

/** What an outing needs before it may go. Each item is ready, waiting on others, needs you, or stops the outing. */
export type ReadinessState = "ready" | "waiting on others" | "needs you" | "stops the outing";

export type ReadinessItem = {
  name: string;
  state: ReadinessState;
  sentence: string;
  /** Where to act on it, relative to the outing's desk page; null when there is nothing to do. */
  act: { path: "" | "edit" | "helpers" | "cover" | "papers" | "messages"; text: string } | null;
};

export type ReadinessFacts = {
  outingState: "draft" | "open" | "closed" | "called off" | "done";
  confirmed: number;
  held: number;
  waiting: number;
  cover: { covered: boolean; sentence: string };
  helpers: { yes: number; maybe: number; asked: number; leaders: number };
  roster: "none" | "current" | "outdated";
  meetingPointMails: { wanted: number; sent: number; unsent: number };
};

/** From facts to the list, worst first within the order a coordinator works in. Pure: the same facts, the same list. */
export function readinessOf(facts: ReadinessFacts): ReadinessItem[] {
  return [publication(facts), people(facts), adults(facts), cover(facts), meetingPoint(facts), roster(facts)];
}

export function verdictOf(items: ReadinessItem[]): { kind: "good" | "you" | "stop"; sentence: string } {
  const stops = items.filter((item) => item.state === "stops the outing").length;
  const needs = items.filter((item) => item.state === "needs you").length;
  const waits = items.filter((item) => item.state === "waiting on others").length;
  if (stops + needs + waits === 0) return { kind: "good", sentence: "Ready: nothing is missing." };
  const parts: string[] = [];
  if (needs > 0) parts.push(needs === 1 ? "one thing needs you" : `${inWords(needs)} things need you`);
  const thing = parts.length === 0 ? (stops === 1 ? " thing" : " things") : "";
  if (stops > 0) parts.push(stops === 1 ? `one${thing} stops the outing` : `${inWords(stops)}${thing} stop the outing`);
  if (parts.length === 0) parts.push(waits === 1 ? "one thing waits on others" : `${inWords(waits)} things wait on others`);
  return { kind: stops > 0 ? "stop" : "you", sentence: `Not yet ready: ${parts.join(", ")}.` };
}

function inWords(count: number): string {
  return ["none", "one", "two", "three", "four", "five", "six"][count] ?? String(count);
}

function publication({ outingState }: ReadinessFacts): ReadinessItem {
  if (outingState === "draft") {
    return { name: "Publication", state: "needs you", sentence: "This is a draft. Nobody can register before it is published.", act: { path: "", text: "Publish below" } };
  }
  const sentence = outingState === "open" ? "Published, and open for registration." : `The outing is ${outingState}.`;
  return { name: "Publication", state: "ready", sentence, act: null };
}

function people({ confirmed, held, waiting }: ReadinessFacts): ReadinessItem {
  const queue = waiting === 0 ? "" : ` ${waiting} waiting.`;
  if (held > 0) {
    return { name: "People", state: "waiting on others", sentence: `${confirmed} confirmed; ${held} still to finish the form, the waiver or the fee.${queue}`, act: null };
  }
  if (confirmed === 0) return { name: "People", state: "waiting on others", sentence: `Nobody is registered yet.${queue}`, act: null };
  return { name: "People", state: "ready", sentence: `${confirmed} confirmed: needs told, waivers signed, fees settled.${queue}`, act: null };
}

function adults({ helpers }: ReadinessFacts): ReadinessItem {
  const act = { path: "helpers", text: "Ask people" } as const;
  if (helpers.leaders === 0) return { name: "Adults", state: "needs you", sentence: `No leader has said yes. ${counted(helpers.yes, "adult has", "adults have")}.`, act };
  const open = helpers.maybe + helpers.asked;
  if (open > 0) {
    return { name: "Adults", state: "waiting on others", sentence: `${helpers.yes} said yes; ${helpers.asked} have not answered and ${helpers.maybe} said maybe.`, act };
  }
  return { name: "Adults", state: "ready", sentence: `${helpers.yes} said yes, among them a leader.`, act: null };
}

function cover({ cover: { covered, sentence }, confirmed }: ReadinessFacts): ReadinessItem {
  const act = { path: "cover", text: "Open cover" } as const;
  if (confirmed === 0) return { name: "Cover", state: "waiting on others", sentence: "Judged as soon as somebody is registered.", act };
  return { name: "Cover", state: covered ? "ready" : "stops the outing", sentence, act };
}

function meetingPoint({ meetingPointMails: { wanted, sent, unsent } }: ReadinessFacts): ReadinessItem {
  const act = { path: "messages", text: "Send or see the mails" } as const;
  if (wanted === 0) return { name: "Meeting-point mails", state: "waiting on others", sentence: "Sent once somebody has said yes.", act: null };
  if (unsent > 0) return { name: "Meeting-point mails", state: "needs you", sentence: `${unsent} of ${wanted} have not gone out yet.`, act };
  if (sent < wanted) return { name: "Meeting-point mails", state: "needs you", sentence: `${wanted - sent} of ${wanted} adults have not been told where to meet.`, act };
  return { name: "Meeting-point mails", state: "ready", sentence: wanted === 1 ? "The one adult who comes has it." : `All ${wanted} adults have them.`, act };
}

function roster({ roster: state, confirmed }: ReadinessFacts): ReadinessItem {
  const act = { path: "papers", text: "Print the roster" } as const;
  if (confirmed === 0) return { name: "Roster", state: "waiting on others", sentence: "Printed once people are registered.", act: null };
  if (state === "none") return { name: "Roster", state: "needs you", sentence: "Not printed yet.", act };
  if (state === "outdated") return { name: "Roster", state: "needs you", sentence: "Something changed since the last print.", act };
  return { name: "Roster", state: "ready", sentence: "The last print is still true.", act };
}
