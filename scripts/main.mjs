import { pathToFileURL } from "node:url";
import { CannotGoOn } from "./cannot-go-on.mjs";
import { statusOf } from "./process-group.mjs";
import { createProcesses } from "./processes.mjs";

const EXIT_CODES = { SIGINT: 130, SIGTERM: 143, SIGHUP: 129 };

/** Whether a module is the program that was started, and not imported. @param {string} moduleUrl */
export function isProgram(moduleUrl) {
  return process.argv[1] !== undefined && pathToFileURL(process.argv[1]).href === moduleUrl;
}

/**
 * Runs a script's work and leaves no process behind, however it ends: by itself, by an error, by
 * Ctrl-C, by a signal, or because the npm that started it is gone.
 *
 * @param {(processes: import("./processes.mjs").Processes) => Promise<number | void>} work
 *   gives the exit code
 */
export async function main(work) {
  const processes = createProcesses();
  let leaving = false;

  /** @param {number} code */
  const leave = async (code) => {
    if (leaving) return;
    leaving = true;
    await processes.stopAll();
    process.exit(code);
  };
  /** @param {unknown} error */
  const fail = (error) => {
    if (leaving) return;
    console.error(error instanceof CannotGoOn ? `\n${error.message}` : error);
    void leave(1);
  };

  let firstAsked = 0;
  for (const [signal, code] of Object.entries(EXIT_CODES)) {
    process.on(signal, () => {
      // One Ctrl-C arrives twice, from the terminal and from npm; a later one means "at once".
      if (leaving && Date.now() - firstAsked > 1000) process.exit(code);
      firstAsked ||= Date.now();
      void leave(code);
    });
  }
  process.on("exit", processes.killAll);
  process.on("uncaughtException", fail);
  process.on("unhandledRejection", fail);
  process.stdout.on("error", () => void leave(1)); // the reader of our output is gone
  leaveWithNpm(() => void leave(1));

  try {
    const code = await work(processes);
    await leave(code ?? 0);
  } catch (error) {
    fail(error);
  }
}

/** npm ended without telling us (killed): then somebody else is our parent. @param {() => void} leave */
function leaveWithNpm(leave) {
  if (process.env.npm_lifecycle_event === undefined) return;
  const before = startedBy();
  setInterval(() => {
    if (startedBy() !== before) leave();
  }, 1000).unref();
}

/** The process that started us; where npm put a shell between, the one above the shell. */
function startedBy() {
  const parent = statusOf(process.ppid);
  return parent !== null && /^(ba|da)?sh$/.test(parent.name) ? parent.parent : process.ppid;
}
