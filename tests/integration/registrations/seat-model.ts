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

export function registers(model: SeatModel, child: number, now: string): void {
  settle(model, now);
  const note = noteOf(model, child);
  if (note.state === "held" || note.state === "waiting" || note.state === "confirmed") return;
  seatOrQueue(model, child, now);
}

function seatOrQueue(model: SeatModel, child: number, now: string): void {
  if (model.queue.length === 0 && freeSeats(model) > 0) return hold(model, child, minutesLater(now, holdMinutes));
  noteOf(model, child).state = "waiting";
  model.queue.push(child);
}

export function withdraws(model: SeatModel, child: number, now: string): void {
  const note = noteOf(model, child);
  if (note.state === "none" || note.state === "withdrawn") return;
  note.state = "withdrawn";
  model.queue = model.queue.filter((one) => one !== child);
  for (const page of note.pages) page.live = false;
  settle(model, now);
}

export function saysNeeds(model: SeatModel, child: number): void {
  const note = noteOf(model, child);
  if (note.state === "none" || note.state === "withdrawn") return;
  note.needs = true;
  complete(note);
}

export function signs(model: SeatModel, child: number): void {
  const note = noteOf(model, child);
  if (note.state === "none" || note.state === "withdrawn") return;
  note.signed = true;
  complete(note);
}

export function takesNoFee(model: SeatModel, child: number): void {
  const note = noteOf(model, child);
  if (note.state !== "held" || note.feeSettled) return;
  for (const page of note.pages) page.live = false;
  note.feeSettled = true;
  complete(note);
}

/** A new page for this amount, unless the last one is still open for the same. */
export function opensPage(model: SeatModel, child: number, amountCents: number, now: string): void {
  const note = noteOf(model, child);
  if (note.state !== "held" || note.feeSettled) return;
  const last = note.pages.find((page) => page.live);
  if (last && last.amountCents === amountCents && minutesLater(last.openedAt, checkoutMinutes - 5) > now) return;
  if (last) last.live = false;
  note.pages.push({ amountCents, openedAt: now, live: true, paid: false });
  const until = minutesLater(now, checkoutMinutes + 5);
  if (note.until < until) note.until = until;
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
  if (freeSeats(model) > 0) return hold(model, child, minutesLater(now, holdMinutes));
  note.state = "waiting";
  model.queue.push(child);
}
