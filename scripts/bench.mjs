import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { ensureBuild, startApp } from "./app.mjs";
import { startBareApp } from "./bare-app.mjs";
import { CannotGoOn } from "./cannot-go-on.mjs";
import { ensureDependencies } from "./install.mjs";
import { main } from "./main.mjs";
import { scriptWeight } from "./page-weight.mjs";
import { freePorts } from "./ports.mjs";
import { addressesOf, standInEnvironment, startStandIns } from "./services.mjs";
import { ensureWorld } from "./world.mjs";

// npm run bench: first figures, on a demo world of its own. They hold for this machine and this hour
// only; what carries over is the ratio to a bare route handler of the same framework, and the weight.

const CONNECTIONS = 16;
const SECONDS = 6;
/** How much more script a public page may load than a bare page, in bytes compressed. */
const SCRIPT_ALLOWANCE = 10 * 1024;

await main(async (processes) => {
  await ensureDependencies(processes);
  await ensureBuild(processes);
  const folder = mkdtempSync(path.join(tmpdir(), "dunlin-bench-"));
  try {
    const [ports, others] = [await freePorts(), await freePorts()];
    const [databaseFile, filesDir] = [path.join(folder, "dunlin.sqlite"), path.join(folder, "files")];
    const world = { DUNLIN_ENV: "demo", DATABASE_FILE: databaseFile, FILES_DIR: filesDir };
    const env = { ...standInEnvironment(ports), ...world };
    await ensureWorld(processes, { databaseFile, filesDir, env });
    await startStandIns(processes, ports, { output: "kept" });
    await startApp(processes, ports, { env, output: "kept" });
    const bare = await startBareApp(processes, others.app);
    const { app } = addressesOf(ports);
    await printSpeed(app, bare.handler);
    return (await printWeight(app, bare.page)) ? 0 : 1;
  } finally {
    await processes.stopAll();
    rmSync(folder, { recursive: true, force: true });
  }
});

/** @param {string} app @param {string} bareHandler */
async function printSpeed(app, bareHandler) {
  const { from, to } = season(new Date());
  console.log(`\n${CONNECTIONS} connections, ${SECONDS} seconds each\n`);
  console.log(row(["", "requests/s", "p50 ms", "p99 ms", "of bare"]));
  const bare = await measure(bareHandler);
  for (const [name, url] of [
    ["bare route handler", bareHandler],
    ["/api/health", `${app}/api/health`],
    ["/api/outings", `${app}/api/outings?from=${from}&to=${to}`],
    ["/outings (page)", `${app}/outings`],
  ]) {
    const figures = url === bareHandler ? bare : await measure(url);
    const ratio = `${Math.round((100 * figures.perSecond) / bare.perSecond)} %`;
    console.log(row([name, figures.perSecond.toFixed(0), String(figures.p50), String(figures.p99), ratio]));
  }
}

/** @param {string | undefined} url */
async function measure(url = "") {
  const { default: autocannon } = await import("autocannon"); // only there after the installation
  await autocannon({ url, connections: CONNECTIONS, duration: 2 }); // warm
  const result = await autocannon({ url, connections: CONNECTIONS, duration: SECONDS });
  const failed = result.non2xx + result.errors + result.timeouts;
  if (failed > 0) throw new CannotGoOn(`${url}: ${failed} of ${result.requests.total} requests did not succeed.`);
  return { perSecond: result.requests.average, p50: result.latency.p50, p99: result.latency.p99 };
}

/**
 * @param {string} app
 * @param {string} barePage
 * @returns {Promise<boolean>} whether all are within the allowance
 */
async function printWeight(app, barePage) {
  const bare = await scriptWeight(barePage);
  console.log(`\nScript loaded with a page, gzip (allowed over a bare page: ${kilobytes(SCRIPT_ALLOWANCE)})\n`);
  console.log(row(["", "scripts", "KB", "over bare", ""]));
  console.log(row(["bare page", String(bare.scripts), kilobytes(bare.bytes), "", ""]));
  let isWithin = true;
  for (const address of await publicPages(app)) {
    const { scripts, bytes } = await scriptWeight(app + address);
    const over = bytes - bare.bytes;
    if (over > SCRIPT_ALLOWANCE) isWithin = false;
    const verdict = over > SCRIPT_ALLOWANCE ? "too much" : "";
    console.log(row([address, String(scripts), kilobytes(bytes), kilobytes(over), verdict]));
  }
  return isWithin;
}

/** The pages anybody may read, with the first outing and the first model that they name. @param {string} app */
async function publicPages(app) {
  const named = await Promise.all(
    ["/outings", "/models"].map(async (list) => {
      const { html } = await scriptWeight(app + list);
      const first = new RegExp(`href="(${list}/[^"/?#]+)"`).exec(html)?.[1];
      if (first === undefined) throw new CannotGoOn(`${list} names nothing: is the demo world empty?`);
      return [list, first];
    }),
  );
  return ["/", ...named.flat(), "/sign-in"];
}

/** The demo world's season: from a month back to three ahead. @param {Date} today */
function season(today) {
  const day = (/** @type {number} */ months) => {
    const date = new Date(today);
    date.setUTCMonth(date.getUTCMonth() + months, 1);
    return date.toISOString().slice(0, 10);
  };
  return { from: day(-1), to: day(3) };
}

/** @param {readonly (string | undefined)[]} cells */
function row([first = "", ...others]) {
  return `  ${first.padEnd(34)}${others.map((cell = "") => cell.padStart(12)).join("")}`.trimEnd();
}

/** @param {number} bytes */
function kilobytes(bytes) {
  return `${(bytes / 1024).toFixed(1)} KB`;
}
