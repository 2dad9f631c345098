import { existsSync, readFileSync } from "node:fs";

/**
 * @typedef {{ passed: number, failed: number, skipped: number }} Counts
 */

/** A check that is one thing, such as the linter. @param {boolean} ok @returns {Counts} */
export const countOne = (ok) => ({ passed: ok ? 1 : 0, failed: ok ? 0 : 1, skipped: 0 });

/** @param {readonly Counts[]} all @returns {Counts} */
export function addCounts(all) {
  const total = { passed: 0, failed: 0, skipped: 0 };
  for (const each of all) {
    total.passed += each.passed;
    total.failed += each.failed;
    total.skipped += each.skipped;
  }
  return total;
}

/** The last line of a run. @param {Counts} counts */
export function countsLine({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ""}`;
}

/**
 * Makes sure that a run which did not succeed is never counted as one: a program that failed without
 * a failed test (a file that does not load, a fault outside the tests) and a run in which nothing
 * ran each count as one failure.
 *
 * @param {Counts} counts
 * @param {boolean} ok whether the program itself said that all is well
 * @returns {Counts}
 */
export function withFault(counts, ok) {
  const ran = counts.passed + counts.failed > 0;
  return counts.failed === 0 && (!ok || !ran) ? { ...counts, failed: 1 } : counts;
}

/**
 * Counts of a Vitest JSON report by the folder under tests/ that the file is in.
 *
 * @param {string} report
 * @returns {Map<string, Counts>}
 */
export function countVitest(report) {
  /** @type {{ testResults: { name: string, status: string, assertionResults: { status: string }[] }[] }} */
  const { testResults } = JSON.parse(report);
  /** @type {Map<string, Counts>} */
  const folders = new Map();
  for (const file of testResults) {
    const folder = /\/tests\/([^/]+)\//.exec(file.name.replaceAll("\\", "/"))?.[1] ?? "elsewhere";
    const statuses = file.assertionResults.map(({ status }) => status);
    const tests = tally(statuses);
    // A file that does not load has no failed test, and is a failure all the same.
    const counts = file.status === "failed" ? withFault(tests, false) : tests;
    folders.set(folder, addCounts([folders.get(folder) ?? tally([]), counts]));
  }
  return folders;
}

/** Counts of a Playwright JSON report; a test that passed only on a second try has failed. @param {string} report */
export function countPlaywright(report) {
  /** @type {{ stats: { expected: number, unexpected: number, flaky: number, skipped: number } }} */
  const { stats } = JSON.parse(report);
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky, skipped: stats.skipped };
}

/** @param {string} file @returns {string | null} */
export const readReport = (file) => (existsSync(file) ? readFileSync(file, "utf8") : null);

/** @param {readonly string[]} statuses of Vitest @returns {Counts} */
function tally(statuses) {
  const passed = statuses.filter((status) => status === "passed").length;
  const failed = statuses.filter((status) => status === "failed").length;
  return { passed, failed, skipped: statuses.length - passed - failed };
}
