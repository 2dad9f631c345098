import { z } from "zod";
import { isClockTime, isDay, isTimeZone } from "@/lib/shared/dates";
import { centsFromTyped } from "@/lib/shared/money";
import { listOf } from "@/lib/shared/typed";

const day = z.string().trim().refine(isDay, "Enter a date as year, month and day, such as 2027-01-09.");
const clock = z.string().trim().refine(isClockTime, "Enter a time on the 24-hour clock, such as 09:00 or 15:30.");
const text = (what: string, most: number) =>
  z.string().trim().min(1, `Enter ${what}.`).max(most, `Shorten ${what} to ${most} letters or fewer.`);
/** One line: it stands in headings and in the subjects of mails. */
const line = (what: string, most: number) => text(what, most).refine((typed) => !/\p{Cc}/u.test(typed), `Write ${what} on one line.`);
const whole = (what: string, least: number, most: number) =>
  z.coerce
    .number(`Enter ${what} as a number.`)
    .int(`Enter ${what} as a whole number.`)
    .min(least, `Enter ${least} or more.`)
    .max(most, `Enter ${most} or less.`);

export const amountTyped = z
  .string()
  .trim()
  .transform((typed, ctx) => {
    const cents = centsFromTyped(typed === "" ? "0" : typed);
    if (cents !== null && cents <= 1_000_000) return cents;
    ctx.addIssue({ code: "custom", message: "Enter an amount in dollars, such as 12 or 12.50." });
    return z.NEVER;
  });

const outingFields = {
  title: line("a title", 100),
  theme: line("the sound or theme of the day", 120),
  summary: text("what the day is like", 2000),
  siteId: z.string().min(1, "Choose a site."),
  day,
  startTime: clock,
  endTime: clock,
  seats: whole("the number of seats", 1, 60),
  youngestAge: whole("the youngest age", 3, 21),
  oldestAge: whole("the oldest age", 3, 21),
  suggestedFee: amountTyped.refine((cents) => cents === 0 || cents >= 50, "Enter 0, or 0.50 dollars or more: a card payment cannot be smaller."),
  policyId: z.string().min(1, "Choose a policy."),
  meetingText: text("the meeting-point instructions", 6000),
  modelIds: listOf(z.string().max(60)),
};

type Hours = { startTime: string; endTime: string; youngestAge: number; oldestAge: number };

function refineOuting(value: Hours, ctx: z.RefinementCtx) {
  if (value.endTime <= value.startTime) {
    ctx.addIssue({ code: "custom", path: ["endTime"], message: "Enter an end that is later than the start." });
  }
  if (value.oldestAge < value.youngestAge) {
    ctx.addIssue({ code: "custom", path: ["oldestAge"], message: "Enter an oldest age that is not below the youngest." });
  }
}

export const planOutingSchema = z.object({ ...outingFields, requestId: z.string().min(8).max(60) }).superRefine(refineOuting);

export const changeOutingSchema = z
  .object({ ...outingFields, slug: z.string(), edition: z.coerce.number().int() })
  .superRefine(refineOuting);

export const addSiteSchema = z.object({
  name: line("the site's name", 100),
  landManager: line("who manages the land", 120),
  zone: z.string().trim().refine(isTimeZone, "Enter a time zone by its IANA name, such as America/Los_Angeles."),
  ground: line("what is underfoot", 200),
  meetingPoint: line("the meeting point in a sentence", 300),
});

export const slugSchema = z.object({ slug: z.string().min(1).max(80) });

export const callOffSchema = slugSchema.extend({
  because: line("the reason, in a sentence families will read", 500),
});

const instantOrDay = z.union(
  [z.iso.datetime({ offset: true }), day],
  "Give a day such as 2027-01-09, or an instant such as 2027-01-09T17:00:00Z.",
);

export const rangeSchema = z
  .object({ from: instantOrDay, to: instantOrDay })
  .refine(({ from, to }) => Date.parse(from) < Date.parse(to), "The start of the range must be before its end.")
  .refine(({ from, to }) => Date.parse(to) - Date.parse(from) <= 400 * 86_400_000, "Ask for 400 days or fewer at a time.");
