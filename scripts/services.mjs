import { isProgram, main } from "./main.mjs";
import { portsFromEnv, requireFree } from "./ports.mjs";
import { untilAnswers, whileAllRun } from "./processes.mjs";
import { ensureDependencies } from "./install.mjs";

/**
 * @typedef {import("./ports.mjs").Ports} Ports
 * @typedef {import("./processes.mjs").Processes} Processes
 * @typedef {import("./processes.mjs").Environment} Environment
 */

/** Of the stand-ins alone: never a secret of anybody's. */
export const standInSecrets = Object.freeze({
  STRIPE_SECRET_KEY: "sk_test_stand_in",
  STRIPE_WEBHOOK_SECRET: "whsec_stand_in",
});

/** Where the program receives what Stripe tells it. */
export const WEBHOOK_PATH = "/api/stripe/webhook";

/**
 * The two stand-ins as commands of Node, without the settings that differ between this machine and
 * a container. docker-compose.fake-services.yml runs the same, which a test checks.
 *
 * @param {Pick<Ports, "mail" | "smtp">} ports
 * @param {string} host the address to listen on
 */
export function standInArguments({ mail, smtp }, host) {
  return {
    mail: [
      ...["node_modules/maildev/dist/bin/maildev.js", "--smtp", String(smtp), "--web", String(mail)],
      ...["--ip", host, "--web-ip", host],
    ],
    stripe: ["--import", "tsx", "scripts/stripe-stand-in/main.ts"],
  };
}

/** @param {Ports} ports */
export const addressesOf = (ports) => ({
  app: `http://127.0.0.1:${ports.app}`,
  mail: `http://127.0.0.1:${ports.mail}`,
  mailApi: `http://127.0.0.1:${ports.mail}/api/email`,
  smtp: `smtp://127.0.0.1:${ports.smtp}`,
  stripe: `http://127.0.0.1:${ports.stripe}`,
});

/**
 * Starts the mail catcher and the payment stand-in, and waits until both answer.
 *
 * @param {Processes} processes
 * @param {Ports} ports
 * @param {{ output?: "prefixed" | "kept", env?: Environment }} [options] env: more for the payment stand-in
 */
export async function startStandIns(processes, ports, { output = "prefixed", env = {} } = {}) {
  const args = standInArguments(ports, "127.0.0.1");
  const addresses = addressesOf(ports);
  const mail = processes.start({ name: "mail", args: args.mail, output });
  const stripe = processes.start({
    name: "stripe",
    args: args.stripe,
    output,
    env: {
      ...process.env,
      ...standInSecrets,
      STRIPE_STAND_IN_PORT: String(ports.stripe),
      STRIPE_WEBHOOK_URL: `${addresses.app}${WEBHOOK_PATH}`,
      ...env,
    },
  });
  await Promise.all([untilAnswers(mail, addresses.mailApi), untilAnswers(stripe, addresses.stripe)]);
  return [mail, stripe];
}

/** What the program must know to use the stand-ins. @param {Ports} ports @returns {Environment} */
export function standInEnvironment(ports) {
  const addresses = addressesOf(ports);
  return {
    ...standInSecrets,
    PUBLIC_URL: addresses.app,
    PORT: String(ports.app),
    SMTP_URL: addresses.smtp,
    STRIPE_API_URL: addresses.stripe,
  };
}

if (isProgram(import.meta.url)) {
  await main(async (processes) => {
    await ensureDependencies(processes);
    const ports = portsFromEnv();
    await requireFree(ports, ["mail", "smtp", "stripe"]);
    const services = await startStandIns(processes, ports);
    const addresses = addressesOf(ports);
    console.log(`
The stand-ins are running; Ctrl-C stops them.
  Mail that was sent    ${addresses.mail}   (the program sends to ${addresses.smtp})
  Payments              ${addresses.stripe}   (tells ${addresses.app}${WEBHOOK_PATH} what happened)
`);
    await whileAllRun(services);
  });
}
