import type { Page } from "@playwright/test";
import { answer, expectSaid, fill, fillNeeds, fillOuting, press, signIn, signWaiver } from "./support/forms";
import { eventIn, linkIn, mailTo, type Mail } from "./support/mails";
import { readPaper, type ReadPaper } from "./support/paper";
import { onPayPage } from "./support/payments";
import { demoPerson, freshAddress } from "./support/people";
import { accountOf } from "./support/place";
import { dayAhead } from "./support/prepare";
import { expect, test } from "./support/test";

const title = "Bells & buoys at Old Ferry Landing";
const slug = "bells-buoys-at-old-ferry-landing";
const day = dayAhead(49);
const meetingText = [
  "Meet on the ticket porch of the old ferry house.",
  "1. From the bus stop, face the water. The gulls are in front of you.",
  "2. Follow the rail with your left hand for 60 steps.\n3. Where the planks begin, call out. Linnea answers.",
].join("\n\n");

const guardian = { name: "Runa Aske", email: freshAddress("runa"), password: "tides come twice a day" };
const chaperone = { name: "Linnea Bø", email: freshAddress("linnea"), password: "steady left elbow" };
const child = { nameUsed: "Juno", legalName: "Junona Aske-Holm", birthDate: `${Number(day.slice(0, 4)) - 12}-01-03` };

// One long walk: each step begins where the one before it ended, in the browser windows of the same people.
test("an outing goes from the coordinator's plan to the roster in the leader's hands", async ({ open }) => {
  test.setTimeout(240_000);
  const coordinator = await open(null);
  const family = await open(null);

  await test.step("a coordinator plans an outing and publishes it", () => planAndPublish(coordinator));
  await test.step("a family finds it, makes an account and adds a child", () => arrive(family));
  await test.step("the family holds a seat, says what the child needs and signs", () => register(family));
  await test.step("the family pays by card and the seat is theirs", () => pay(family));
  await test.step("the confirmation says everything in plain text, with a calendar file", confirmationMail);
  await test.step("a chaperone is invited and says what they can do", async () => inviteChaperone(coordinator, await open(null)));
  await test.step("the coordinator asks two chaperones and a leader", () => askAdults(coordinator));
  await test.step("a chaperone says yes from the mail, without signing in", async () => answerFromMail(await open(null)));
  await test.step("another says yes on the own page", async () => answerFromHelping(await open(demoPerson("chaperone"))));
  const leader = await open(null);
  await test.step("the leader comes in by a link from a mail and says yes", () => answerAsLeader(leader));
  await test.step("the coordinator pairs the child and reads that the day is covered", () => checkCover(coordinator));
  await test.step("the roster is printed in both forms", () => printRosters(coordinator));
  await test.step("the adults are told where to meet", () => sendMeetingPoint(coordinator));
  await test.step("the leader has the day and its roster", () => leadTheDay(leader));
  await test.step("the desk has nothing left to do", () => readDesk(coordinator));
});

async function planAndPublish(page: Page): Promise<void> {
  await signIn(page, accountOf("coordinator"));
  await page.getByRole("link", { name: "Desk", exact: true }).click();
  await page.getByRole("link", { name: "Plan an outing" }).click();
  await fillOuting(page, { title, day, meetingText });
  await press(page, "Save as a draft");
  await page.waitForURL(`**/desk/outings/${slug}`);
  await expect(page.getByText("This is a draft. Nobody can register before it is published.")).toBeVisible();
  await press(page, "Publish");
  await expectSaid(page, `${title} is published. Families can register now.`);
}

