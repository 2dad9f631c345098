import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { CannotGoOn } from "./cannot-go-on.mjs";
import { ensureDependencies } from "./install.mjs";
import { main } from "./main.mjs";
import { addCounts, countOne, countsLine } from "./test-counts.mjs";
import { build, checkTypes, endToEnd, findTestPrograms, FOLDERS, lint, runVitest, STEPS } from "./test-steps.mjs";

// npm test                    everything
// npm test -- unit types      only these steps

/**
 * @typedef {import("./processes.mjs").Processes} Processes
 * @typedef {import("./test-counts.mjs").Counts} Counts
 * @typedef {{ name: string, counts: Counts, seconds?: number }} Line
 */

/** @param {readonly string[]} words */
function chooseSteps(words) {
  const unknown = words.filter((word) => !STEPS.includes(word));
  if (unknown.length === 0) return words.length === 0 ? STEPS : STEPS.filter((step) => words.includes(step));
  throw new CannotGoOn(`There is no step "${unknown.join('", "')}". The steps are: ${STEPS.join(", ")}.`);
}

/**
 * Runs the steps in order, and goes on after a failure as far as that makes sense.
 *
 * @param {Processes} processes
 * @param {readonly string[]} steps
 * @param {string} reports a folder for the tools' reports
 */
async function runSteps(processes, steps, reports) {
  const record = createRecord();
  const has = (/** @type {string} */ name) => steps.includes(name);
  const folders = FOLDERS.filter(has);

  await ensureDependencies(processes);
  const chromium = has("e2e") || folders.length > 0 ? await findTestPrograms(processes) : null;
  if (has("lint")) await record.step("lint", () => lint(processes));
  if (has("types")) await record.step("types", () => checkTypes(processes));
  if (folders.length > 0) await record.steps(folders, () => runVitest(processes, reports, folders));
  const isBuilt = !has("build") || (await record.step("build", () => build(processes)));
  if (!has("e2e")) return record.lines;
  if (!isBuilt) record.notRun("e2e", "the build failed");
  else if (chromium === null) record.notRun("e2e", "a program it needs is missing (see above)");
  else await record.step("e2e", () => endToEnd(processes, reports, chromium));
  return record.lines;
}

function createRecord() {
  /** @type {Line[]} */
  const lines = [];
  /** @param {readonly string[]} names @param {() => Promise<Line[]>} work */
  const steps = async (names, work) => {
    console.log(`\n── ${names.join(", ")}\n`);
    const began = Date.now();
    const [first, ...others] = await work();
    if (first) lines.push({ ...first, seconds: (Date.now() - began) / 1000 }, ...others);
  };
  /** @param {string} name @param {() => Promise<Counts>} work whether it passed */
  const step = async (name, work) => {
    await steps([name], async () => [{ name, counts: await work() }]);
    return lines.at(-1)?.counts.failed === 0;
  };
  /** @param {string} name @param {string} why */
  const notRun = (name, why) => {
    console.log(`\n── ${name}: not run, because ${why}`);
    lines.push({ name, counts: countOne(false) });
  };
  return { lines, step, steps, notRun };
}

/** @param {readonly Line[]} lines */
function summary(lines) {
  const rows = lines.map(({ name, counts, seconds }) => {
    const time = seconds === undefined ? "" : `${seconds.toFixed(1)} s`;
    return `  ${name.padEnd(14)}${countsLine(counts).padEnd(36)}${time.padStart(8)}`;
  });
  return ["", ...rows, ""].join("\n");
}

await main(async (processes) => {
  const steps = chooseSteps(process.argv.slice(2));
  const reports = mkdtempSync(path.join(tmpdir(), "dunlin-test-"));
  /** @type {Line[]} */
  let lines;
  try {
    lines = await runSteps(processes, steps, reports);
  } catch (error) {
    if (!(error instanceof CannotGoOn)) throw error;
    console.error(`\n${error.message}`);
    lines = [{ name: "ground", counts: countOne(false) }];
  } finally {
    rmSync(reports, { recursive: true, force: true });
  }
  await processes.stopAll(); // nothing may write after the last line
  const total = addCounts(lines.map(({ counts }) => counts));
  console.log(summary(lines));
  console.log(countsLine(total));
  return total.failed === 0 ? 0 : 1;
});
