import { checkoutMinutes, holdMinutes, offerMinutes } from "@/lib/registrations/registration";
import { minutesLater } from "@/lib/shared/dates";

/**
 * What the seats of an outing should be, written down a second time and as plainly as can be: a list of who waits
 * and a note for each child. The program is held against it step by step.
 */
export type Page = { amountCents: number; openedAt: string; live: boolean; paid: boolean };
export type Note = {
  state: "none" | "held" | "waiting" | "confirmed" | "withdrawn";
  until: string;
  needs: boolean;
  signed: boolean;
  feeSettled: boolean;
  pages: Page[];
};
export type SeatModel = { seats: number; startsAt: string; queue: number[]; notes: Note[] };

export function emptyModel(seats: number, children: number, startsAt: string): SeatModel {
  const notes = Array.from({ length: children }, (): Note => {
    return { state: "none", until: "", needs: false, signed: false, feeSettled: false, pages: [] };
  });
  return { seats, startsAt, queue: [], notes };
}

const noteOf = (model: SeatModel, child: number): Note => {
  const note = model.notes[child];
  if (!note) throw new Error(`the model has no child ${child}`);
  return note;
};

export function freeSeats(model: SeatModel): number {
  return model.seats - model.notes.filter((note) => note.state === "held" || note.state === "confirmed").length;
}

function complete(note: Note): void {
  if (note.state === "held" && note.needs && note.signed && note.feeSettled) note.state = "confirmed";
}

function hold(model: SeatModel, child: number, until: string): void {
  const note = noteOf(model, child);
  note.state = "held";
  note.until = until;
  complete(note);
}

export function settle(model: SeatModel, now: string): void {
  for (const note of model.notes) if (note.state === "held" && note.until <= now) note.state = "withdrawn";
  if (now >= model.startsAt) return;
  const twoDays = minutesLater(now, offerMinutes);
  while (freeSeats(model) > 0) {
    const next = model.queue.shift();
    if (next === undefined) return;
    hold(model, next, twoDays < model.startsAt ? twoDays : model.startsAt);
  }
}

const earlier = (one: string, other: string) => (one < other ? one : other);

/** What is tried with the seats brought up to now; refused, it leaves everything as it was, the lapsed holds too. */
function attempt(model: SeatModel, now: string, work: (draft: SeatModel) => boolean): void {
  const draft = structuredClone(model);
  settle(draft, now);
  if (work(draft)) Object.assign(model, draft);
}

const isLive = ({ state }: Note) => state === "held" || state === "waiting" || state === "confirmed";

export function registers(model: SeatModel, child: number, now: string): void {
  attempt(model, now, (draft) => {
    if (!isLive(noteOf(draft, child))) seatOrQueue(draft, child, now);
    return true;
  });
}

function seatOrQueue(model: SeatModel, child: number, now: string): void {
  if (model.queue.length === 0 && freeSeats(model) > 0) {
    return hold(model, child, earlier(minutesLater(now, holdMinutes), model.startsAt));
  }
  noteOf(model, child).state = "waiting";
  model.queue.push(child);
}

export function withdraws(model: SeatModel, child: number, now: string): void {
  const note = noteOf(model, child);
  if (!isLive(note)) return;
  note.state = "withdrawn";
  model.queue = model.queue.filter((one) => one !== child);
  for (const page of note.pages) page.live = false;
  settle(model, now);
}

export function saysNeeds(model: SeatModel, child: number, now: string): void {
  if (noteOf(model, child).state === "none") return;
  attempt(model, now, (draft) => {
    const note = noteOf(draft, child);
    if (!isLive(note)) return false;
    note.needs = true;
    complete(note);
    return true;
  });
}

export function signs(model: SeatModel, child: number, now: string): void {
  if (noteOf(model, child).state === "none") return;
  attempt(model, now, (draft) => {
    const note = noteOf(draft, child);
    if (!note.signed && !isLive(note)) return false;
    note.signed = true;
    complete(note);
    return true;
  });
}

export function takesNoFee(model: SeatModel, child: number, now: string): void {
  if (noteOf(model, child).state === "none") return;
  attempt(model, now, (draft) => {
    const note = noteOf(draft, child);
    if (note.feeSettled) return true;
    if (note.state !== "held") return false;
    for (const page of note.pages) page.live = false;
    note.feeSettled = true;
    complete(note);
    return true;
  });
}

/** A new page for this amount, unless the last one is still open for the same. */
export function opensPage(model: SeatModel, child: number, amountCents: number, now: string): void {
  if (noteOf(model, child).state === "none") return;
  attempt(model, now, (draft) => {
    const note = noteOf(draft, child);
    if (note.feeSettled) return true;
    if (note.state !== "held") return false;
    const last = note.pages.find((page) => page.live);
    if (last && last.amountCents === amountCents && minutesLater(last.openedAt, checkoutMinutes - 5) > now) return true;
    if (last) last.live = false;
    note.pages.push({ amountCents, openedAt: now, live: true, paid: false });
    const until = earlier(minutesLater(now, checkoutMinutes + 5), draft.startsAt);
    if (note.until < until) note.until = until;
    return true;
  });
}

/** Money comes for one of the pages, whatever has become of it meanwhile. */
export function pays(model: SeatModel, child: number, at: number, now: string): void {
  const note = noteOf(model, child);
  const page = note.pages[at];
  if (!page || page.paid) return;
  page.paid = true;
  if (note.feeSettled) return;
  if (!page.live && note.state === "withdrawn") return;
  note.feeSettled = true;
  page.live = false;
  complete(note);
  if (note.state !== "withdrawn") return;
  settle(model, now);
  seatOrQueue(model, child, now);
}
