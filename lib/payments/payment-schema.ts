import { z } from "zod";
import { registrationIdSchema } from "@/lib/registrations/registration-schema";
import { centsFromTyped } from "@/lib/shared/money";

/** The card network's smallest payment in US dollars. Source: Stripe, "Minimum charge amounts" (0.50 USD). */
export const smallestPaymentCents = 50;
const largestPaymentCents = 100_000;

export const chooseFeeSchema = registrationIdSchema
  .extend({
    choice: z.enum(["suggested", "other", "no fee"], "Choose one of the three."),
    otherAmount: z.string().trim().max(20, "Enter an amount in dollars, such as 12 or 12.50.").default(""),
  })
  .superRefine(({ choice, otherAmount }, ctx) => {
    if (choice !== "other") return;
    const cents = centsFromTyped(otherAmount);
    const problem =
      cents === null
        ? "Enter an amount in dollars, such as 12 or 12.50."
        : cents < smallestPaymentCents
          ? "A card payment is 0.50 dollars or more. For less, choose a no-fee place."
          : cents > largestPaymentCents
            ? "Enter 1,000 dollars or less. Call us about larger gifts."
            : null;
    if (problem) ctx.addIssue({ code: "custom", path: ["otherAmount"], message: problem });
  });

export const attachCheckoutSchema = z.object({
  paymentId: z.string().min(1),
  sessionId: z.string().min(1),
  url: z.url(),
});

/** What the payment service says of a checkout, checked at the edge before it is believed. */
export const checkoutPaidSchema = z.object({
  eventId: z.string().min(1),
  eventType: z.string().min(1),
  sessionId: z.string().min(1),
  paymentIntentId: z.string().nullable(),
  amountCents: z.number().int(),
  currency: z.string(),
});