async function arrive(page: Page): Promise<void> {
  await page.goto("/outings");
  await page.getByRole("link", { name: title }).click();
  await expect(page.getByRole("heading", { level: 2, name: "6 places left" })).toBeVisible();
  await expect(page.getByText("Linnea answers"), "where to meet is for those who come").toHaveCount(0);
  await page.getByRole("link", { name: "Register a child" }).click();
  await page.waitForURL("**/sign-in?back=**");
  await page.getByRole("link", { name: "Make a family account" }).click();
  await fill(page, { "Your name": guardian.name, "E-mail address": guardian.email, "Choose a password": guardian.password });
  await press(page, "Make the account");
  await expectSaid(page, "Nearly there: open the mail we have sent");
  await page.goto(linkIn(await mailTo(guardian.email, /^Confirm your e-mail/)));
  await press(page, "Yes, this is my address");
  await page.waitForURL(`**/outings/${slug}/register`); // where the way to the account began
  await page.getByRole("main").getByRole("link", { name: "Add a child" }).click();
  await fill(page, {
    "What name does the group use?": child.nameUsed,
    "Legal name": child.legalName,
    "Date of birth": child.birthDate,
  });
  await press(page, "Add");
  await page.waitForURL(`**/outings/${slug}/register`);
}

async function register(page: Page): Promise<void> {
  await expect(page.getByLabel(child.nameUsed)).toBeChecked();
  await press(page, "Hold a seat");
  await expect(page.getByText(`A seat is held for ${child.nameUsed} until`)).toBeVisible();
  await page.getByRole("link", { name: "Go on: what your child needs" }).click();
  await fillNeeds(page, child.nameUsed);
  await press(page, "Send this");
  await page.getByRole("link", { name: "Go on: the waiver" }).click();
  await expect(page.getByRole("heading", { name: "What can go wrong" })).toBeVisible();
  await signWaiver(page, guardian.name);
  await expect(page.getByText(`Signed by ${guardian.name} on`)).toBeVisible();
}

async function pay(page: Page): Promise<void> {
  await page.getByRole("link", { name: "Go on: the fee" }).click();
  await expect(page.getByLabel("The suggested fee, $12.50")).toBeChecked();
  await press(page, "Go on");
  await onPayPage(page, "Pay");
  await page.waitForURL("**/fee/thank-you");
  await expect(async () => {
    await page.reload();
    await expect(page.getByText("$12.50 has arrived. Thank you.")).toBeVisible({ timeout: 1000 });
  }).toPass();
  await page.getByRole("link", { name: "Back to the registration" }).click();
  await expect(page.getByText(`${child.nameUsed} is coming. Count-off number 1.`)).toBeVisible();
}

async function confirmationMail(): Promise<void> {
  const mail = await mailTo(guardian.email, /^Confirmed for /);
  for (const said of [title, "Old Ferry Landing", "9:30 a.m. to noon", "Received: $12.50", meetingText, "/family/registrations/"]) {
    expect(mail.text).toContain(said);
  }
  expectSameWords(mail);
  const event = await eventIn(mail);
  expect(event.summary).toBe(title);
  expect(event.location).toBe("Old Ferry Landing");
  expect(event.startDate.toJSDate().toLocaleString("sv-SE", { timeZone: "America/Los_Angeles" })).toBe(`${day} 09:30:00`);
  expect(event.endDate.toJSDate().toLocaleString("sv-SE", { timeZone: "America/Los_Angeles" })).toBe(`${day} 12:00:00`);
}

/** The plain text is the whole letter: every word of the HTML is in it. */
function expectSameWords({ html, text }: Mail): void {
  const body = html.replace(/<head>[\s\S]*<\/head>/, "").replaceAll(/<[^>]+>/g, " ");
  const words = body.replaceAll("&amp;", "&").replaceAll("&#x27;", "'").replaceAll("&quot;", '"').split(/\s+/);
  expect(words.length).toBeGreaterThan(30);
  expect(words.filter((word) => !text.includes(word))).toEqual([]);
}

