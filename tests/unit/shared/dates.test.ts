import { describe, expect, it } from "vitest";
import {
  ageOn, dayInWords, dayOf, hoursInWords, instantAt, isClockTime, isDay, isTimeZone, minutesLater, momentInWords, monthInWords, monthOf,
  plainDayInWords, timeInWords, timeOf,
} from "@/lib/shared/dates";

const losAngeles = "America/Los_Angeles";

/**
 * Summer time in the United States begins at 2 a.m. on the second Sunday of March and ends at 2 a.m. on the first
 * Sunday of November. Source: 15 U.S.C. 260a, https://www.law.cornell.edu/uscode/text/15/260a
 * 2027: 14 March and 7 November. Standard time is UTC-8, summer time UTC-7.
 */
describe("an instant at a place's wall clock", () => {
  it.each([
    ["2027-01-09", "09:00", "2027-01-09T17:00:00.000Z"],
    ["2027-07-10", "09:00", "2027-07-10T16:00:00.000Z"],
    ["2027-03-14", "01:59", "2027-03-14T09:59:00.000Z"],
    ["2027-03-14", "03:00", "2027-03-14T10:00:00.000Z"],
    ["2027-11-07", "00:59", "2027-11-07T07:59:00.000Z"],
    ["2027-11-07", "02:00", "2027-11-07T10:00:00.000Z"],
    ["2027-12-31", "23:59", "2028-01-01T07:59:00.000Z"],
    ["2028-02-29", "00:00", "2028-02-29T08:00:00.000Z"],
  ])("on %s at %s is %s", (day, time, instant) => {
    expect(instantAt(day, time, losAngeles)).toBe(instant);
    expect([dayOf(instant, losAngeles), timeOf(instant, losAngeles)]).toEqual([day, time]);
  });

  it("that the clock skips in March moves forward by the gap", () => {
    expect(instantAt("2027-03-14", "02:30", losAngeles)).toBe("2027-03-14T10:30:00.000Z");
    expect(timeOf("2027-03-14T10:30:00.000Z", losAngeles)).toBe("03:30");
  });

  it("that the clock shows twice in November is one of the two, and reads back as typed", () => {
    const instant = instantAt("2027-11-07", "01:30", losAngeles);
    expect(["2027-11-07T08:30:00.000Z", "2027-11-07T09:30:00.000Z"]).toContain(instant);
    expect(timeOf(instant, losAngeles)).toBe("01:30");
  });

  it("reads back as typed at every quarter of an hour of the year that the clock shows", () => {
    const lost: string[] = [];
    for (let at = Date.parse("2027-01-01T08:00:00Z"); at < Date.parse("2028-01-01T08:00:00Z"); at += 5 * 3_600_000 + 900_000) {
      const instant = new Date(at).toISOString();
      const [day, time] = [dayOf(instant, losAngeles), timeOf(instant, losAngeles)];
      const again = instantAt(day, time, losAngeles);
      if (again !== instant && day !== "2027-11-07") lost.push(`${instant} → ${again}`);
    }
    expect(lost).toEqual([]);
  });
});

describe("dates in words", () => {
  it("are in the place's own zone", () => {
    expect(dayInWords("2027-01-10T01:00:00.000Z", losAngeles)).toBe("Saturday 9 January 2027");
    expect(momentInWords("2027-01-09T17:00:00.000Z", losAngeles)).toBe("Saturday 9 January 2027, 9 a.m.");
    expect(monthOf("2027-02-01T07:59:00.000Z", losAngeles)).toBe("2027-01");
    expect(monthInWords("2027-01")).toBe("January 2027");
    expect(plainDayInWords("2015-03-28")).toBe("28 March 2015");
  });

  it.each([
    ["08:00", "12:00", "8 a.m. to noon"],
    ["12:30", "13:05", "12:30 p.m. to 1:05 p.m."],
    ["00:00", "00:30", "midnight to 12:30 a.m."],
    ["11:59", "23:00", "11:59 a.m. to 11 p.m."],
  ])("give the hours from %s to %s as %j", (from, to, words) => {
    const [start, end] = [instantAt("2027-01-09", from, losAngeles), instantAt("2027-01-09", to, losAngeles)];
    expect(hoursInWords(start, end, losAngeles)).toBe(words);
  });

  it("tell a quarter hour's zone apart as well", () => {
    expect(timeInWords("2027-01-09T00:00:00.000Z", "Asia/Kathmandu")).toBe("5:45 a.m.");
  });
});

describe("what is typed", () => {
  it.each(["2027-02-28", "2028-02-29", "2027-12-31"])("%s is a day", (typed) => expect(isDay(typed)).toBe(true));
  it.each(["2027-02-29", "2027-13-01", "2027-00-10", "27-01-09", "2027-1-9", "9.1.2027", "2027-01-09T00:00", ""])("%j is none", (typed) => {
    expect(isDay(typed)).toBe(false);
  });
  it.each(["00:00", "09:05", "23:59"])("%s is a time", (typed) => expect(isClockTime(typed)).toBe(true));
  it.each(["24:00", "9:05", "12:60", "noon", "", "09:05:00"])("%j is none", (typed) => expect(isClockTime(typed)).toBe(false));
  it("a time zone is one the machine knows", () => {
    expect([losAngeles, "UTC", "Heron/Spit", ""].map(isTimeZone)).toEqual([true, true, false, false]);
  });
});

describe("an age in whole years", () => {
  it.each([
    ["2016-06-15", "2027-06-14", 10],
    ["2016-06-15", "2027-06-15", 11],
    ["2016-02-29", "2027-02-28", 10],
    ["2016-02-29", "2027-03-01", 11],
    ["2016-02-29", "2028-02-28", 11],
    ["2016-02-29", "2028-02-29", 12],
    ["2016-12-31", "2027-01-01", 10],
    ["2027-01-09", "2027-01-09", 0],
    ["2027-01-10", "2027-01-09", -1],
  ])("of somebody born on %s is on %s: %i", (birthDate, day, age) => expect(ageOn(birthDate, day)).toBe(age));
});

it("minutes later may be earlier, and a day long across the change of the clock", () => {
  expect(minutesLater("2027-01-04T18:00:00.000Z", -60)).toBe("2027-01-04T17:00:00.000Z");
  expect(minutesLater("2027-03-14T09:59:00.000Z", 1)).toBe("2027-03-14T10:00:00.000Z");
});
