import { knex, openConnection, type Connection } from "@/db/connection";
import { env } from "@/lib/shared/env";
import { seedDemoWorld, type DemoAccount } from "@/seeds/demo/demo-world";

/**
 * Fills an empty database with the demo world and prints its accounts: `npx tsx scripts/seed.ts [--accounts-json]`.
 * With the flag, one line of JSON an account. DEMO_PASSWORD sets the password they share.
 */
process.exitCode = await main(process.argv.slice(2));

async function main(flags: readonly string[]): Promise<number> {
  process.env.DUNLIN_ENV ||= "demo";
  if (env().DUNLIN_ENV === "production") {
    return refuse("The demo world has a password that anybody can read, so it is never put into production.");
  }
  const conn = openConnection(env().DATABASE_FILE);
  try {
    const refusal = whyNotHere(conn);
    if (refusal !== null) return refuse(refusal);
    const accounts = await seedDemoWorld({
      conn,
      filesDir: env().FILES_DIR,
      now: new Date().toISOString(),
      password: process.env.DEMO_PASSWORD || "saltgrass shore",
    });
    console.log(flags.includes("--accounts-json") ? inJson(accounts) : inWords(accounts));
    return 0;
  } finally {
    conn.close();
  }
}

function whyNotHere(conn: Connection): string | null {
  const file = env().DATABASE_FILE;
  const table = conn.first(knex("sqlite_master").where({ type: "table", name: "people" }).count({ n: "*" }));
  if (Number(table?.n) === 0) return `${file} has no tables yet. Run scripts/migrate.ts on it first.`;
  const people = Number(conn.first(knex("people").count({ n: "*" }))?.n);
  if (people === 0) return null;
  const who = people === 1 ? "a person" : `${people} people`;
  return `${file} has ${who} in it already. The demo world goes into an empty database only, so nothing was changed.`;
}

function refuse(sentence: string): number {
  console.error(sentence);
  return 1;
}

function inJson(accounts: readonly DemoAccount[]): string {
  return accounts.map((account) => JSON.stringify(account)).join("\n");
}

function inWords(accounts: readonly DemoAccount[]): string {
  const lines = accounts.map(({ role, name, email, password }) => `${name}, ${role}\n  ${email}\n  password: ${password}`);
  return `The demo world is ready. Its accounts:\n\n${lines.join("\n\n")}`;
}
