import type { Locator, Page } from "@playwright/test";
import { problem } from "./support/forms";
import { linkIn, mailTo } from "./support/mails";
import { freshAddress } from "./support/people";
import { dayAhead, bornYearsAgo, plannedOuting, type OutingMade } from "./support/prepare";
import { expect, test } from "./support/test";

/** Nothing in this file touches a mouse, and no control is reached but by Tab. */

const guardian = { name: "Una Keyes", email: freshAddress("una"), password: "every key and no mouse" };

/** Goes on with Tab until something has focus, and sees that the focus shows. */
async function reach(page: Page, target: Locator): Promise<void> {
  await target.waitFor();
  for (let presses = 0; presses < 150; presses += 1) {
    await page.keyboard.press("Tab");
    if (await target.evaluate((one) => one === document.activeElement)) return expectFocusShows(page);
  }
  throw new Error(`Tab did not reach ${String(target)}`);
}

async function expectFocusShows(page: Page): Promise<void> {
  const outline = await page.evaluate(() => {
    const { outlineStyle, outlineWidth } = getComputedStyle(document.activeElement ?? document.body);
    return { outlineStyle, width: Number.parseFloat(outlineWidth) };
  });
  expect(outline.outlineStyle).not.toBe("none");
  expect(outline.width).toBeGreaterThanOrEqual(2);
}

async function follow(page: Page, name: string | RegExp): Promise<void> {
  await reach(page, page.getByRole("link", { name }).first());
  await page.keyboard.press("Enter");
}

async function press(page: Page, name: string): Promise<void> {
  await reach(page, page.getByRole("button", { name, exact: true }));
  await page.keyboard.press("Enter");
}

async function type(page: Page, label: string, text: string, place: Page | Locator = page): Promise<void> {
  await reach(page, place.getByLabel(label, { exact: true }));
  await page.keyboard.press("ControlOrMeta+A");
  await page.keyboard.insertText(text);
}

async function tick(page: Page, legend: string, label: string): Promise<void> {
  const box = page.getByRole("group", { name: legend }).getByLabel(label, { exact: true });
  await reach(page, box);
  await page.keyboard.press("Space");
  await expect(box).toBeChecked();
}

/** A group of radio buttons is one stop: Tab enters it, the arrows choose. */
async function choose(page: Page, legend: string, label: string): Promise<void> {
  const group = page.getByRole("group", { name: legend });
  const wanted = group.getByLabel(label, { exact: true });
  const chosen = group.getByRole("radio", { checked: true });
  await reach(page, (await chosen.count()) > 0 ? chosen : group.getByRole("radio").first());
  if (!(await wanted.isChecked())) await page.keyboard.press("Space");
  for (let presses = 0; presses < 10 && !(await wanted.isChecked()); presses += 1) await page.keyboard.press("ArrowDown");
  await expect(wanted).toBeChecked();
}

test("a family gets its seat with the keyboard alone", async ({ page }) => {
  test.setTimeout(150_000);
  const outing = await plannedOuting();
  await test.step("the first stop leads past the header", () => skipHeader(page));
  await test.step("from the list to an account", () => makeAccount(page, outing));
  await test.step("a child and a seat", () => holdSeat(page));
  await test.step("what the child needs, with what was forgotten pointed out", () => sayNeeds(page));
  await test.step("the waiver and a no-fee place", () => signAndSettle(page));
});

async function skipHeader(page: Page): Promise<void> {
  await page.goto("/outings");
  await page.keyboard.press("Tab");
  const skip = page.getByRole("link", { name: "Skip to the content" });
  await expect(skip).toBeFocused();
  await expect(skip).toBeInViewport();
  await expectFocusShows(page);
  await page.keyboard.press("Enter");
  await expect(page.getByRole("main")).toBeFocused();
  await page.keyboard.press("Tab");
  await expect(page.getByRole("button", { name: "Show as a month grid" })).toBeFocused();
}

