import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { CannotGoOn } from "./cannot-go-on.mjs";

/**
 * @typedef {import("./processes.mjs").Processes} Processes
 * @typedef {import("./processes.mjs").Environment} Environment
 * @typedef {{ role: string, name: string, email: string, password: string }} Account
 * @typedef {{ accounts: Account[], seededOn: string }} World
 * @typedef {{ databaseFile: string, filesDir: string, env: Environment }} Place
 */

/**
 * Migrates a database, and fills a new one with the demo world. A database that was there before is
 * brought up to date and otherwise left as it is.
 *
 * @param {Processes} processes
 * @param {Place} place
 * @returns {Promise<World | null>} null if the database holds something else than the demo world
 */
export async function ensureWorld(processes, place) {
  const noted = `${place.databaseFile}.accounts.json`;
  const isNew = !existsSync(place.databaseFile);
  mkdirSync(path.dirname(place.databaseFile), { recursive: true });
  await runScript(processes, "migrate", ["scripts/migrate.ts"], place);
  if (!isNew) return existsSync(noted) ? JSON.parse(readFileSync(noted, "utf8")) : null;
  try {
    const said = await runScript(processes, "seed", ["scripts/seed.ts", "--accounts-json"], place);
    const world = { accounts: readAccounts(said), seededOn: new Date().toISOString().slice(0, 10) };
    // Written last: it is the sign that the world is complete.
    writeFileSync(noted, JSON.stringify(world, null, 2), { mode: 0o600 });
    return world;
  } catch (error) {
    removeDatabase(place.databaseFile); // half a world would look like somebody's data next time
    throw error;
  }
}

/** @param {string} databaseFile */
export function removeDatabase(databaseFile) {
  for (const end of ["", "-wal", "-shm", ".accounts.json"]) rmSync(`${databaseFile}${end}`, { force: true });
}

/**
 * The accounts among the lines a seed writes: JSON, an account a line or all in one list.
 *
 * @param {string} said
 * @returns {Account[]}
 */
export function readAccounts(said) {
  const found = said
    .split("\n")
    .filter((line) => /^\s*[[{]/.test(line))
    .flatMap((line) => JSON.parse(line));
  if (found.length === 0) throw new Error("the seed named no accounts");
  return found;
}

/** @param {readonly Account[]} accounts */
export function accountTable(accounts) {
  const [roleWidth, mailWidth] = [longest(accounts, "role"), longest(accounts, "email")];
  return accounts
    .map(({ role, name, email, password }) => {
      return `  ${role.padEnd(roleWidth)}  ${email.padEnd(mailWidth)}  ${password}   (${name})`;
    })
    .join("\n");
}

/** @param {readonly Account[]} accounts @param {"role" | "email"} field */
const longest = (accounts, field) => Math.max(...accounts.map((account) => account[field].length));

/** @param {Processes} processes @param {string} name @param {readonly string[]} script @param {Place} place */
async function runScript(processes, name, script, { databaseFile, filesDir, env }) {
  const { ok, stdout, lastLines } = await processes.run({
    name,
    args: ["--import", "tsx", ...script],
    env: { ...process.env, ...env, DATABASE_FILE: databaseFile, FILES_DIR: filesDir },
    output: "kept",
  });
  if (!ok) throw new CannotGoOn(`${script[0]} did not succeed on ${databaseFile}:\n${lastLines}`);
  return stdout;
}
