import { z } from "zod";
import { mayBeOnPaper } from "@/lib/roster/never-on-paper";
import { nameField, phoneField } from "@/lib/people/person-schema";
import { isDay } from "@/lib/shared/dates";
import { listOf } from "@/lib/shared/typed";
import {
  chairMoves,
  guideHolds,
  guideSides,
  guideTimes,
  readingFormats,
  restAfter,
  transfers,
  travelTools,
} from "./access-profile";
import { supportLevels } from "@/lib/cover/support-level";

const relationship = z.string().trim().max(60, "Shorten this to 60 letters or fewer.");

const contact = z.object({ name: nameField, relationship, phone: phoneField });
const pickUpPerson = z.object({ name: nameField, relationship });

/** A row that was left empty is null, not an error; its place in the form stays, so that errors find their row. */
function rowsOf(raw: unknown): unknown {
  if (typeof raw !== "object" || raw === null) return [];
  return Object.values(raw).map((row: unknown) => (isBlank(row) ? null : row));
}

function isBlank(row: unknown): boolean {
  return typeof row !== "object" || row === null || Object.values(row).every((value) => typeof value !== "string" || value.trim() === "");
}

function rows<Row extends z.ZodType>(row: Row, most: number, needed: string) {
  return z
    .preprocess(rowsOf, z.array(row.nullable()).max(most))
    .transform((all) => all.filter((one) => one !== null))
    .refine((filled) => filled.length > 0, needed);
}

export const accessProfileSchema = z
  .object({
    travel: listOf(z.enum(travelTools)).pipe(z.array(z.enum(travelTools)).min(1, "Choose at least one way of getting around.")),
    chair: z.enum(chairMoves).nullish().or(z.literal("").transform(() => null)).transform((value) => value ?? null),
    transfer: z.enum(transfers).nullish().or(z.literal("").transform(() => null)).transform((value) => value ?? null),
    restAfter: z.enum(restAfter, "Choose how long before a sit-down is good."),
    guideWhen: listOf(z.enum(guideTimes)).pipe(z.array(z.enum(guideTimes)).min(1, "Choose when a guide is welcome, or choose not needed.")),
    guideSide: z.enum(guideSides).optional(),
    guideHold: z.enum(guideHolds).optional(),
    support: z.enum(supportLevels, "Choose how much help makes a good day."),
    reading: z.enum(readingFormats, "Choose how your child reads."),
    leaderNote: z
      .string()
      .trim()
      .max(120, "Shorten the note to 120 letters or fewer: it has to fit on a roster.")
      .default("")
      .refine(mayBeOnPaper, "This sounds like a reason or a private fact, which never stands on a roster. Write what to do, such as shade every 20 minutes, and call us about the rest."),
    photo: z.enum(["yes", "no"], "Choose yes or no."),
    voice: z.enum(["yes", "no"], "Choose yes or no."),
    contacts: rows(contact, 3, "Enter at least one person we can call."),
    pickUp: rows(pickUpPerson, 4, "Enter at least one person who may collect your child."),
  })
  .superRefine((profile, ctx) => {
    const wanted = (name: string, message: string) => ctx.addIssue({ code: "custom", path: [name], message });
    if (profile.travel.includes("wheelchair") && !profile.chair) wanted("chair", "Choose how the chair moves.");
    if (profile.travel.includes("wheelchair") && !profile.transfer) wanted("transfer", "Choose how moving to a vehicle seat works.");
    if (profile.guideWhen.includes("not needed")) {
      if (profile.guideWhen.length > 1) wanted("guideWhen", "Choose either not needed, or when a guide is welcome.");
      return;
    }
    if (!profile.guideSide) wanted("guideSide", "Choose an arm of the guide, or either.");
    if (!profile.guideHold) wanted("guideHold", "Choose how the guide is held.");
  })
  .transform((profile) => ({
    ...profile,
    guideSide: profile.guideSide ?? "either",
    guideHold: profile.guideHold ?? "above the elbow",
    ...(profile.travel.includes("wheelchair") ? {} : { chair: null, transfer: null }),
  }));

export const birthDateField = z
  .string()
  .trim()
  .refine(isDay, "Enter the date of birth as year, month and day, such as 2015-03-28.");

export const addChildSchema = z.object({
  nameUsed: nameField,
  legalName: nameField,
  birthDate: birthDateField,
  requestId: z.string().min(8).max(60),
});

export const participantIdSchema = z.object({ participantId: z.string().min(1).max(60) });

export const writeProfileSchema = participantIdSchema.and(accessProfileSchema);
