import { z } from "zod";
import { roles } from "@/lib/shared/actor";
import { readingFormats, sameEmail } from "./person";

export const nameField = z
  .string()
  .trim()
  .min(1, "Enter a name.")
  .max(120, "Shorten the name to 120 letters or fewer.")
  .refine((name) => !/[\u0000-\u001f\u007f]/.test(name), "Enter the name on one line.");

export const emailField = z
  .string()
  .transform(sameEmail)
  .pipe(z.email("Enter an e-mail address like name@example.org.").max(200, "Use an e-mail address under 200 letters."));

export const phoneField = z
  .string()
  .trim()
  .regex(/^[+\d][\d\s().-]{6,24}$/, "Enter a phone number with area code, such as 360 555 0100.");

export const optionalPhoneField = z.union([z.literal("").transform(() => null), phoneField]).nullish().transform((v) => v ?? null);

export const passwordField = z
  .string()
  .min(10, "Use at least 10 characters. Several words in a row are easy to keep.")
  .max(200, "Use 200 characters or fewer.");

export const signUpSchema = z.object({
  name: nameField,
  email: emailField,
  phone: optionalPhoneField,
  password: passwordField,
  /** Where the sign-up began, to go on there. */
  back: z.string().max(300).default(""),
});

export const signInSchema = z.object({
  email: emailField,
  password: z.string().min(1, "Enter your password, or ask for a link by e-mail instead.").max(200, "That is longer than any password here."),
});

export const askForLinkSchema = z.object({ linkEmail: emailField });

export const secretSchema = z.object({ secret: z.string().min(20).max(100) });

export const acceptInvitationSchema = secretSchema.extend({ name: nameField, password: passwordField });

export const inviteSchema = z.object({
  name: nameField,
  email: emailField,
  role: z.enum(roles, "Choose what this person will do."),
});

export const readingSchema = z.object({
  readingFormat: z.enum(readingFormats, "Choose how you read."),
  textSizePt: z.coerce.number("Enter a number.").int("Enter a whole number.").min(14, "Enter 14 or more.").max(36, "Enter 36 or less."),
});
