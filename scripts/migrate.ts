import "./read-env-file";
import { mkdirSync } from "node:fs";
import path from "node:path";
import createKnex from "knex";
import config from "../knexfile";
import { readEnv } from "../lib/shared/env";

mkdirSync(path.dirname(readEnv({ DUNLIN_ENV: "development", ...process.env }).DATABASE_FILE), { recursive: true });
const database = createKnex(config);
try {
  const [, applied] = (await database.migrate.latest()) as [number, string[]];
  console.log(applied.length === 0 ? "The database is up to date." : `Applied: ${applied.join(", ")}.`);
} finally {
  await database.destroy();
}
