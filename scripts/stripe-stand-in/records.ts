import { z } from "zod";

/**
 * What the stand-in remembers. These are its own small records, not Stripe's objects: the makers turn them into
 * Stripe's shapes on the way out, and the same schemas read the state file back in.
 */

const metadata = z.record(z.string(), z.string());

const lineItemRecord = z.object({
  id: z.string(),
  priceId: z.string(),
  productId: z.string(),
  name: z.string(),
  description: z.string().nullable(),
  unitAmount: z.number().int(),
  quantity: z.number().int(),
});

const sessionRecord = z.object({
  id: z.string(),
  created: z.number().int(),
  expiresAt: z.number().int(),
  status: z.enum(["open", "complete", "expired"]),
  currency: z.string(),
  amountTotal: z.number().int(),
  lineItems: z.array(lineItemRecord),
  successUrl: z.string(),
  cancelUrl: z.string().nullable(),
  clientReferenceId: z.string().nullable(),
  customerEmail: z.string().nullable(),
  metadata,
  paymentIntentMetadata: metadata,
  paymentDescription: z.string().nullable(),
  paymentIntentId: z.string().nullable(),
});

const paymentIntentRecord = z.object({
  id: z.string(),
  created: z.number().int(),
  amount: z.number().int(),
  currency: z.string(),
  status: z.enum(["requires_payment_method", "succeeded", "canceled"]),
  canceledAt: z.number().int().nullable(),
  description: z.string().nullable(),
  metadata,
  paymentMethodId: z.string().nullable(),
  latestChargeId: z.string().nullable(),
});

const chargeRecord = z.object({
  id: z.string(),
  created: z.number().int(),
  paymentIntentId: z.string(),
  paymentMethodId: z.string(),
  amount: z.number().int(),
  amountRefunded: z.number().int(),
  currency: z.string(),
  status: z.enum(["succeeded", "failed"]),
  email: z.string().nullable(),
  description: z.string().nullable(),
  metadata,
});

const refundRecord = z.object({
  id: z.string(),
  created: z.number().int(),
  chargeId: z.string(),
  paymentIntentId: z.string(),
  amount: z.number().int(),
  currency: z.string(),
  reason: z.enum(["duplicate", "fraudulent", "requested_by_customer"]).nullable(),
  metadata,
});

const deliveryAttempt = z.object({
  at: z.string(),
  /** The receiver's answer, or null when nobody answered. */
  httpStatus: z.number().int().nullable(),
});

const eventRecord = z.object({
  id: z.string(),
  created: z.number().int(),
  type: z.string(),
  /** The exact text that is signed and sent: an event is a snapshot and never changes afterwards. */
  body: z.string(),
  delivery: z.enum(["held", "pending", "delivered", "given-up"]),
  attempts: z.array(deliveryAttempt),
});

const rememberedReply = z.object({
  key: z.string(),
  fingerprint: z.string(),
  created: z.number().int(),
  status: z.number().int(),
  body: z.string(),
});

export const stateSchema = z.object({
  sessions: z.array(sessionRecord),
  paymentIntents: z.array(paymentIntentRecord),
  charges: z.array(chargeRecord),
  refunds: z.array(refundRecord),
  events: z.array(eventRecord),
  rememberedReplies: z.array(rememberedReply),
});

export type LineItemRecord = z.infer<typeof lineItemRecord>;
export type SessionRecord = z.infer<typeof sessionRecord>;
export type PaymentIntentRecord = z.infer<typeof paymentIntentRecord>;
export type ChargeRecord = z.infer<typeof chargeRecord>;
export type RefundRecord = z.infer<typeof refundRecord>;
export type EventRecord = z.infer<typeof eventRecord>;
export type RememberedReply = z.infer<typeof rememberedReply>;
export type State = z.infer<typeof stateSchema>;
