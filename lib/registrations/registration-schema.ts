import { z } from "zod";
import { accessProfileSchema } from "@/lib/families/family-schema";
import { slugSchema } from "@/lib/outings/outing-schema";
import { guardianPlans } from "./registration";

export const registrationIdSchema = z.object({ registrationId: z.string().min(1).max(60) });

export const registerChildSchema = slugSchema.extend({
  participantId: z.string("Choose a child.").min(1, "Choose a child.").max(60),
});

export const confirmNeedsSchema = registrationIdSchema
  .extend({
    guardianStays: z.enum(guardianPlans, "Choose what you will do on the day."),
    thisTime: z.string().trim().max(1000, "Shorten this to 1,000 letters or fewer.").default(""),
  })
  .and(accessProfileSchema);

/** Giving a seat away asks for a second look, since somebody else may get it at once. */
export const withdrawSchema = registrationIdSchema.extend({ sure: z.literal("yes", "Tick the box to give the seat back.") });
