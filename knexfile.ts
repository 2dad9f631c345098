import type { Knex } from "knex";
import { readEnv } from "./lib/shared/env";

/** For the knex command and the migrate and seed scripts; the program itself opens db/connection.ts. */
const config: Knex.Config = {
  client: "better-sqlite3",
  connection: { filename: readEnv({ DUNLIN_ENV: "development", ...process.env }).DATABASE_FILE },
  useNullAsDefault: true,
  pool: {
    min: 1,
    max: 1,
    afterCreate: (raw: { pragma: (text: string) => void }, done: (error: unknown, raw: unknown) => void) => {
      raw.pragma("foreign_keys = ON");
      done(null, raw);
    },
  },
  migrations: { directory: "./migrations", extension: "ts", loadExtensions: [".ts"] },
  seeds: { directory: "./seeds", extension: "ts", loadExtensions: [".ts"] },
};

export default config;