async function inviteChaperone(staff: Page, page: Page): Promise<void> {
  await staff.goto("/desk/people");
  const invite = staff.getByRole("region", { name: "Invite somebody" });
  await fill(invite, { Name: chaperone.name, "E-mail address": chaperone.email });
  await answer(invite, "What will they do?", "Chaperone: comes along and guides");
  await press(invite, "Send the invitation");
  await expectSaid(staff, `${chaperone.name} is invited as chaperone`);

  await page.goto(linkIn(await mailTo(chaperone.email, /invited you/)));
  await expect(page.getByLabel("Your name")).toHaveValue(chaperone.name);
  await fill(page, { "Choose a password": chaperone.password });
  await press(page, "Start");
  await page.waitForURL("**/account");
  await page.getByRole("link", { name: "Helping: what you are asked, and where to meet" }).click();
  for (const can of ["I am 18 or older", "I guide with my left arm", "I push a wheelchair on uneven ground"]) {
    await page.getByLabel(can).check();
  }
  await press(page, "Save");
  await expectSaid(page, "Saved. Thank you.");
  await expect(page.getByText("You are not cleared yet")).toBeVisible();

  const clearance = staff.getByRole("region", { name: "Who helps" }).filter({ has: staff.getByLabel("Person", { exact: true }) });
  await staff.reload();
  await clearance.getByLabel("Person", { exact: true }).selectOption({ label: chaperone.name });
  await fill(clearance, { "Cleared to": dayAhead(200) });
  await press(clearance, "Save");
  await expectSaid(staff, `${chaperone.name} is cleared to`);
}

async function askAdults(page: Page): Promise<void> {
  await page.goto(`/desk/outings/${slug}`);
  await page.getByRole("navigation", { name: "This outing" }).getByRole("link", { name: "Adults" }).click();
  await answer(page, "What for?", "To come as a chaperone");
  await answer(page, "Whom?", chaperone.name, accountOf("chaperone").name);
  await press(page, "Ask by mail");
  await expectSaid(page, "2 people are asked by mail.");
  await answer(page, "What for?", "To lead the outing");
  await answer(page, "Whom?", accountOf("leader").name);
  await press(page, "Ask by mail");
  await expectSaid(page, "One person is asked by mail.");
}

async function answerFromMail(page: Page): Promise<void> {
  const mail = await mailTo(chaperone.email, /^Can you help on /);
  expect(mail.text).toContain(title);
  await page.goto(linkIn(mail));
  await answer(page, "Will you come?", "Yes, I am coming");
  await press(page, "Send my answer");
  await expectSaid(page, `Thank you: you are coming to ${title}.`);
  await page.goto("/helping");
  await page.waitForURL("**/sign-in?back=**"); // the link answered; it signed nobody in
}

async function answerFromHelping(page: Page): Promise<void> {
  await page.goto("/helping");
  const request = page.getByRole("region", { name: title });
  await answer(request, "Will you come", "Yes");
  await press(request, "Send my answer");
  await expectSaid(page, `Your answer for ${title} is yes.`);
}

async function answerAsLeader(page: Page): Promise<void> {
  const { email } = accountOf("leader");
  await page.goto("/sign-in");
  await fill(page, { "E-mail address for the link": email });
  await press(page, "Send me a link");
  await expectSaid(page, "a link is on its way");
  await page.goto(linkIn(await mailTo(email, /^Your link to sign in/)));
  await press(page, "Sign me in");
  await page.waitForURL("**/account");
  await page.goto("/helping");
  const request = page.getByRole("region", { name: title });
  await expect(request.getByText("You are asked to lead.")).toBeVisible();
  await answer(request, "Will you come", "Yes");
  await press(request, "Send my answer");
  await expectSaid(page, `Your answer for ${title} is yes.`);
}

