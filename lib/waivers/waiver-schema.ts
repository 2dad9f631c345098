import { z } from "zod";
import { nameField } from "@/lib/people/person-schema";
import { registrationIdSchema } from "@/lib/registrations/registration-schema";
import { isDay } from "@/lib/shared/dates";

export const signWaiverSchema = registrationIdSchema.extend({
  textSha256: z.string().length(64),
  typedName: nameField,
  typedDate: z.string().trim().refine(isDay, "Enter today's date as year, month and day, such as 2027-01-09."),
  agree: z.literal("yes", "Tick the box to say that you are the legal guardian and agree."),
});
