import path from "node:path";
import { z } from "zod";

/**
 * Everything the program reads from its surroundings, checked once.
 * A stand-in is never reached in production: starting there with one is refused.
 */
const schema = z.object({
  DATABASE_FILE: z.string().default(".data/dunlin.sqlite"),
  FILES_DIR: z.string().default(".data/files"),
  PUBLIC_URL: z.url().default("http://127.0.0.1:3000"),
  SMTP_URL: z.url().default("smtp://127.0.0.1:1025"),
  MAIL_FROM: z.string().default("Saltgrass Listening Club <outings@saltgrass.example>"),
  STRIPE_SECRET_KEY: z.string().default("sk_test_stand_in"),
  STRIPE_WEBHOOK_SECRET: z.string().default("whsec_stand_in"),
  STRIPE_API_URL: z.url().optional(),
  DUNLIN_ENV: z.enum(["demo", "test", "development", "production"]).default("production"),
  PROGRAMME_NAME: z.string().default("Saltgrass Listening Club"),
  PROGRAMME_PHONE: z.string().default("360 555 0142"),
  PROGRAMME_ZONE: z.string().default("America/Los_Angeles"),
  OUTBOX_SECONDS: z.coerce.number().positive().default(15),
});

export type Env = z.infer<typeof schema>;

export function readEnv(source: Record<string, string | undefined> = process.env): Env {
  const parsed = schema.safeParse(Object.fromEntries(Object.entries(source).filter(([, value]) => value !== "")));
  if (!parsed.success) throw new Error(`The configuration is not usable:\n${z.prettifyError(parsed.error)}`);
  const refusal = standInRefusal(parsed.data) ?? missingRefusal(parsed.data, source);
  if (refusal) throw new Error(refusal);
  return {
    ...parsed.data,
    DATABASE_FILE: path.resolve(/* turbopackIgnore: true */ process.cwd(), parsed.data.DATABASE_FILE),
    FILES_DIR: path.resolve(/* turbopackIgnore: true */ process.cwd(), parsed.data.FILES_DIR),
  };
}

/** Why this configuration may not run in production, or null. */
export function standInRefusal(env: Env): string | null {
  if (env.DUNLIN_ENV !== "production") return null;
  if (env.STRIPE_API_URL !== undefined) return standIn("STRIPE_API_URL", "unset it to reach Stripe itself");
  if (env.STRIPE_SECRET_KEY === "sk_test_stand_in") return standIn("STRIPE_SECRET_KEY", "set your own Stripe key");
  if (env.STRIPE_WEBHOOK_SECRET === "whsec_stand_in") return standIn("STRIPE_WEBHOOK_SECRET", "set your endpoint's secret");
  if (/^smtp:\/\/(127\.0\.0\.1|localhost):1025/.test(env.SMTP_URL)) return standIn("SMTP_URL", "set your mail server");
  return null;
}

/** What production has to be told, since the built-in value is a demo's. */
const needed = ["PUBLIC_URL", "MAIL_FROM", "PROGRAMME_NAME", "PROGRAMME_PHONE"] as const;

export function missingRefusal(env: Env, source: Record<string, string | undefined>): string | null {
  if (env.DUNLIN_ENV !== "production") return null;
  const missing = needed.filter((name) => !source[name]);
  if (missing.length > 0) return `Production needs ${missing.join(", ")}. See .env.example; for a trial run, set DUNLIN_ENV=demo.`;
  if (!env.PUBLIC_URL.startsWith("https:")) return "PUBLIC_URL has to begin with https: in production, or sign-ins could be read on the way.";
  const placeholder = [env.STRIPE_SECRET_KEY, env.STRIPE_WEBHOOK_SECRET].find((value) => value.includes("..."));
  return placeholder ? `${placeholder} is the example's text, not a secret of yours. Take the secrets from Stripe's dashboard.` : null;
}

function standIn(name: string, todo: string): string {
  return `${name} points to a stand-in, which production refuses: ${todo}. For a trial run, set DUNLIN_ENV=demo.`;
}

let current: Env | undefined;

export function env(): Env {
  current ??= readEnv();
  return current;
}
