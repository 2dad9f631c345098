import { dayInWords, hoursInWords, monthOf } from "@/lib/shared/dates";
import { moneyInWords } from "@/lib/shared/money";
import { sentence } from "@/lib/shared/words";
import { agesInWords, outingDay, roomInWords, roomOf, takesRegistrations, whenInWords, type Outing, type OutingState, type Room } from "./outing";

/** An outing as a list or a page shows it; nothing here is private. */
export type OutingView = {
  id: string;
  slug: string;
  title: string;
  theme: string;
  summary: string;
  siteName: string;
  ground: string;
  landManager: string;
  startsAt: string;
  endsAt: string;
  zone: string;
  month: string;
  day: string;
  dayInWords: string;
  hours: string;
  when: string;
  /** A whole sentence. */
  whenAndWhere: string;
  ages: string;
  youngestAge: number;
  oldestAge: number;
  fee: string;
  suggestedFeeCents: number;
  room: Room;
  roomInWords: string;
  waiting: number;
  seats: number;
  seatsFree: number;
  takesRegistrations: boolean;
  state: OutingState;
  calledOffBecause: string | null;
  modelIds: string[];
};

export function outingView(outing: Outing, now: string): OutingView {
  const { site } = outing;
  return {
    id: outing.id,
    slug: outing.slug,
    title: outing.title,
    theme: outing.theme,
    summary: outing.summary,
    siteName: site.name,
    ground: site.ground,
    landManager: site.landManager,
    startsAt: outing.startsAt,
    endsAt: outing.endsAt,
    zone: site.zone,
    month: monthOf(outing.startsAt, site.zone),
    day: outingDay(outing),
    dayInWords: dayInWords(outing.startsAt, site.zone),
    hours: hoursInWords(outing.startsAt, outing.endsAt, site.zone),
    when: whenInWords(outing),
    whenAndWhere: sentence(`${whenInWords(outing)}, ${site.name}`),
    ages: agesInWords(outing),
    youngestAge: outing.youngestAge,
    oldestAge: outing.oldestAge,
    fee: moneyInWords({ cents: outing.suggestedFeeCents, currency: outing.currency }),
    suggestedFeeCents: outing.suggestedFeeCents,
    room: roomOf(outing, now),
    roomInWords: roomInWords(outing, now),
    waiting: outing.waiting,
    seats: outing.seats,
    seatsFree: outing.seatsFree,
    takesRegistrations: takesRegistrations(outing, now),
    state: outing.state,
    calledOffBecause: outing.calledOffBecause,
    modelIds: outing.modelIds,
  };
}
