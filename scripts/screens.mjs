import { mkdirSync, rmSync } from "node:fs";
import { chromium } from "@playwright/test";
import { ensureBuild, startApp } from "./app.mjs";
import { ensureTestPrograms, findChromium } from "./chromium.mjs";
import { ensureDependencies } from "./install.mjs";
import { main } from "./main.mjs";
import { freePorts } from "./ports.mjs";
import { inRoot } from "./root.mjs";
import { addressesOf, standInEnvironment, startStandIns } from "./services.mjs";
import { ensureWorld, removeDatabase } from "./world.mjs";

// A picture of each main page, wide and narrow, in each theme, into .screens/, for looking.
// With words after "--", only the pages whose name holds one of them: npm run screens -- cover desk

const sizes = [1280, 360];
const themes = ["light", "dark", "contrast"];
const spit = "low-tide-at-heron-spit";

/** @type {readonly { name: string, path: string, as?: string }[]} */
const pages = [
  { name: "home", path: "/" },
  { name: "outings", path: "/outings" },
  { name: "outing", path: `/outings/${spit}` },
  { name: "models", path: "/models" },
  { name: "model", path: "/models/gallop" },
  { name: "waiver", path: "/waiver" },
  { name: "sign-in", path: "/sign-in" },
  { name: "look", path: "/look" },
  { name: "family", path: "/family", as: "guardian" },
  { name: "register", path: "/outings/ropes-and-hulls-at-old-ferry-landing/register", as: "guardian" },
  { name: "add-child", path: "/family/children/new", as: "guardian" },
  { name: "helping", path: "/helping", as: "chaperone" },
  { name: "desk", path: "/desk", as: "coordinator" },
  { name: "desk-outing", path: `/desk/outings/${spit}`, as: "coordinator" },
  { name: "desk-adults", path: `/desk/outings/${spit}/helpers`, as: "coordinator" },
  { name: "cover", path: `/desk/outings/${spit}/cover`, as: "coordinator" },
  { name: "papers", path: `/desk/outings/${spit}/papers`, as: "coordinator" },
  { name: "plan", path: "/desk/outings/new", as: "coordinator" },
  { name: "people", path: "/desk/people", as: "admin" },
  { name: "field", path: `/field/${spit}`, as: "leader" },
];

await main(async (processes) => {
  await ensureDependencies(processes);
  await ensureTestPrograms(processes);
  await ensureBuild(processes);
  const ports = await freePorts();
  const databaseFile = inRoot(".data", "screens", "dunlin.sqlite");
  const filesDir = inRoot(".data", "screens", "files");
  removeDatabase(databaseFile);
  const env = { ...standInEnvironment(ports), DUNLIN_ENV: "demo", DATABASE_FILE: databaseFile, FILES_DIR: filesDir };
  const world = await ensureWorld(processes, { databaseFile, filesDir, env });
  if (world === null) throw new Error("the world for the screens was not made");
  await startStandIns(processes, ports, { output: "kept" });
  await startApp(processes, ports, { env, output: "kept" });
  await takeAll(addressesOf(ports).app, world.accounts, process.argv.slice(2));
});

/** @param {string} base @param {import("./world.mjs").Account[]} accounts @param {string[]} only */
async function takeAll(base, accounts, only) {
  const folder = inRoot(".screens");
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(folder, { recursive: true });
  const browser = await chromium.launch({ executablePath: findChromium(process.env) ?? undefined, args: ["--no-sandbox", "--disable-gpu"] });
  try {
    const wanted = pages.filter((page) => only.length === 0 || only.some((word) => page.name.includes(word)));
    for (const as of new Set(wanted.map((page) => page.as))) {
      const context = await browser.newContext({ baseURL: base });
      const tab = await context.newPage();
      if (as) await signIn(tab, accounts.find((account) => account.role === as));
      for (const page of wanted.filter((one) => one.as === as)) await takePage(tab, page, base, folder);
      await context.close();
    }
    console.log(`Pictures are in ${folder}`);
  } finally {
    await browser.close();
  }
}

/** @param {import("@playwright/test").Page} tab @param {import("./world.mjs").Account | undefined} account */
async function signIn(tab, account) {
  if (!account) throw new Error("the demo world has no such account");
  await tab.goto("/sign-in");
  await tab.getByLabel("E-mail address", { exact: true }).fill(account.email);
  await tab.getByLabel("Password", { exact: true }).fill(account.password);
  await tab.getByRole("button", { name: "Sign in", exact: true }).click();
  await tab.waitForURL("**/account");
}

/** @param {import("@playwright/test").Page} tab @param {{ name: string, path: string }} page @param {string} base @param {string} folder */
async function takePage(tab, page, base, folder) {
  for (const theme of themes) {
    await tab.context().addCookies([{ name: "dunlin_look", value: `${theme}/100`, url: base }]);
    for (const width of sizes) {
      await tab.setViewportSize({ width, height: width > 600 ? 900 : 720 });
      await tab.goto(page.path);
      await tab.waitForLoadState("networkidle");
      await tab.screenshot({ path: `${folder}/${page.name}-${theme}-${width}.png`, fullPage: true });
    }
  }
}
