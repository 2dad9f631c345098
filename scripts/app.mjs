import { readdirSync, statSync } from "node:fs";
import path from "node:path";
import { CannotGoOn } from "./cannot-go-on.mjs";
import { untilAnswers } from "./processes.mjs";
import { inRoot } from "./root.mjs";
import { addressesOf } from "./services.mjs";

/**
 * @typedef {import("./processes.mjs").Processes} Processes
 * @typedef {import("./processes.mjs").Environment} Environment
 * @typedef {import("./ports.mjs").Ports} Ports
 */

export const NEXT = "node_modules/next/dist/bin/next";

/** Everything a build is made from. */
const SOURCES = [
  ...["app", "components", "lib", "db", "emails", "fonts", "public", "proxy.ts", "instrumentation.ts"],
  ...["next.config.mjs", "postcss.config.mjs", "tailwind.config.ts", "tsconfig.json", "package-lock.json"],
];

/**
 * The environment every command of Next gets: which mode it runs in, it decides itself.
 *
 * @param {Environment} [env]
 * @returns {Environment}
 */
export function nextEnvironment(env = {}) {
  return { ...process.env, NODE_ENV: undefined, NEXT_TELEMETRY_DISABLED: "1", ...env };
}

/** Builds the program if a source is newer than the last build. @param {Processes} processes */
export async function ensureBuild(processes) {
  const built = changedAt(inRoot(".next", "BUILD_ID"));
  if (built > 0 && SOURCES.every((source) => newestIn(inRoot(source)) <= built)) return;
  console.log("Building the program (a quarter of a minute) …");
  const { ok, lastLines } = await processes.run({
    name: "build",
    args: [NEXT, "build"],
    env: nextEnvironment(),
    output: "kept",
  });
  if (!ok) throw new CannotGoOn(`The build did not succeed:\n${lastLines}`);
}

/**
 * Starts the built program and waits until it says that it is well.
 *
 * @param {Processes} processes
 * @param {Ports} ports
 * @param {{ env: Environment, output?: "prefixed" | "kept" }} options
 */
export async function startApp(processes, ports, { env, output = "prefixed" }) {
  const app = processes.start({
    name: "app",
    args: [NEXT, "start", "-H", "127.0.0.1", "-p", String(ports.app)],
    env: nextEnvironment(env),
    output,
  });
  await untilAnswers(app, `${addressesOf(ports).app}/api/health`, { accept: (status) => status === 200 });
  return app;
}

/**
 * When a file, or anything in a folder, last changed. A folder's own time counts: it changes when a
 * file in it is taken away. 0 if it is not there.
 *
 * @param {string} where
 * @returns {number}
 */
export function newestIn(where) {
  const own = changedAt(where);
  if (own === 0 || !statSync(where).isDirectory()) return own;
  return Math.max(own, ...readdirSync(where).map((name) => newestIn(path.join(where, name))));
}

/** @param {string} file */
function changedAt(file) {
  return statSync(file, { throwIfNoEntry: false })?.mtimeMs ?? 0;
}
