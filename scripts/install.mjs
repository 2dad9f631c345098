import { existsSync, readFileSync } from "node:fs";
import { CannotGoOn } from "./cannot-go-on.mjs";
import { findProgram, installDebianPackages } from "./programs.mjs";
import { inRoot } from "./root.mjs";

/** @typedef {import("./processes.mjs").Processes} Processes */

const COMPILER = ["python3", "make", "g++"];

/**
 * Brings node_modules to what package-lock.json says, if it is not there yet. Needs nothing but
 * Node and npm, and for better-sqlite3, where no compiled one can be fetched, a compiler.
 *
 * @param {Processes} processes
 */
export async function ensureDependencies(processes) {
  requireNode();
  if (!isInstalled()) await install(processes);
  if (await opensDatabase(processes)) return;
  // Compiled for another version of Node, or left half done.
  console.log("Compiling better-sqlite3 for this version of Node …");
  await npm(processes, ["rebuild", "better-sqlite3"]);
  if (await opensDatabase(processes)) return;
  throw new CannotGoOn(`better-sqlite3 cannot be loaded.\n${compilerAdvice()}`);
}

/**
 * Whether a version meets a range of the form ">=20.19 <23".
 *
 * @param {string} version
 * @param {string} range comparisons separated by spaces, all of which must hold
 */
export function meetsRange(version, range) {
  return range.split(/\s+/).every((comparison) => {
    const parts = /^(>=|<)(\d+(?:\.\d+){0,2})$/.exec(comparison);
    if (parts === null) throw new Error(`engines.node in package.json: cannot read "${comparison}"`);
    const isBelow = compareVersions(version, parts[2] ?? "") < 0;
    return parts[1] === "<" ? isBelow : !isBelow;
  });
}

/**
 * Whether what npm noted after its last installation is what the lockfile asks for. Contents are
 * compared and not times: a fresh checkout gives the lockfile a new time and changes nothing.
 *
 * @param {string} lockfile text of package-lock.json
 * @param {string} installed text of node_modules/.package-lock.json
 */
export function matchesLock(lockfile, installed) {
  const wanted = packagesIn(lockfile);
  const present = packagesIn(installed);
  for (const [where, { version, integrity, optional }] of Object.entries(wanted)) {
    if (where === "") continue;
    const found = present[where];
    if (found === undefined && optional === true) continue; // for another kind of machine
    if (found === undefined || found.version !== version || found.integrity !== integrity) return false;
  }
  return Object.keys(present).every((where) => where in wanted);
}

function requireNode() {
  /** @type {{ engines: { node: string } }} */
  const { engines } = JSON.parse(readFileSync(inRoot("package.json"), "utf8"));
  if (meetsRange(process.versions.node, engines.node)) return;
  throw new CannotGoOn(
    `Dunlin needs Node ${engines.node}; this is ${process.versions.node}. Install Node 20 or 22 and start again.`,
  );
}

function isInstalled() {
  const installed = inRoot("node_modules", ".package-lock.json");
  const lockfile = inRoot("package-lock.json");
  if (!existsSync(lockfile)) throw new CannotGoOn("package-lock.json is missing: this checkout is not complete.");
  return existsSync(installed) && matchesLock(readFileSync(lockfile, "utf8"), readFileSync(installed, "utf8"));
}

/** @param {Processes} processes */
async function install(processes) {
  console.log("Installing the packages with npm ci (about two minutes the first time) …");
  let result = await npm(processes, ["ci", "--include=dev"]);
  const missing = COMPILER.filter((name) => findProgram(name) === null);
  if (!result.ok && missing.length > 0 && (await installDebianPackages(processes, missing))) {
    result = await npm(processes, ["ci", "--include=dev"]);
  }
  if (result.ok) return;
  throw new CannotGoOn(`npm ci did not succeed:\n${result.lastLines}\n\n${compilerAdvice()}`);
}

/** @param {Processes} processes @param {readonly string[]} args */
function npm(processes, args) {
  return processes.run({ name: "npm", command: "npm", args: [...args, "--no-audit", "--no-fund"], output: "kept" });
}

/** @param {Processes} processes */
async function opensDatabase(processes) {
  const args = ["-e", "new (require('better-sqlite3'))(':memory:').close()"];
  return (await processes.run({ name: "better-sqlite3", args, output: "kept" })).ok;
}

function compilerAdvice() {
  const missing = COMPILER.filter((name) => findProgram(name) === null);
  if (missing.length === 0) return "Is the package registry within reach? The lines above say what npm met.";
  const verb = missing.length === 1 ? "is" : "are";
  return [
    `better-sqlite3 is compiled on this machine, and ${missing.join(", ")} ${verb} missing.`,
    `On Debian: apt-get install -y ${missing.join(" ")}`,
  ].join("\n");
}

/** @param {string} text @returns {Record<string, { version?: string, integrity?: string, optional?: boolean }>} */
function packagesIn(text) {
  return JSON.parse(text).packages ?? {};
}

/** @param {string} one @param {string} other */
function compareVersions(one, other) {
  const [left, right] = [one, other].map((version) => version.split(".").map(Number));
  for (let part = 0; part < 3; part += 1) {
    const difference = (left?.[part] ?? 0) - (right?.[part] ?? 0);
    if (difference !== 0) return difference;
  }
  return 0;
}
