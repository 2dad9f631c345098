import { createServer } from "node:net";
import { CannotGoOn } from "./cannot-go-on.mjs";

/**
 * The one place where the port numbers stand: the scripts read them from here, and a test holds
 * docker-compose.fake-services.yml and .env.example against them.
 *
 * @typedef {{ app: number, mail: number, smtp: number, stripe: number }} Ports
 * @type {Readonly<Ports>}
 */
export const ports = Object.freeze({ app: 3000, mail: 1080, smtp: 1025, stripe: 12111 });

/** @type {Readonly<Record<keyof Ports, string>>} */
export const portVariables = Object.freeze({
  app: "PORT",
  mail: "MAIL_PORT",
  smtp: "SMTP_PORT",
  stripe: "STRIPE_STAND_IN_PORT",
});

/** @returns {(keyof Ports)[]} */
const portNames = () => /** @type {(keyof Ports)[]} */ (Object.keys(ports));

/**
 * The usual ports, each of which an environment variable may change.
 *
 * @param {Record<string, string | undefined>} [env]
 * @returns {Ports}
 */
export function portsFromEnv(env = process.env) {
  const chosen = { ...ports };
  for (const name of portNames()) {
    const text = env[portVariables[name]];
    if (text === undefined || text === "") continue;
    if (!/^\d{1,5}$/.test(text) || Number(text) < 1 || Number(text) > 65535) {
      throw new CannotGoOn(`${portVariables[name]} is "${text}", but a port is a number from 1 to 65535.`);
    }
    chosen[name] = Number(text);
  }
  return chosen;
}

/** Ports nobody uses, for runs that may happen beside another one. @returns {Promise<Ports>} */
export async function freePorts() {
  // Held open together, so that the same number cannot be handed out twice.
  const held = await Promise.all(portNames().map(() => listen(0)));
  const numbers = held.map((server) => portOf(server));
  await Promise.all(held.map(close));
  const [app = 0, mail = 0, smtp = 0, stripe = 0] = numbers;
  return { app, mail, smtp, stripe };
}

/** @param {number} port */
export async function isFree(port) {
  try {
    await close(await listen(port));
    return true;
  } catch {
    return false;
  }
}

/**
 * Refuses to start over another program, and says which variable gives another port.
 *
 * @param {Ports} wanted
 * @param {(keyof Ports)[]} [names] only these
 */
export async function requireFree(wanted, names = portNames()) {
  /** @type {(keyof Ports)[]} */
  const busy = [];
  for (const name of names) if (!(await isFree(wanted[name]))) busy.push(name);
  if (busy.length === 0) return;
  const free = await freePorts();
  throw new CannotGoOn(
    busy
      .map((name) => {
        const variable = portVariables[name];
        const advice = `set ${variable} to a free one, for example ${variable}=${free[name]}`;
        return `Port ${wanted[name]} is in use by another program: ${advice}.`;
      })
      .join("\n"),
  );
}

/** @param {number} port @returns {Promise<import("node:net").Server>} */
function listen(port) {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once("error", reject);
    server.listen(port, "127.0.0.1", () => resolve(server));
  });
}

/** @param {import("node:net").Server} server */
function portOf(server) {
  const address = server.address();
  if (address === null || typeof address === "string") throw new Error("a listening socket has no port");
  return address.port;
}

/** @param {import("node:net").Server} server @returns {Promise<void>} */
function close(server) {
  return new Promise((resolve) => server.close(() => resolve()));
}
