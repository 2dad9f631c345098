import AxeBuilder from "@axe-core/playwright";
import type { Page } from "@playwright/test";
import { personFor, registrationFor, registrationVisits, visits } from "./support/pages";
import { expect, test } from "./support/test";

const themes = ["light", "dark", "contrast"] as const;
/** WCAG 2.2 to level AA with its contrast of level AAA, and what the makers of axe call good practice. */
const tags = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"];
const colourRules = ["color-contrast", "color-contrast-enhanced", "link-in-text-block"];

test.describe.configure({ mode: "parallel" });

test.describe("every page, in each theme", () => {
  for (const visit of visits) {
    test(`${visit.name} is free of what axe finds, and fits 320 pixels`, async ({ open }) => {
      const page = await open(personFor(visit));
      await page.goto(await visit.path());
      await visit.act?.(page);
      await expectAccessible(page);
    });
  }

  test("a month on a narrow screen is a list of links, free of what axe finds, and fits 320 pixels", async ({ open }) => {
    const page = await open(null, { viewport: { width: 320, height: 800 } });
    await page.goto("/outings");
    await page.getByRole("button", { name: "Show as a month grid" }).click();
    await expect(page.getByRole("status").filter({ hasText: "this month" })).toBeVisible();
    await expect(page.getByRole("grid")).toHaveCount(0);
    await expectAccessible(page);
  });

  for (const visit of registrationVisits) {
    test(`${visit.name} is free of what axe finds, and fits 320 pixels`, async ({ open }) => {
      const { path, guardian } = await registrationFor(visit.until);
      const page = await open(guardian);
      await page.goto(`${path}${visit.room}`);
      if ("act" in visit) await visit.act(page);
      await expectAccessible(page);
    });
  }

  test("a child's profile is free of what axe finds, and fits 320 pixels", async ({ open }) => {
    const { guardian, participantId } = await registrationFor("needs told");
    const page = await open(guardian);
    await page.goto(`/family/children/${participantId}`);
    await expectAccessible(page);
  });
});

test("every page has a title of its own", async ({ open }) => {
  const paths = new Map<string, string[]>();
  const windows = new Map<string, Page>();
  for (const visit of visits.filter((one) => one.act === undefined)) {
    const key = typeof visit.as === "string" ? visit.as : visit.name;
    const page = windows.get(key) ?? (await open(personFor(visit)));
    windows.set(key, page);
    const path = await visit.path();
    const title = /<title>([^<]+)<\/title>/.exec(await (await page.request.get(path)).text())?.[1] ?? "";
    expect(title, path).not.toBe("");
    paths.set(title, [...(paths.get(title) ?? []), path.replace(/^\/link\/.*/, "/link")]);
  }
  for (const [title, given] of paths) expect([...new Set(given)], title).toHaveLength(1);
});

test("a look that was chosen is there from the first byte of every page, and without one the device decides", async ({ open }) => {
  const page = await open(null);
  const paper = () => page.evaluate(() => getComputedStyle(document.body).backgroundColor);
  await page.emulateMedia({ colorScheme: "dark" });
  await page.goto("/outings");
  const dark = await paper();
  await page.emulateMedia({ colorScheme: "light" });
  expect(await paper()).not.toBe(dark);

  await page.goto("/look");
  await page.getByLabel("Dark", { exact: true }).check();
  await page.getByLabel("Half as large again").check();
  await page.getByRole("button", { name: "Use these" }).click();
  await expect(page.getByText("Saved. Every page looks like this now.")).toBeVisible();
  await page.goto("/outings");
  expect(await paper()).toBe(dark);
  expect(await page.evaluate(() => getComputedStyle(document.documentElement).fontSize)).toBe("27px");
  expect(await (await page.request.get("/waiver")).text()).toMatch(/<html[^>]*data-theme="dark"[^>]*data-text="150"/);
});

async function expectAccessible(page: Page): Promise<void> {
  await expect(page.getByRole("heading", { level: 1 })).toHaveCount(1);
  await expect(page.getByRole("heading", { level: 1 })).not.toHaveText(/went wrong/);
  await expect(page.locator("html")).toHaveAttribute("lang", "en");
  await expect(page.locator("body > a").first()).toHaveText("Skip to the content");
  for (const theme of themes) {
    await page.evaluate((name) => document.documentElement.setAttribute("data-theme", name), theme);
    // The themes change colours and nothing else of the page, so what is not about colour is asked once.
    const isFirst = theme === "light";
    const runOnly = isFirst ? ({ type: "tag", values: tags } as const) : ({ type: "rule", values: colourRules } as const);
    const rules = { "color-contrast-enhanced": { enabled: true } };
    // One frame only, so the older way of running is enough, and it opens no second window.
    const axe = new AxeBuilder({ page }).setLegacyMode(true).options({ runOnly, rules, resultTypes: ["violations"] });
    const { violations, passes } = await axe.analyze();
    expect(violations.map(inWords), `${page.url()} in ${theme}`).toEqual([]);
    expect(passes.map((pass) => pass.id)).toContain("color-contrast-enhanced");
  }
  await expectNoSidewaysScroll(page, 320, "100"); // 1280 pixels at 400 %: WCAG 2.2, 1.4.10
  await expectNoSidewaysScroll(page, 640, "200"); // 1280 pixels at 200 %, with our own largest text
}

type Violation = Awaited<ReturnType<AxeBuilder["analyze"]>>["violations"][number];

function inWords({ id, nodes }: Violation): string {
  return `${id}: ${nodes.map((node) => `${node.target.join(" ")} (${node.failureSummary?.split("\n")[1]?.trim() ?? ""})`).join("; ")}`;
}

async function expectNoSidewaysScroll(page: Page, width: number, text: "100" | "200"): Promise<void> {
  await page.setViewportSize({ width, height: 800 });
  await page.evaluate((size) => document.documentElement.setAttribute("data-text", size), text);
  const tooWide = await page.evaluate(() => {
    const most = document.documentElement.clientWidth;
    if (document.documentElement.scrollWidth <= most) return [];
    return [...document.querySelectorAll("main *, header *, footer *")]
      .filter((one) => one.getBoundingClientRect().right > most + 1 && one.closest(".scroll-x") === null)
      .map((one) => `${one.tagName} ${one.className.toString().slice(0, 40)}: ${one.textContent?.slice(0, 40) ?? ""}`)
      .slice(0, 5);
  });
  expect(tooWide, `${page.url()} at ${width} pixels, text ${text} %`).toEqual([]);
}
