import { copyFileSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { startApp } from "../../../scripts/app.mjs";
import { freePorts } from "../../../scripts/ports.mjs";
import { createProcesses, untilAnswers } from "../../../scripts/processes.mjs";
import { addressesOf, standInArguments, standInEnvironment, standInSecrets, WEBHOOK_PATH } from "../../../scripts/services.mjs";
import { place, type Ground } from "./place";

export type OwnGround = Ground & { startMail: () => Promise<void>; stop: () => Promise<void> };

/** A second running program on a copy of the demo world, with its own payment stand-in and, at first, no mail server. */
export async function layOwnGround(): Promise<OwnGround> {
  const processes = createProcesses();
  const folder = mkdtempSync(path.join(tmpdir(), "dunlin-e2e-own-"));
  const databaseFile = path.join(folder, "dunlin.sqlite");
  copyFileSync(place().template, databaseFile);
  const ports = await freePorts();
  const { app, mailApi, stripe } = addressesOf(ports);
  const stop = async () => {
    await processes.stopAll();
    rmSync(folder, { recursive: true, force: true });
  };
  const standIns = standInArguments(ports, "127.0.0.1");
  const startMail = async () => {
    await untilAnswers(processes.start({ name: "mail", args: standIns.mail, output: "kept" }), mailApi);
  };
  try {
    const payments = { STRIPE_STAND_IN_PORT: String(ports.stripe), STRIPE_WEBHOOK_URL: `${app}${WEBHOOK_PATH}` };
    const env = { ...process.env, ...standInSecrets, ...payments };
    await untilAnswers(processes.start({ name: "stripe", args: standIns.stripe, output: "kept", env }), stripe);
    const settings = { ...standInEnvironment(ports), DUNLIN_ENV: "test", DATABASE_FILE: databaseFile, FILES_DIR: place().filesDir };
    await startApp(processes, ports, { env: { ...settings, OUTBOX_SECONDS: "1", LOG_LEVEL: "error" }, output: "kept" });
    return { app, mailApi, stripe, databaseFile, startMail, stop };
  } catch (error) {
    await stop();
    throw error;
  }
}
