import { existsSync, rmSync } from "node:fs";
import { ensureBuild, startApp } from "./app.mjs";
import { ensureDependencies } from "./install.mjs";
import { main } from "./main.mjs";
import { portsFromEnv, requireFree } from "./ports.mjs";
import { whileAllRun } from "./processes.mjs";
import { inRoot } from "./root.mjs";
import { addressesOf, standInEnvironment, startStandIns } from "./services.mjs";
import { accountTable, ensureWorld } from "./world.mjs";

// The demo keeps to a folder of its own and to the stand-ins, whatever .env says: trying it out
// never touches a real database, a real mailbox or a real card.
const folder = inRoot(".data", "demo");
const databaseFile = inRoot(".data", "demo", "dunlin.sqlite");
const filesDir = inRoot(".data", "demo", "files");

await main(async (processes) => {
  const ports = portsFromEnv();
  await requireFree(ports); // before the long wait for the packages
  await ensureDependencies(processes);
  await ensureBuild(processes);

  const isWhole = existsSync(`${databaseFile}.accounts.json`);
  if (process.argv.includes("--fresh") || !isWhole) rmSync(folder, { recursive: true, force: true });
  const own = { DUNLIN_ENV: "demo", DATABASE_FILE: databaseFile, FILES_DIR: filesDir };
  const env = { ...standInEnvironment(ports), ...own };
  const world = await ensureWorld(processes, { databaseFile, filesDir, env });
  if (world === null) throw new Error(`${databaseFile} lost its accounts between two steps`);

  // Payments are remembered over a restart, as the database remembers them.
  const stripeState = { STRIPE_STAND_IN_STATE: inRoot(".data", "demo", "stripe.json") };
  const services = await startStandIns(processes, ports, { env: stripeState });
  const app = await startApp(processes, ports, { env });
  console.log(welcome(addressesOf(ports), world));
  await whileAllRun([...services, app]);
});

/**
 * @param {ReturnType<typeof addressesOf>} addresses
 * @param {import("./world.mjs").World} world
 */
function welcome(addresses, { accounts, seededOn }) {
  return `
Dunlin is running. Ctrl-C stops everything.

  The program           ${addresses.app}
  Mail that was sent    ${addresses.mail}
  Payments (stand-in)   ${addresses.stripe}

Accounts (role, e-mail, password):

${accountTable(accounts)}

The demo world was made on ${seededOn}, with dates counted from that day.
To start over: npm run demo -- --fresh
`;
}
