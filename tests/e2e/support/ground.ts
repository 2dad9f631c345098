import { copyFileSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { ensureBuild, startApp } from "../../../scripts/app.mjs";
import { freePorts } from "../../../scripts/ports.mjs";
import { createProcesses } from "../../../scripts/processes.mjs";
import { addressesOf, standInEnvironment, startStandIns } from "../../../scripts/services.mjs";
import { ensureWorld } from "../../../scripts/world.mjs";
import { placeVariable, type Place } from "./place";

/** Starts the stand-ins and the built program over the demo world, once for all tests; ends them after the last. */
export default async function layGround(): Promise<() => Promise<void>> {
  const processes = createProcesses();
  const folder = mkdtempSync(path.join(tmpdir(), "dunlin-e2e-"));
  const leave = async () => {
    await processes.stopAll();
    rmSync(folder, { recursive: true, force: true });
  };
  try {
    await ensureBuild(processes);
    const ports = await freePorts();
    const [databaseFile, filesDir] = [path.join(folder, "dunlin.sqlite"), path.join(folder, "files")];
    const env = { ...standInEnvironment(ports), DUNLIN_ENV: "test", DATABASE_FILE: databaseFile, FILES_DIR: filesDir, OUTBOX_SECONDS: "1", LOG_LEVEL: "warn" };
    const world = await ensureWorld(processes, { databaseFile, filesDir, env });
    if (world === null) throw new Error("the demo world was not made");
    const template = path.join(folder, "template", "dunlin.sqlite");
    mkdirSync(path.dirname(template));
    copyFileSync(databaseFile, template); // nobody has it open now, so the one file is all of it
    await startStandIns(processes, ports, { output: "kept" });
    await startApp(processes, ports, { env, output: process.env.E2E_LOG ? "prefixed" : "kept" });
    const { app, mailApi, stripe } = addressesOf(ports);
    Object.assign(process.env, env); // what a test prepares runs the program's own commands
    const place: Place = { app, mailApi, stripe, databaseFile, filesDir, template, accounts: world.accounts };
    const note = path.join(folder, "place.json");
    writeFileSync(note, JSON.stringify(place), { mode: 0o600 });
    process.env[placeVariable] = note;
    return leave;
  } catch (error) {
    await leave();
    throw error;
  }
}
