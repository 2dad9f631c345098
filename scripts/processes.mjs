import { spawn } from "node:child_process";
import { get } from "node:http";
import { createInterface } from "node:readline";
import { setTimeout as pause } from "node:timers/promises";
import { CannotGoOn } from "./cannot-go-on.mjs";
import { endGroup, signalGroup } from "./process-group.mjs";
import { inRoot, root } from "./root.mjs";

/**
 * @typedef {Record<string, string | undefined>} Environment
 *
 * @typedef {object} Command
 * @property {string} name what to call it in messages and before its lines
 * @property {string} [command] a program; Node itself if left out
 * @property {readonly string[]} args
 * @property {Environment} [env] the whole environment; ours if left out
 * @property {string} [cwd] the checkout if left out
 * @property {"prefixed" | "inherit" | "kept"} [output] lines with the name before them; as they come;
 *   or not shown, only kept
 *
 * @typedef {{ code: number | null, signal: NodeJS.Signals | null }} Ended
 *
 * @typedef {object} Running
 * @property {string} name
 * @property {number} pid the process and its group
 * @property {Promise<Ended>} ended resolves when it and everything it started have ended
 * @property {() => string} lastLines the end of what it wrote, unless its output is "inherit"
 * @property {() => string} stdout all it wrote to standard output, if its output is "kept"
 *
 * @typedef {ReturnType<typeof createProcesses>} Processes
 */

const LINES_KEPT = 40;

/**
 * Child processes, each in a group of its own, so that ending one ends what it started as well.
 *
 * @param {{ graceMs?: number, write?: (text: string) => void }} [options] graceMs: how long a process
 *   may take to end by itself when asked
 */
export function createProcesses({ graceMs = 5000, write = (text) => void process.stdout.write(text) } = {}) {
  /** @type {Map<number, Running>} */
  const running = new Map();
  /** @type {ReturnType<typeof startLeash> | undefined} */
  let leash;
  let stopping = false;

  /** @param {Command} command @returns {Running} */
  function start(command) {
    if (stopping) throw new CannotGoOn("Stopped.");
    leash ??= startLeash();
    const { child, output } = spawnCommand(command, write);
    const { pid } = child;
    if (pid === undefined) {
      child.on("error", () => {}); // reported here, once
      const program = `the program "${command.command}" could not be started`;
      throw new CannotGoOn(`${command.name}: ${program}. Is it installed?`);
    }
    leash.hold(pid);
    const ended = new Promise((/** @type {(ended: Ended) => void} */ resolve) => {
      const closed = new Promise((resolve) => child.once("close", resolve));
      child.once("exit", async (code, signal) => {
        await endGroup(pid, graceMs); // what it started and left behind
        await Promise.race([closed, pause(1000)]); // its last lines
        running.delete(pid);
        leash?.release(pid);
        resolve({ code, signal });
      });
    });
    const handle = { name: command.name, pid, ended, ...output };
    running.set(pid, handle);
    return handle;
  }

  /** Starts a command and waits for its end. @param {Command} command */
  async function run(command) {
    const handle = start(command);
    const { code, signal } = await handle.ended;
    if (stopping) throw new CannotGoOn("Stopped.");
    return { ok: code === 0, code, signal, stdout: handle.stdout(), lastLines: handle.lastLines() };
  }

  async function stopAll() {
    stopping = true;
    await Promise.all([...running.values()].map(({ pid, ended }) => endGroup(pid, graceMs).then(() => ended)));
    leash?.end();
  }

  /** For the last moment of this process, when nothing can be waited for. */
  function killAll() {
    stopping = true;
    for (const pid of running.keys()) signalGroup(pid, "SIGKILL");
  }

  return { start, run, stopAll, killAll };
}

/**
 * Waits until an address answers, and stops waiting when the process behind it ends.
 *
 * @param {Running} handle
 * @param {string} url http, on this machine
 * @param {{ withinMs?: number, accept?: (status: number) => boolean }} [options]
 */
export async function untilAnswers(handle, url, { withinMs = 60_000, accept = (status) => status < 500 } = {}) {
  const deadline = Date.now() + withinMs;
  /** @type {Ended | undefined} */
  let ended;
  void handle.ended.then((how) => (ended = how));
  let last = "no answer yet";
  while (Date.now() < deadline) {
    const status = await statusOf(url);
    if (ended) throw new CannotGoOn(`${handle.name} ended (${describeEnd(ended)}).\n${handle.lastLines()}`.trimEnd());
    if (status !== null && accept(status)) return;
    if (status !== null) last = `it answered ${status}`;
    await pause(100);
  }
  const waited = `${handle.name} was not ready at ${url} after ${Math.round(withinMs / 1000)} seconds (${last}).`;
  throw new CannotGoOn(`${waited}\n${handle.lastLines()}`.trimEnd());
}

/**
 * Stays as long as all of them run; the first to end by itself is the reason to stop.
 *
 * @param {readonly Running[]} handles
 * @returns {Promise<never>}
 */
export async function whileAllRun(handles) {
  const [handle, ended] = await Promise.race(
    handles.map(async (each) => /** @type {const} */ ([each, await each.ended])),
  );
  throw new CannotGoOn(`${handle.name} stopped by itself (${describeEnd(ended)}).\n${handle.lastLines()}`.trimEnd());
}

/** @param {Ended} ended */
function describeEnd({ code, signal }) {
  return signal === null ? `exit code ${code}` : `ended by ${signal}`;
}

/** @param {string} url @returns {Promise<number | null>} null if nothing answers */
function statusOf(url) {
  return new Promise((resolve) => {
    const request = get(url, { agent: false, timeout: 5000 }, (response) => {
      response.resume();
      resolve(response.statusCode ?? null);
    });
    request.on("timeout", () => request.destroy());
    request.on("error", () => resolve(null));
  });
}

/** @param {Command} command @param {(text: string) => void} write */
function spawnCommand({ name, command = process.execPath, args, ...options }, write) {
  const { env = process.env, cwd = root, output = "prefixed" } = options;
  const stdio = output === "inherit" ? "inherit" : "pipe";
  const child = spawn(command, [...args], {
    cwd,
    env: /** @type {NodeJS.ProcessEnv} */ (env),
    detached: true, // a group of its own
    stdio: ["ignore", stdio, stdio],
  });
  /** @type {string[]} */
  const lines = [];
  let stdout = "";
  child.stdout?.setEncoding("utf8").on("data", (text) => {
    if (output === "kept") stdout += text;
  });
  for (const stream of [child.stdout, child.stderr]) {
    if (stream === null) continue;
    createInterface({ input: stream }).on("line", (line) => {
      lines.push(line);
      if (lines.length > LINES_KEPT) lines.shift();
      if (output === "prefixed") write(`${name.padEnd(8)}| ${line}\n`);
    });
  }
  return { child, output: { lastLines: () => lines.join("\n"), stdout: () => stdout } };
}

function startLeash() {
  const child = spawn(process.execPath, [inRoot("scripts", "leash.mjs")], {
    detached: true, // out of reach of the Ctrl-C that ends us
    stdio: ["pipe", "ignore", "ignore"],
  });
  child.on("error", () => {});
  child.stdin.on("error", () => {}); // ended before us: nothing more to say to it
  child.unref();
  if ("unref" in child.stdin && typeof child.stdin.unref === "function") child.stdin.unref();
  return {
    /** @param {number} pid */
    hold: (pid) => void child.stdin.write(`+${pid}\n`),
    /** @param {number} pid */
    release: (pid) => void child.stdin.write(`-${pid}\n`),
    end: () => void child.stdin.end(),
  };
}
