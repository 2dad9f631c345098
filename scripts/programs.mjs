import { accessSync, constants, existsSync } from "node:fs";
import path from "node:path";

/** Where a program of this name is, or null. @param {string} name @param {string} [searchPath] */
export function findProgram(name, searchPath = process.env.PATH ?? "") {
  for (const folder of searchPath.split(path.delimiter)) {
    const file = path.join(folder, name);
    if (folder !== "" && isProgramFile(file)) return file;
  }
  return null;
}

/** @param {string} file */
export function isProgramFile(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/**
 * Installs Debian packages if this machine and this user allow it.
 *
 * @param {import("./processes.mjs").Processes} processes
 * @param {readonly string[]} packages
 * @returns {Promise<boolean>} false if nothing was done or it failed
 */
export async function installDebianPackages(processes, packages) {
  if (!existsSync("/etc/debian_version") || findProgram("apt-get") === null) return false;
  const before = await rightToInstall(processes);
  if (before === null) return false;
  console.log(`Installing with apt-get: ${packages.join(", ")} (this takes a minute) …`);
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  /** @param {readonly string[]} args */
  const aptGet = (args) => {
    const [command = "apt-get", ...rest] = [...before, "apt-get", ...args];
    return processes.run({ name: "apt-get", command, args: rest, env, output: "kept" });
  };
  await aptGet(["update", "-q"]); // an older list may do
  const { ok, lastLines } = await aptGet(["install", "-y", "-q", "--no-install-recommends", ...packages]);
  if (!ok) console.error(lastLines);
  return ok;
}

/**
 * What to write before a command that needs the administrator's rights; null without them.
 *
 * @param {import("./processes.mjs").Processes} processes
 * @returns {Promise<readonly string[] | null>}
 */
async function rightToInstall(processes) {
  if (process.getuid?.() === 0) return [];
  if (findProgram("sudo") === null) return null;
  const { ok } = await processes.run({ name: "sudo", command: "sudo", args: ["-n", "true"], output: "kept" });
  return ok ? ["sudo", "-n"] : null; // never asks for a password: the input may be closed
}
