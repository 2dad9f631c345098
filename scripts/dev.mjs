import { existsSync } from "node:fs";
import path from "node:path";
import { NEXT, nextEnvironment } from "./app.mjs";
import { ensureDependencies } from "./install.mjs";
import { main } from "./main.mjs";
import { portsFromEnv, requireFree } from "./ports.mjs";
import { untilAnswers, whileAllRun } from "./processes.mjs";
import { inRoot, root } from "./root.mjs";
import { addressesOf, standInEnvironment, startStandIns } from "./services.mjs";
import { accountTable, ensureWorld } from "./world.mjs";

// npm run dev                           stand-ins, database, and the program with hot reload
// npm run dev -- --without-services     the same beside stand-ins that run elsewhere (containers)

await main(async (processes) => {
  // The same files, in the same order, that Next itself reads: what is set first stays.
  for (const file of [".env.local", ".env"]) if (existsSync(inRoot(file))) process.loadEnvFile(inRoot(file));
  const ports = portsFromEnv();
  const withServices = !process.argv.includes("--without-services");
  await requireFree(ports, withServices ? undefined : ["app"]);
  await ensureDependencies(processes);

  const databaseFile = path.resolve(root, process.env.DATABASE_FILE || ".data/dunlin.sqlite");
  const filesDir = path.resolve(root, process.env.FILES_DIR || ".data/files");
  const env = {
    ...standInEnvironment(ports),
    DUNLIN_ENV: "development",
    DATABASE_FILE: databaseFile,
    FILES_DIR: filesDir,
  };
  const world = await ensureWorld(processes, { databaseFile, filesDir, env });
  const stripeState = { STRIPE_STAND_IN_STATE: inRoot(".data", "stripe-stand-in.json") };
  const services = withServices ? await startStandIns(processes, ports, { env: stripeState }) : [];
  const app = processes.start({
    name: "app",
    args: [NEXT, "dev", "-H", process.env.HOST || "127.0.0.1", "-p", String(ports.app)],
    env: nextEnvironment(env),
  });
  const addresses = addressesOf(ports);
  await untilAnswers(app, `${addresses.app}/api/health`);
  const accounts = world?.accounts;
  const people = accounts ? accountTable(accounts) : `${databaseFile} was there before: nothing was added to it.`;
  console.log(`
The program ${addresses.app}   Mail ${addresses.mail}   Payments ${addresses.stripe}
${people}
`);
  await whileAllRun([...services, app]);
});
