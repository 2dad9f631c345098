import { z } from "zod";
import { slugSchema } from "@/lib/outings/outing-schema";
import { isDay } from "@/lib/shared/dates";
import { listOf, ticked } from "@/lib/shared/typed";
import { answers, tasks } from "./helper";

export const askToHelpSchema = slugSchema.extend({
  personIds: listOf(z.string().max(60)).pipe(z.array(z.string()).min(1, "Choose at least one person to ask.")),
  task: z.enum(tasks, "Choose what you ask them to do."),
});

export const answerSchema = z.object({
  answerId: z.string().min(1).max(60),
  answer: z.enum(answers, "Choose yes, maybe or no."),
});

export const answerByLinkSchema = z.object({
  secret: z.string().min(20).max(100),
  answer: z.enum(answers, "Choose yes, maybe or no."),
});

export const abilitiesSchema = z.object({
  isAdult: ticked,
  guidesLeft: ticked,
  guidesRight: ticked,
  pushesChair: ticked,
  firstAid: ticked,
  drives: ticked,
});

export const clearanceSchema = z.object({
  personId: z.string().min(1).max(60),
  clearedUntil: z
    .string()
    .trim()
    .refine((typed) => typed === "" || isDay(typed), "Enter the last day of the clearance as year, month and day, or leave it empty.")
    .transform((typed) => (typed === "" ? null : typed)),
});