async function makeAccount(page: Page, outing: OutingMade): Promise<void> {
  await follow(page, outing.title);
  await page.waitForURL(`**/outings/${outing.slug}`);
  await follow(page, "Register a child");
  await page.waitForURL("**/sign-in?back=**");
  await follow(page, "Make a family account");
  await page.waitForURL("**/sign-up?back=**");
  await press(page, "Make the account");
  await expectSummary(page);
  await follow(page, "Enter a name.");
  await expect(page.getByLabel("Your name")).toBeFocused();
  await page.keyboard.insertText(guardian.name);
  await type(page, "E-mail address", guardian.email);
  await type(page, "Choose a password", guardian.password);
  await page.keyboard.press("Enter"); // a form is sent from any of its fields
  await expect(page.getByRole("status").filter({ hasText: "Nearly there" })).toBeVisible();
  await page.goto(linkIn(await mailTo(guardian.email, /^Confirm your e-mail/)));
  await press(page, "Yes, this is my address");
  await page.waitForURL("**/register");
}

async function holdSeat(page: Page): Promise<void> {
  await follow(page, "Add a child");
  await page.waitForURL("**/family/children/new?back=**");
  await type(page, "What name does the group use?", "Ebba");
  await type(page, "Legal name", "Ebba Keyes");
  await type(page, "Date of birth", bornYearsAgo(10));
  await press(page, "Add");
  await page.waitForURL("**/register");
  await press(page, "Hold a seat");
  await page.waitForURL("**/family/registrations/*");
  await follow(page, "Go on: what your child needs");
  await page.waitForURL("**/needs");
}

async function sayNeeds(page: Page): Promise<void> {
  await choose(page, "What will you do on the day?", "Stay with Ebba");
  await tick(page, "How does Ebba like to get around outdoors?", "Long cane");
  await choose(page, "How long before a sit-down is good?", "40 minutes");
  await tick(page, "When is a guide welcome?", "New places");
  await choose(page, "Which arm of the guide?", "The guide's right arm");
  await choose(page, "Where does Ebba hold?", "Wrist");
  await choose(page, "How would Ebba like printed things?", "Audio");
  await choose(page, "May we take pictures with Ebba in them?", "Yes");
  await choose(page, "May recordings we keep have Ebba's voice in them?", "No");
  const first = (part: string) => page.getByRole("region", { name: part }).getByRole("group", { name: "First person" });
  await type(page, "Name", guardian.name, first("Whom we call"));
  await type(page, "Phone number", "360 555 0199", first("Whom we call"));
  await type(page, "Full name", guardian.name, first("Who may collect"));
  await press(page, "Send this");
  await expectSummary(page);
  await follow(page, "Choose how much help makes a good day.");
  const levels = page.getByRole("group", { name: "How much help makes a good day for Ebba?" });
  await expect(levels.getByRole("radio").first()).toBeFocused();
  await page.keyboard.press("Space");
  for (let presses = 0; presses < 3; presses += 1) await page.keyboard.press("ArrowDown");
  await expect(levels.getByLabel("Little or no extra help (one adult for five)")).toBeChecked();
  await expect(page.getByLabel("New places")).toBeChecked();
  await press(page, "Send this");
  await page.waitForURL(/registrations\/[\w-]+$/);
}

async function signAndSettle(page: Page): Promise<void> {
  await follow(page, "Go on: the waiver");
  await page.waitForURL("**/waiver");
  const agree = page.getByRole("checkbox", { name: /I agree to it/ });
  await reach(page, agree);
  await page.keyboard.press("Space");
  await type(page, "Your full name, as your signature", guardian.name);
  await type(page, "Today's date", dayAhead(0));
  await press(page, "Sign");
  await page.waitForURL(/registrations\/[\w-]+$/);
  await follow(page, "Go on: the fee");
  await page.waitForURL("**/fee");
  await choose(page, "What would you like to pay?", "A no-fee place");
  await press(page, "Go on");
  await expect(page.getByText("Ebba is coming. Count-off number 1.")).toBeVisible();
}

/** What is wrong takes the focus, and the page's title says it too. */
async function expectSummary(page: Page): Promise<void> {
  await expect(problem(page)).toBeFocused();
  await expect(page).toHaveTitle(/^Error: /);
}

test("a disclosure opens and closes with the keyboard, and a month is turned with it", async ({ page }) => {
  await page.goto("/outings");
  await press(page, "Show as a month grid");
  await expect(page.getByRole("grid")).toBeVisible();
  const heading = page.getByRole("region", { name: "Month grid" }).getByRole("heading", { level: 2 });
  const before = await heading.textContent();
  await press(page, "Month after");
  await expect(heading).not.toHaveText(before ?? "");
  await expect(page.getByRole("button", { name: "Month after" })).toBeFocused();
});
