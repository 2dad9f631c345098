import path from "node:path";
import { ensureBuild, NEXT, nextEnvironment } from "./app.mjs";
import { CannotGoOn } from "./cannot-go-on.mjs";
import { ensureTestPrograms } from "./chromium.mjs";
import { countOne, countPlaywright, countVitest, readReport, withFault } from "./test-counts.mjs";

/**
 * @typedef {import("./processes.mjs").Processes} Processes
 * @typedef {import("./test-counts.mjs").Counts} Counts
 */

/** Folders of tests/ that Vitest runs, in one go. */
export const FOLDERS = ["unit", "integration", "architecture"];

/** In the order in which they run. */
export const STEPS = ["lint", "types", ...FOLDERS, "build", "e2e"];

/** @param {Processes} processes */
export async function lint(processes) {
  return countOne(await runTool(processes, ["node_modules/eslint/bin/eslint.js", ".", "--max-warnings=0"]));
}

/** @param {Processes} processes */
export async function checkTypes(processes) {
  const generated = await runTool(processes, [NEXT, "typegen"]);
  return countOne(generated && (await runTool(processes, ["node_modules/typescript/bin/tsc", "--noEmit"])));
}

/** @param {Processes} processes */
export async function build(processes) {
  return countOne(await runTool(processes, [NEXT, "build"]));
}

/**
 * @param {Processes} processes
 * @param {string} reports a folder for the report
 * @param {readonly string[]} folders of tests/
 * @returns {Promise<{ name: string, counts: Counts }[]>}
 */
export async function runVitest(processes, reports, folders) {
  const file = path.join(reports, "vitest.json");
  // All of them: no filter, so that a test in a new folder is not left out.
  const filters = folders.length === FOLDERS.length ? [] : folders.map((folder) => `tests/${folder}/`);
  const options = ["--allowOnly=false", "--reporter=default", "--reporter=json", `--outputFile.json=${file}`];
  const ok = await runTool(processes, ["node_modules/vitest/vitest.mjs", "run", ...options, ...filters]);
  const report = readReport(file);
  /** @type {Map<string, Counts>} */
  const found = report === null ? new Map() : countVitest(report);
  const lines = [...new Set([...folders, ...found.keys()])].map((name) => {
    return { name, counts: found.get(name) ?? countOne(false) }; // a folder asked for in which nothing ran
  });
  const isExplained = ok || lines.some(({ counts }) => counts.failed > 0);
  return isExplained ? lines : [...lines, { name: "vitest", counts: countOne(false) }];
}

/**
 * @param {Processes} processes
 * @param {string} reports a folder for the report
 * @param {string} chromium the browser to use
 */
export async function endToEnd(processes, reports, chromium) {
  await ensureBuild(processes); // nothing to do after the step "build"
  const file = path.join(reports, "playwright.json");
  const ok = await runTool(
    processes,
    ["node_modules/@playwright/test/cli.js", "test", "--forbid-only", "--reporter=list,json"],
    { PLAYWRIGHT_JSON_OUTPUT_FILE: file, CHROMIUM_PATH: chromium },
  );
  const report = readReport(file);
  return report === null ? countOne(false) : withFault(countPlaywright(report), ok);
}

/**
 * The browser, or null with the reason said: the steps that do without can still run.
 *
 * @param {Processes} processes
 * @returns {Promise<string | null>}
 */
export async function findTestPrograms(processes) {
  try {
    return await ensureTestPrograms(processes);
  } catch (error) {
    if (!(error instanceof CannotGoOn)) throw error;
    console.error(`\n${error.message}`);
    return null;
  }
}

/**
 * @param {Processes} processes
 * @param {readonly string[]} args
 * @param {import("./processes.mjs").Environment} [env]
 */
async function runTool(processes, args, env = {}) {
  return (await processes.run({ name: "test", args, env: nextEnvironment(env), output: "inherit" })).ok;
}
