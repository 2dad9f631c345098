import { z } from "zod";
import { invalidRequest } from "./api-error";
import type { FormFields } from "./form-encoding";

/**
 * The parameters the stand-in takes. Anything else is refused by name, as Stripe refuses what it does not know: a
 * misspelt parameter must not pass here and fail in production.
 */

const text = z.string().min(1, "empty");
const wholeNumber = z.string().regex(/^-?\d+$/, "Invalid integer").transform(Number);
const url = text.refine(isWebAddress, "Not a valid URL");
const expand = list(text).optional();
// The three limits are from memory of Stripe's pages on metadata: 50 keys, names of 40, values of 500 characters.
const metadata = z
  .record(z.string().max(40, "Metadata keys can have up to 40 characters."), z.string().max(500, "too long"))
  .refine((value) => Object.keys(value).length <= 50, "You can have up to 50 metadata keys.")
  // An empty value unsets a key; on a new object there is nothing to unset.
  .transform((value) => Object.fromEntries(Object.entries(value).filter(([, entry]) => entry !== "")));

const lineItem = z.strictObject({
  quantity: wholeNumber.refine((quantity) => quantity > 0, "This value must be greater than or equal to 1."),
  price_data: z.strictObject({
    currency: text.regex(/^[A-Za-z]{3}$/, "Invalid currency").transform((currency) => currency.toLowerCase()),
    unit_amount: wholeNumber.refine((amount) => amount >= 0, "This value must be greater than or equal to 0."),
    product_data: z.strictObject({ name: text.max(250, "too long"), description: text.optional() }),
  }),
});

export const createSessionParams = z.strictObject({
  mode: z.literal("payment", "The stand-in takes mode=payment only."),
  line_items: list(lineItem),
  success_url: url,
  cancel_url: url.optional(),
  client_reference_id: text.max(200, "too long").optional(),
  customer_email: text.regex(/^[^\s@]+@[^\s@]+\.[^\s@]+$/, "Invalid email address").optional(),
  metadata: metadata.optional(),
  payment_intent_data: z.strictObject({ metadata: metadata.optional(), description: text.optional() }).optional(),
  expires_at: wholeNumber.optional(),
  // Taken because they are usual, and without effect here: the hosted page is in English and has one way to pay.
  payment_method_types: list(z.literal("card", "The stand-in takes cards only.")).optional(),
  locale: text.optional(),
  submit_type: text.optional(),
  ui_mode: z.literal("hosted_page", "The stand-in has the hosted page only.").optional(),
  expand,
});
export type CreateSessionParams = z.infer<typeof createSessionParams>;

export const createRefundParams = z
  .strictObject({
    payment_intent: text.optional(),
    charge: text.optional(),
    amount: wholeNumber.refine((amount) => amount > 0, "This value must be greater than or equal to 1.").optional(),
    reason: z.enum(["duplicate", "fraudulent", "requested_by_customer"]).optional(),
    metadata: metadata.optional(),
    expand,
  })
  .refine(({ payment_intent, charge }) => payment_intent !== undefined || charge !== undefined, {
    message: "One of the following params should be provided for this request: payment_intent or charge.",
  });
export type CreateRefundParams = z.infer<typeof createRefundParams>;

export const onlyExpandParams = z.strictObject({ expand });

const created = z
  .union([
    wholeNumber,
    z.strictObject({
      gt: wholeNumber.optional(),
      gte: wholeNumber.optional(),
      lt: wholeNumber.optional(),
      lte: wholeNumber.optional(),
    }),
  ])
  .optional();

const page = {
  limit: wholeNumber.refine((limit) => limit >= 1 && limit <= 100, "Limit must be between 1 and 100.").optional(),
  starting_after: text.optional(),
  ending_before: text.optional(),
  expand,
};
export type PageParams = { limit?: number; starting_after?: string; ending_before?: string };
export type CreatedParam = z.infer<typeof created>;

export const listLineItemsParams = z.strictObject(page);

export const listSessionsParams = z.strictObject({
  ...page,
  created,
  payment_intent: text.optional(),
  status: z.enum(["open", "complete", "expired"]).optional(),
});

export const listRefundsParams = z.strictObject({
  ...page,
  created,
  payment_intent: text.optional(),
  charge: text.optional(),
});

export const listEventsParams = z.strictObject({
  ...page,
  created,
  type: text.optional(),
  types: list(text).optional(),
});

/**
 * @throws ApiError (400) that names the first parameter at fault the way Stripe does
 */
export function readParams<T extends z.ZodType>(schema: T, fields: FormFields): z.output<T> {
  const reading = schema.safeParse(fields);
  if (reading.success) return reading.data;
  const [issue] = reading.error.issues;
  throw issue === undefined ? invalidRequest("The parameters cannot be read.") : refusalOf(issue, fields);
}

function refusalOf(issue: z.core.$ZodIssue, fields: FormFields) {
  if (issue.code === "unrecognized_keys") {
    const param = bracketed([...issue.path, ...issue.keys.slice(0, 1)]);
    return invalidRequest(`Received unknown parameter: ${param}`, { code: "parameter_unknown", param });
  }
  const param = bracketed(issue.path);
  if (param === "") return invalidRequest(issue.message);
  if (valueAt(fields, issue.path) === undefined) {
    return invalidRequest(`Missing required param: ${param}.`, { code: "parameter_missing", param });
  }
  if (issue.message === "empty") {
    const message = `You passed an empty string for '${param}', which cannot be unset.`;
    return invalidRequest(message, { code: "parameter_invalid_empty", param });
  }
  return invalidRequest(`Invalid ${param}: ${issue.message}`, { param });
}

function valueAt(fields: FormFields, path: readonly PropertyKey[]): unknown {
  let here: unknown = fields;
  for (const part of path) {
    if (typeof here !== "object" || here === null) return undefined;
    here = Reflect.get(here, part);
  }
  return here;
}

function bracketed(path: readonly PropertyKey[]): string {
  const [first, ...rest] = path.map(String);
  return first === undefined ? "" : first + rest.map((part) => `[${part}]`).join("");
}

/** Fields named 0, 1, 2 … as a list; at most 100, Stripe's own bound for line items. */
function list<T extends z.ZodType>(item: T) {
  return z.preprocess(asList, z.array(item).min(1, "empty").max(100, "At most 100 are allowed."));
}

function asList(value: unknown): unknown {
  if (typeof value !== "object" || value === null) return value;
  const entries = Object.entries(value).sort(([a], [b]) => Number(a) - Number(b));
  return entries.every(([name], index) => name === String(index)) ? entries.map(([, entry]) => entry) : value;
}

function isWebAddress(value: string): boolean {
  return URL.canParse(value) && /^https?:$/.test(new URL(value).protocol);
}