async function checkCover(page: Page): Promise<void> {
  await page.goto(`/desk/outings/${slug}/cover`);
  await expect(page.getByRole("complementary", { name: "Caution" })).toBeVisible();
  await page.getByLabel(`1 ${child.nameUsed}`).selectOption({ label: chaperone.name });
  await press(page, "Save the pairs");
  await expectSaid(page, "Saved. Covered: 1 person, 3 adults who count.");
  await press(page, "Check again");
  await expectSaid(page, "Checked just now. Covered: 1 person, 3 adults who count.");
  await expect(page.getByRole("region", { name: chaperone.name }).getByText(child.nameUsed)).toBeVisible();
}

async function printRosters(page: Page): Promise<void> {
  await page.getByRole("navigation", { name: "This outing" }).getByRole("link", { name: "Papers" }).click();
  await press(page, "Make the roster");
  await expectSaid(page, "Roster version 1 is made.");
  const standard = await readPaper(page, await paperAddress(page, /version 1, standard/));
  expectRoster(standard);
  for (const tag of ["Document", "H1", "H2", "Table", "TR", "TH", "TD", "L", "LI"]) expect(standard.tags).toMatch(new RegExp(`^ *${tag}\\b`, "m"));

  await answer(page, "Which form?", "Large print, one person a block");
  await fill(page, { "Size of large print, in points": "24" });
  await press(page, "Make the roster");
  await expect(page.getByRole("link", { name: /version 1, large print, 24 point/ })).toBeVisible();
  const large = await readPaper(page, await paperAddress(page, /version 1, large print/));
  expectRoster(large);
  for (const tag of ["Document", "H1", "H2", "L", "LI"]) expect(large.tags).toMatch(new RegExp(`^ *${tag}\\b`, "m"));
}

async function paperAddress(page: Page, name: RegExp): Promise<string> {
  return (await page.getByRole("link", { name }).first().getAttribute("href")) ?? "";
}

/** Number, name, adult and what to do, in the text and in the tags; and nothing that must never be on paper. */
function expectRoster({ text, tags, info }: ReadPaper): void {
  expect(info).toMatch(/Tagged: +yes/);
  expect(info).toContain("Bells & buoys at Old Ferry Landing");
  expect(tags).toContain(`"${child.nameUsed}"`);
  for (const said of [`1 ${child.nameUsed}`, chaperone.name, accountOf("leader").name, "stop where the sound is good"]) {
    expect(text).toContain(said);
  }
  expect(text).toMatch(/push the chair/i);
  const never = [
    "360 555 0188", guardian.name, guardian.email, "Odd Aske", child.legalName, "Holm", child.birthDate, "3 January",
    "12.50", "fee", "paid",
  ];
  for (const word of never) expect(text.toLowerCase()).not.toContain(word.toLowerCase());
}

async function sendMeetingPoint(page: Page): Promise<void> {
  await page.goto(`/desk/outings/${slug}`);
  await press(page, "Mail it to the adults who come");
  await expectSaid(page, "The meeting point goes to 3 adults");
  const mail = await mailTo(chaperone.email, /^Where to meet on /);
  expect(mail.text).toContain(meetingText);
  expect(mail.text).toContain("360 555 0142");
  expect(mail.text, "no child in a mail").not.toContain(child.nameUsed);
  expectSameWords(mail);
}

async function leadTheDay(page: Page): Promise<void> {
  await page.goto("/field");
  await page.getByRole("link", { name: title }).click();
  await expect(page.getByText("1 person and 3 adults. Number 1; every number is taken.")).toBeVisible();
  const line = page.getByRole("listitem").filter({ hasText: `1 ${child.nameUsed}` }).first();
  await expect(line).toContainText(`with ${chaperone.name}`);
  await expect(line).toContainText("stop where the sound is good");
  expectRoster(await readPaper(page, await paperAddress(page, /version 1, large print/)));
}

async function readDesk(page: Page): Promise<void> {
  await expect(async () => {
    await page.goto(`/desk/outings/${slug}`);
    await expect(page.getByText("Ready: nothing is missing.")).toBeVisible({ timeout: 1000 });
  }).toPass();
}
