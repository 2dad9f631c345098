import { TZDate, tz } from "@date-fns/tz";
import { format, isValid, parse } from "date-fns";

/**
 * Instants are ISO 8601 UTC text ("2027-01-09T17:00:00.000Z"); a day is "2027-01-09";
 * what people read is always in a place's own time zone (IANA name).
 */

type WallClock = { weekday: string; year: string; month: string; monthName: string; day: string; hour: number; minute: string };

const clocks = new Map<string, { numbers: Intl.DateTimeFormat; names: Intl.DateTimeFormat }>();

/** What a clock and a calendar on the wall of a zone show. One formatter a zone is kept: making one takes longest. */
function wallClock(instant: string, zone: string): WallClock {
  let clock = clocks.get(zone);
  if (!clock) {
    const digits = { year: "numeric", month: "2-digit", day: "2-digit", hour: "2-digit", minute: "2-digit" } as const;
    clock = {
      numbers: new Intl.DateTimeFormat("en-US", { timeZone: zone, hourCycle: "h23", ...digits }),
      names: new Intl.DateTimeFormat("en-US", { timeZone: zone, weekday: "long", month: "long" }),
    };
    clocks.set(zone, clock);
  }
  const at = new Date(instant);
  const shown: Partial<Record<Intl.DateTimeFormatPartTypes, string>> = {};
  for (const { type, value } of clock.numbers.formatToParts(at)) shown[type] = value;
  const named: Partial<Record<Intl.DateTimeFormatPartTypes, string>> = {};
  for (const { type, value } of clock.names.formatToParts(at)) named[type] = value;
  const { year = "", month = "", day = "", hour = "", minute = "" } = shown;
  const { weekday = "", month: monthName = "" } = named;
  return { weekday, year: year.padStart(4, "0"), month, monthName, day, hour: Number(hour), minute };
}

export function dayOf(instant: string, zone: string): string {
  const { year, month, day } = wallClock(instant, zone);
  return `${year}-${month}-${day}`;
}

export function timeOf(instant: string, zone: string): string {
  const { hour, minute } = wallClock(instant, zone);
  return `${String(hour).padStart(2, "0")}:${minute}`;
}

/** "Saturday 9 January 2027" */
export function dayInWords(instant: string, zone: string): string {
  const { weekday, day, monthName, year } = wallClock(instant, zone);
  return `${weekday} ${Number(day)} ${monthName} ${year}`;
}

/** "9 January 2027" for a day without a time. */
export function plainDayInWords(day: string): string {
  return format(parse(day, "yyyy-MM-dd", new Date(0)), "d MMMM yyyy");
}

/** "9:00 a.m.", "noon", "12:30 p.m." */
export function timeInWords(instant: string, zone: string): string {
  const { hour, minute } = wallClock(instant, zone);
  if (minute === "00" && hour === 12) return "noon";
  if (minute === "00" && hour === 0) return "midnight";
  const onTwelve = hour % 12 === 0 ? 12 : hour % 12;
  return `${onTwelve}${minute === "00" ? "" : `:${minute}`} ${hour < 12 ? "a.m." : "p.m."}`;
}

/** "9 a.m. to noon" */
export function hoursInWords(start: string, end: string, zone: string): string {
  return `${timeInWords(start, zone)} to ${timeInWords(end, zone)}`;
}

/** "Saturday 9 January 2027, 9 a.m." */
export function momentInWords(instant: string, zone: string): string {
  return `${dayInWords(instant, zone)}, ${timeInWords(instant, zone)}`;
}

/** "2027-01" for grouping, and "January 2027" for the heading. */
export function monthOf(instant: string, zone: string): string {
  return dayOf(instant, zone).slice(0, 7);
}

export function monthInWords(month: string): string {
  return format(parse(month, "yyyy-MM", new Date(0)), "MMMM yyyy");
}

export function isDay(typed: string): boolean {
  return /^\d{4}-\d{2}-\d{2}$/.test(typed) && isValid(parse(typed, "yyyy-MM-dd", new Date(0)));
}

export function isClockTime(typed: string): boolean {
  return /^([01]\d|2[0-3]):[0-5]\d$/.test(typed);
}

/**
 * The instant at which a wall clock in `zone` shows `day` and `time`.
 * A time skipped by the start of summer time moves forward by the gap, as wall clocks do.
 */
export function instantAt(day: string, time: string, zone: string): string {
  const at = parse(`${day} ${time}`, "yyyy-MM-dd HH:mm", new TZDate(2000, 0, 1, zone), { in: tz(zone) });
  return new Date(at.getTime()).toISOString();
}

/** Whole years completed on `day`; someone born on 29 February has the birthday on 1 March in other years. */
export function ageOn(birthDay: string, day: string): number {
  const [birthYear = 0, birthMonth = 0, birthDate = 0] = birthDay.split("-").map(Number);
  const [year = 0, month = 0, date = 0] = day.split("-").map(Number);
  const hadBirthday = month > birthMonth || (month === birthMonth && date >= birthDate);
  return year - birthYear - (hadBirthday ? 0 : 1);
}

export function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat("en", { timeZone: name });
    return true;
  } catch {
    return false;
  }
}

export function minutesLater(instant: string, minutes: number): string {
  return new Date(Date.parse(instant) + minutes * 60_000).toISOString();
}
