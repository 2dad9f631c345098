import type { Page } from "@playwright/test";
import { dayAhead, plannedOuting } from "./support/prepare";
import { expect, test } from "./support/test";

type Listed = { title: string; month: string; state: string };

async function openGrid(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Show as a month grid" }).click();
  await expect(page.getByRole("grid")).toBeVisible();
}

const count = (page: Page) => page.getByRole("region", { name: "Month grid" }).getByRole("status").filter({ hasText: "this month" });

test("the list of outings is whole without scripts, month by month, and a month without any says so", async ({ open }) => {
  const page = await open(null, { javaScriptEnabled: false });
  await page.goto("/outings");
  await expect(page.getByRole("heading", { level: 2 })).toHaveCount(6);
  for (const title of ["Low tide at Heron Spit", "Frogs at Alder Bog", "Ropes and hulls at Old Ferry Landing"]) {
    await expect(page.getByRole("heading", { level: 3, name: title })).toBeVisible();
  }
  await expect(page.getByText("Owls and answers at Cinder Hill"), "a draft").toHaveCount(0);
  const months = page.locator("main section");
  const counts = await months.evaluateAll((all) => all.map((one) => one.querySelectorAll("h3").length));
  const words = await months.evaluateAll((all) => all.map((one) => one.textContent?.includes("No outings this month.") ?? false));
  expect(counts).toContain(0);
  expect(words).toEqual(counts.map((count) => count === 0));
});

test("nothing of the month grid is loaded until it is asked for", async ({ open }) => {
  const page = await open(null);
  const scripts: string[] = [];
  page.on("response", (response) => {
    if (response.url().includes("/_next/static/") && response.url().includes(".js")) scripts.push(response.url());
  });
  let asked = 0;
  page.on("request", (request) => {
    if (request.url().includes("/api/outings")) asked += 1;
  });
  await page.goto("/outings", { waitUntil: "networkidle" });
  const hasCalendar = async (addresses: string[]) => {
    const texts = await Promise.all(addresses.map(async (address) => (await page.request.get(address)).text()));
    return texts.some((text) => text.includes("dayGridMonth"));
  };
  const before = [...scripts];
  expect(before.length).toBeGreaterThan(0);
  expect(await hasCalendar(before)).toBe(false);
  expect(asked).toBe(0);
  await openGrid(page);
  const after = scripts.filter((address) => !before.includes(address));
  expect(await hasCalendar(after)).toBe(true);
  expect(asked).toBeGreaterThan(0);
});

test("the grid shows the same outings as the list, month for month", async ({ open }) => {
  const page = await open(null);
  // Again from the start if another test's outing appears between the reading of the list and that of the grid.
  await expect(() => compareMonths(page)).toPass({ timeout: 40_000 });
});

async function compareMonths(page: Page): Promise<void> {
  await page.goto("/outings");
  const sections = page.locator("main section[aria-labelledby^=month-]");
  const listed = await sections.evaluateAll((all) => all.map((one) => [...one.querySelectorAll("h3")].map((h3) => h3.textContent ?? "")));
  expect(listed.flat()).toContain("Low tide at Heron Spit");
  await openGrid(page);
  for (const [index, titles] of listed.entries()) {
    if (index > 0) await page.getByRole("button", { name: "Month after" }).click();
    const words = titles.length === 0 ? "No outings this month." : `${titles.length} outing${titles.length === 1 ? "" : "s"} this month.`;
    await expect(count(page)).toHaveText(words, { timeout: 3000 });
    for (const title of titles) await expect(page.getByRole("grid").getByRole("link", { name: title })).toBeVisible({ timeout: 3000 });
  }
}

test("an outing in the grid is a link to its page, on the day at the site, reached by the keyboard", async ({ open }) => {
  const outing = await plannedOuting({ day: dayAhead(20) });
  // Somebody who reads from the other side of the world: the day is still the day at the site.
  const page = await open(null, { timezoneId: "Asia/Tokyo" });
  await page.goto("/outings");
  await openGrid(page);
  await expect(count(page)).toBeVisible();
  const link = page.getByRole("grid").getByRole("link", { name: outing.title });
  if ((await link.count()) === 0) await page.getByRole("button", { name: "Month after" }).click();
  await expect(link).toBeVisible();
  await expect(page.locator(`td[data-date="${outing.day}"]`)).toContainText(outing.title);
  await link.focus();
  await page.keyboard.press("Enter");
  await page.waitForURL(`**/outings/${outing.slug}`);
});

test("a month without outings says so in the grid as well", async ({ open }) => {
  const page = await open(null);
  await page.goto("/outings");
  await openGrid(page);
  for (let months = 0; months < 12; months += 1) await page.getByRole("button", { name: "Month after" }).click();
  await expect(count(page)).toHaveText("No outings this month.");
  await expect(page.getByRole("grid")).toBeVisible();
});

test("the grid says so when the outings cannot be loaded, and the list stays", async ({ open }) => {
  const page = await open(null);
  await page.route("**/api/outings?**", (route) => route.abort());
  await page.goto("/outings");
  await openGrid(page);
  await expect(page.getByText("The outings could not be loaded. The list below is complete.")).toBeVisible();
  await expect(page.getByRole("heading", { level: 3, name: "Low tide at Heron Spit" })).toBeVisible();
});

test("the outings are given as JSON for a range, and a range that makes no sense is refused with the reason", async ({ request }) => {
  const good = await request.get(`/api/outings?from=${dayAhead(0)}&to=${dayAhead(180)}`);
  expect(good.status()).toBe(200);
  const titles = ((await good.json()) as Listed[]).map((outing) => outing.title);
  expect(titles).toContain("Low tide at Heron Spit");
  expect(titles).not.toContain("Owls and answers at Cinder Hill");

  const refusals = [
    ["", "from"],
    ["?from=today&to=tomorrow", "from"],
    ["?from=2027-02-30&to=2027-03-30", "from"],
    ["?from=2027-03-01&to=2027-02-01", "form"],
    ["?from=2027-01-01&to=2029-01-01", "form"],
  ] as const;
  for (const [query, field] of refusals) {
    const response = await request.get(`/api/outings${query}`);
    expect(response.status(), query).toBe(400);
    expect(response.headers()["content-type"], query).toBe("application/problem+json");
    const problem = (await response.json()) as { status: number; title: string; fields: Record<string, string> };
    expect(problem, query).toMatchObject({ status: 400, title: "invalid" });
    expect(problem.fields[field], query).toMatch(/\w+.*\.$/);
  }
});

test("an outing's calendar file is for everybody and does not say where to meet", async ({ request }) => {
  const outing = await plannedOuting({ meetingText: "Wait at the blue door behind the mill." });
  const response = await request.get(`/api/outings/${outing.slug}/calendar.ics`);
  expect(response.headers()["content-type"]).toContain("text/calendar");
  const text = await response.text();
  expect(text).toContain("BEGIN:VEVENT");
  expect(text).not.toContain("blue door");
});
