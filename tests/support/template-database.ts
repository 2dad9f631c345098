import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import type { TestProject } from "vitest/node";

declare module "vitest" {
  interface ProvidedContext {
    /** A SQLite file that the migrations have made and nobody has written to. Each test copies it. */
    templateDatabase: string;
  }
}

/** Migrates one database for the whole run, with the program's own script, so that it is tested too. */
export default function setup(project: TestProject): () => void {
  const folder = mkdtempSync(path.join(tmpdir(), "dunlin-template-"));
  const file = path.join(folder, "template.sqlite");
  execFileSync(process.execPath, ["--import", "tsx", "scripts/migrate.ts"], {
    env: { ...process.env, DUNLIN_ENV: "test", DATABASE_FILE: file },
    stdio: ["ignore", "ignore", "inherit"],
  });
  project.provide("templateDatabase", file);
  const { FILES_DIR } = project.config.env;
  return () => {
    for (const place of [folder, FILES_DIR]) if (place) rmSync(place, { recursive: true, force: true });
  };
}
