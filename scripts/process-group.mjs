import { readdirSync, readFileSync } from "node:fs";
import { setTimeout as pause } from "node:timers/promises";

/**
 * Whether a process group still has a living member. A zombie does not count: where process 1
 * does not collect orphans (many containers), it would stay for ever.
 *
 * @param {number} group
 */
export function groupIsAlive(group) {
  try {
    process.kill(-group, 0);
  } catch (error) {
    return codeOf(error) === "EPERM";
  }
  return process.platform !== "linux" || livingMembers(group) > 0;
}

/**
 * @param {number} group
 * @param {NodeJS.Signals} signal
 */
export function signalGroup(group, signal) {
  try {
    process.kill(-group, signal);
  } catch (error) {
    if (codeOf(error) !== "ESRCH") throw error;
  }
}

/**
 * Asks a group to end, and ends it when it has not done so in time.
 *
 * @param {number} group
 * @param {number} graceMs
 */
export async function endGroup(group, graceMs) {
  signalGroup(group, "SIGTERM");
  if (await isGone(group, graceMs)) return;
  signalGroup(group, "SIGKILL");
  await isGone(group, 2000);
}

/** @param {number} group @param {number} withinMs */
async function isGone(group, withinMs) {
  const deadline = Date.now() + withinMs;
  while (groupIsAlive(group)) {
    if (Date.now() >= deadline) return false;
    await pause(25);
  }
  return true;
}

/** @param {number} group */
function livingMembers(group) {
  const pids = readdirSync("/proc").filter((entry) => /^\d+$/.test(entry));
  return pids.map(statusOf).filter((status) => status?.group === group && !/[ZX]/.test(status.state)).length;
}

/**
 * What Linux says about a process; null if it is gone, or on another system.
 *
 * @param {string | number} pid
 */
export function statusOf(pid) {
  try {
    // "pid (name) state parent group …"; the name may itself hold spaces and brackets.
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    const [start, end] = [stat.indexOf("("), stat.lastIndexOf(")")];
    const [state = "", parent, group] = stat.slice(end + 2).split(" ");
    return { name: stat.slice(start + 1, end), state, parent: Number(parent), group: Number(group) };
  } catch {
    return null;
  }
}

/** @param {unknown} error */
function codeOf(error) {
  return error instanceof Error && "code" in error ? error.code : undefined;
}
