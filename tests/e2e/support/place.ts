import { readFileSync } from "node:fs";
import type { Account } from "../../../scripts/world.mjs";

/** Where a running program and its stand-ins are. */
export type Ground = { app: string; mailApi: string; stripe: string; databaseFile: string };

/** The ground all tests share, and what a test needs to lay one of its own. */
export type Place = Ground & { filesDir: string; template: string; accounts: Account[] };

export const placeVariable = "DUNLIN_E2E_PLACE";

let known: Place | undefined;

export function place(): Place {
  known ??= JSON.parse(readFileSync(process.env[placeVariable] ?? "", "utf8")) as Place;
  return known;
}

export function accountOf(role: string): Account {
  const account = place().accounts.find((one) => one.role === role);
  if (!account) throw new Error(`the demo world has no ${role}`);
  return account;
}
