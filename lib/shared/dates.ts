import { TZDate, tz } from "@date-fns/tz";
import { format, isValid, parse } from "date-fns";

/**
 * Instants are ISO 8601 UTC text ("2027-01-09T17:00:00.000Z"); a day is "2027-01-09";
 * what people read is always in a place's own time zone (IANA name).
 */

export function dayOf(instant: string, zone: string): string {
  return format(new TZDate(instant, zone), "yyyy-MM-dd");
}

export function timeOf(instant: string, zone: string): string {
  return format(new TZDate(instant, zone), "HH:mm");
}

/** "Saturday 9 January 2027" */
export function dayInWords(instant: string, zone: string): string {
  return format(new TZDate(instant, zone), "EEEE d MMMM yyyy");
}

/** "9 January 2027" for a day without a time. */
export function plainDayInWords(day: string): string {
  return format(parse(day, "yyyy-MM-dd", new Date(0)), "d MMMM yyyy");
}

/** "9:00 a.m.", "noon", "12:30 p.m." */
export function timeInWords(instant: string, zone: string): string {
  const at = new TZDate(instant, zone);
  const clock = format(at, "H:mm");
  if (clock === "12:00") return "noon";
  if (clock === "0:00") return "midnight";
  const half = at.getHours() < 12 ? "a.m." : "p.m.";
  return `${format(at, at.getMinutes() === 0 ? "h" : "h:mm")} ${half}`;
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
  return format(new TZDate(instant, zone), "yyyy-MM");
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
