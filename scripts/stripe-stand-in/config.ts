import { z } from "zod";
import { DEFAULTS } from "./start";
import type { StripeStandInOptions } from "./start";

const webAddress = z.url({ protocol: /^https?$/, error: "is not a web address" });

const environment = z.object({
  STRIPE_STAND_IN_PORT: z
    .string()
    .regex(/^\d{1,5}$/, "is not a port number")
    .default("12111")
    .transform(Number),
  STRIPE_STAND_IN_HOST: z.string().default(DEFAULTS.host),
  STRIPE_SECRET_KEY: z.string().default(DEFAULTS.secretKey),
  STRIPE_WEBHOOK_SECRET: z.string().default(DEFAULTS.webhookSecret),
  STRIPE_WEBHOOK_URL: webAddress.default(DEFAULTS.webhookUrl),
  STRIPE_STAND_IN_PUBLIC_URL: webAddress.optional(),
  STRIPE_STAND_IN_STATE: z.string().optional(),
});

export type ConfigReading = { ok: true; options: StripeStandInOptions } | { ok: false; reason: string };

/** Reads the stand-in's settings; a variable set to nothing counts as not set. */
export function readConfig(variables: Record<string, string | undefined>): ConfigReading {
  const set = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== ""));
  const reading = environment.safeParse(set);
  if (!reading.success) {
    const reasons = reading.error.issues.map((issue) => `${issue.path.join(".")} ${issue.message}`);
    return { ok: false, reason: reasons.join("; ") };
  }
  const values = reading.data;
  const options: StripeStandInOptions = {
    port: values.STRIPE_STAND_IN_PORT,
    host: values.STRIPE_STAND_IN_HOST,
    secretKey: values.STRIPE_SECRET_KEY,
    webhookSecret: values.STRIPE_WEBHOOK_SECRET,
    webhookUrl: values.STRIPE_WEBHOOK_URL,
    publicUrl: values.STRIPE_STAND_IN_PUBLIC_URL,
    stateFile: values.STRIPE_STAND_IN_STATE ?? null,
  };
  return { ok: true, options };
}
