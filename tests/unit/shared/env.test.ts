import path from "node:path";
import { describe, expect, it } from "vitest";
import { readEnv } from "@/lib/shared/env";

const live = {
  DUNLIN_ENV: "production", STRIPE_SECRET_KEY: "sk_live_1", STRIPE_WEBHOOK_SECRET: "whsec_1", SMTP_URL: "smtps://mail.example.org:465",
  PUBLIC_URL: "https://outings.example.org", MAIL_FROM: "Club <outings@example.org>", PROGRAMME_NAME: "Club", PROGRAMME_PHONE: "360 555 0142",
};

describe("the configuration of a production", () => {
  it("is usable without any stand-in", () => expect(readEnv(live).DUNLIN_ENV).toBe("production"));

  it.each([
    ["STRIPE_API_URL", "http://127.0.0.1:12111"],
    ["STRIPE_SECRET_KEY", undefined],
    ["STRIPE_SECRET_KEY", ""],
    ["STRIPE_WEBHOOK_SECRET", undefined],
    ["SMTP_URL", undefined],
    ["SMTP_URL", "smtp://localhost:1025"],
  ])("is refused with a stand-in for %s (%s), and the refusal names it", (name, value) => {
    expect(() => readEnv({ ...live, [name]: value })).toThrow(name);
  });

  it.each(["PUBLIC_URL", "MAIL_FROM", "PROGRAMME_NAME", "PROGRAMME_PHONE"])("is refused without %s of its own", (name) => {
    expect(() => readEnv({ ...live, [name]: undefined })).toThrow(name);
  });

  it("is what is meant when nothing says otherwise, so that a stand-in never slips in", () => {
    expect(() => readEnv({})).toThrow("production refuses");
  });
});

describe("the configuration of a trial run", () => {
  it.each(["demo", "test", "development"])("(%s) needs nothing at all", (DUNLIN_ENV) => {
    const env = readEnv({ DUNLIN_ENV });
    expect(env).toMatchObject({ SMTP_URL: "smtp://127.0.0.1:1025", PROGRAMME_ZONE: "America/Los_Angeles", OUTBOX_SECONDS: 15 });
    expect(path.isAbsolute(env.DATABASE_FILE)).toBe(true);
  });

  it.each([["PUBLIC_URL", "dunlin"], ["SMTP_URL", "mail"], ["OUTBOX_SECONDS", "-1"], ["DUNLIN_ENV", "staging"]])("with %s=%s says what is wrong", (name, value) => {
    expect(() => readEnv({ DUNLIN_ENV: "test", [name]: value })).toThrow(name);
  });
});
