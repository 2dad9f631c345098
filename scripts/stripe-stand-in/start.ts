import { createServer } from "node:http";
import type { Server } from "node:http";
import { expireSessionsThatAreDue } from "./checkout";
import { createClock } from "./clock";
import { createFaults } from "./faults";
import { jsonReply, send } from "./reply";
import { answerRequest } from "./router";
import type { StandIn } from "./stand-in";
import { openStore } from "./store";
import { createWebhooks } from "./webhooks";

export type StripeStandInOptions = {
  /** 0 takes any free port. */
  port?: number;
  host?: string;
  secretKey?: string;
  webhookSecret?: string;
  webhookUrl?: string;
  /** Where a browser reaches the stand-in; session.url begins with it. */
  publicUrl?: string;
  stateFile?: string | null;
  retryDelaysMs?: readonly number[];
  attemptTimeoutMs?: number;
  /** Takes a line about something that went wrong in the background. */
  report?: (line: string) => unknown;
};

export type RunningStripeStandIn = { url: string; port: number; close(): Promise<void> };

export const DEFAULTS = {
  host: "127.0.0.1",
  secretKey: "sk_test_stand_in",
  webhookSecret: "whsec_stand_in",
  webhookUrl: "http://127.0.0.1:3000/api/stripe/webhook",
};

// Six attempts within half a minute: long enough for a development server to start again, and then an end.
const RETRY_DELAYS_MS = [250, 1_000, 3_000, 8_000, 16_000];
const ATTEMPT_TIMEOUT_MS = 10_000;
const EXPIRY_CHECK_MS = 1_000;

/**
 * Starts the payment stand-in and resolves when it listens.
 * @throws when the port is taken, the state file is unreadable, or the key is one for real money
 */
export async function startStripeStandIn(options: StripeStandInOptions = {}): Promise<RunningStripeStandIn> {
  const secretKey = options.secretKey ?? DEFAULTS.secretKey;
  if (/^[a-z]+_live_/.test(secretKey)) throw new Error("The payment stand-in refuses a key for real money.");
  const host = options.host ?? DEFAULTS.host;
  const standIn = assemble(options, secretKey);
  const server = createServer((request, response) => {
    answerRequest(standIn, request)
      .catch((error: unknown) => {
        options.report?.(`The payment stand-in failed: ${String(error)}`);
        return jsonReply(500, { error: { type: "api_error", message: "The stand-in itself failed." } });
      })
      .then((reply) => send(response, reply));
  });
  const port = await listen(server, options.port ?? 0, host);
  const url = `http://${host === "0.0.0.0" ? "127.0.0.1" : host}:${port}`;
  standIn.publicUrl = (options.publicUrl ?? url).replace(/\/+$/, "");
  standIn.webhooks.resume();
  const expiry = setInterval(() => expireSessionsThatAreDue(standIn), EXPIRY_CHECK_MS);
  return { url, port, close: () => stop(server, standIn, expiry) };
}

function assemble(options: StripeStandInOptions, secretKey: string): StandIn {
  const store = openStore(options.stateFile ?? null);
  const report = options.report ?? (() => undefined);
  const webhooks = createWebhooks(store, {
    url: options.webhookUrl ?? DEFAULTS.webhookUrl,
    secret: options.webhookSecret ?? DEFAULTS.webhookSecret,
    retryDelaysMs: options.retryDelaysMs ?? RETRY_DELAYS_MS,
    attemptTimeoutMs: options.attemptTimeoutMs ?? ATTEMPT_TIMEOUT_MS,
    onGivenUp: (event) => report(`The webhook ${event.type} (${event.id}) was not taken. It can be redelivered.`),
  });
  return { secretKey, publicUrl: "", clock: createClock(), store, faults: createFaults(), webhooks };
}

function listen(server: Server, port: number, host: string): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, host, () => {
      server.off("error", reject);
      const address = server.address();
      resolve(typeof address === "object" && address !== null ? address.port : port);
    });
  });
}

async function stop(server: Server, standIn: StandIn, expiry: NodeJS.Timeout): Promise<void> {
  clearInterval(expiry);
  standIn.webhooks.close();
  await standIn.webhooks.settled();
  standIn.store.save();
  await new Promise<void>((resolve) => {
    server.close(() => resolve());
    server.closeAllConnections();
  });
}
