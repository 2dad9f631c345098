import { answer, expectSaid, fill, fillNeeds, fillOuting, press, problem, signIn, signWaiver } from "./support/forms";
import { linkIn, mailTo } from "./support/mails";
import { accountOf } from "./support/place";
import { demoPerson, somebody } from "./support/people";
import { bornYearsAgo, dayAhead, helper, plannedOuting } from "./support/prepare";
import { expect, test } from "./support/test";

const noScripts = { javaScriptEnabled: false };

test("a family signs in, adds a child and gets a no-fee place", async ({ open }) => {
  test.setTimeout(90_000);
  const outing = await plannedOuting();
  const page = await open(null, noScripts);
  await page.goto("/");
  await page.getByRole("link", { name: "See the next outings" }).click();
  await page.getByRole("link", { name: outing.title }).click();
  await page.getByRole("link", { name: "Register a child" }).click();
  await page.waitForURL("**/sign-in?back=**");
  const { email, password } = accountOf("guardian");
  await fill(page, { "E-mail address": email, Password: password });
  await press(page, "Sign in");
  await page.waitForURL(`**/outings/${outing.slug}/register`); // back to where the way was begun

  await page.getByRole("link", { name: "Add another child" }).click();
  await fill(page, { "What name does the group use?": "Íris", "Legal name": "Íris Vega", "Date of birth": bornYearsAgo(9) });
  await press(page, "Add");
  await page.waitForURL(`**/outings/${outing.slug}/register`);
  await answer(page, "Who is coming?", "Íris");
  await press(page, "Hold a seat");
  await page.getByRole("link", { name: "Go on: what your child needs" }).click();
  await fillNeeds(page, "Íris");
  await press(page, "Send this");
  await page.getByRole("link", { name: "Go on: the waiver" }).click();
  await signWaiver(page, "Marisol Vega");
  await page.getByRole("link", { name: "Go on: the fee" }).click();
  await answer(page, "What would you like to pay?", "A no-fee place");
  await press(page, "Go on");
  await expect(page.getByText("Íris is coming. Count-off number 1.")).toBeVisible();
});

test("a form with something wrong says what, leads there, and keeps everything that was typed and chosen", async ({ open }) => {
  const page = await open(demoPerson("coordinator"), noScripts);
  await page.goto("/desk/outings/new");
  await fillOuting(page, { title: "Kept as typed", day: "9 January", meetingText: "1. One leg.\n2. Another leg." });
  await page.getByLabel("Site", { exact: true }).selectOption({ label: "Cinder Hill" });
  await press(page, "Save as a draft");
  await problem(page).getByRole("link", { name: "Enter a date as year, month and day, such as 2027-01-09." }).click();
  await expect(page.getByLabel("Date", { exact: true })).toBeFocused();
  await expect(page.getByLabel("Date", { exact: true })).toHaveValue("9 January");
  await expect(page.getByLabel("Date", { exact: true })).toHaveAttribute("aria-invalid", "true");
  await expect(page.getByLabel("Title", { exact: true })).toHaveValue("Kept as typed");
  await expect(page.getByLabel("Meeting-point instructions")).toHaveValue("1. One leg.\n2. Another leg.");
  await expect(page.getByLabel("Site", { exact: true }).locator("option:checked")).toHaveText("Cinder Hill");
  await expect(page.getByLabel("Gallop", { exact: true })).toBeChecked();
  await expect(page.getByLabel("Step and leap", { exact: true })).not.toBeChecked();

  const day = dayAhead(40);
  await fill(page, { Date: day });
  await press(page, "Save as a draft");
  await page.waitForURL(/\/desk\/outings\/kept-as-typed(#|$)/);
  await expect(page.getByText("This is a draft.")).toBeVisible();
  await press(page, "Publish");
  await expect(page.getByText("Published, and open for registration.")).toBeVisible();
});

test("radio buttons stay chosen when another answer is missing, and a password is never sent back", async ({ open }) => {
  const page = await open(null, noScripts);
  await page.goto("/sign-up");
  await fill(page, { "Your name": "Runa Aske", "E-mail address": "runa", "Choose a password": "a secret of ten letters" });
  await press(page, "Make the account");
  await expect(problem(page)).toContainText("Enter an e-mail address like name@example.org.");
  await expect(page.getByLabel("Your name")).toHaveValue("Runa Aske");
  await expect(page.getByLabel("E-mail address", { exact: true })).toHaveValue("runa");
  await expect(page.getByLabel("Choose a password")).toHaveValue("");
  expect(await page.content()).not.toContain("a secret of ten letters");

  const staff = await open(demoPerson("admin"), noScripts);
  await staff.goto("/desk/people");
  const invite = staff.getByRole("region", { name: "Invite somebody" });
  await answer(invite, "What will they do?", "Leader: runs the day");
  await press(invite, "Send the invitation");
  await expect(problem(staff)).toContainText("Enter a name.");
  await expect(invite.getByLabel("Leader: runs the day")).toBeChecked();
});

test("the look is chosen", async ({ open }) => {
  const page = await open(null, noScripts);
  await page.goto("/look");
  await answer(page, "Text size", "Twice as large");
  await answer(page, "Colours", "High contrast: white and yellow on black");
  await press(page, "Use these");
  await expectSaid(page, "Saved. Every page looks like this now.");
  await page.goto("/models");
  await expect(page.locator("html")).toHaveAttribute("data-theme", "contrast");
  await expect(page.locator("html")).toHaveAttribute("data-text", "200");
});

test("a chaperone answers by the link of a mail, and changes the answer by the same link", async ({ open }) => {
  const outing = await plannedOuting();
  const chaperone = await helper(outing);
  const link = linkIn(await mailTo(chaperone.email, /^Can you help on /));
  const page = await open(null, noScripts);
  await page.goto(link);
  await press(page, "Send my answer");
  await expect(problem(page)).toContainText("Choose yes, maybe or no.");
  await answer(page, "Will you come?", "Maybe");
  await press(page, "Send my answer");
  await expectSaid(page, `Noted as a maybe for ${outing.title}.`);
  await page.goto(link);
  await expect(page.getByText("Your answer so far: maybe.")).toBeVisible();
  await answer(page, "Will you come?", "Yes, I am coming");
  await press(page, "Send my answer");
  await expectSaid(page, `Thank you: you are coming to ${outing.title}.`);
});

test("a link in a mail signs in, once", async ({ open }) => {
  const who = somebody("Runa Aske", "guardian");
  const page = await open(null, noScripts);
  await page.goto("/sign-in");
  await fill(page, { "E-mail address for the link": who.email });
  await press(page, "Send me a link");
  const link = linkIn(await mailTo(who.email, /^Your link to sign in/));
  await page.goto(link);
  await press(page, "Sign me in");
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Hello, Runa Aske");
  await press(page, "Sign out");
  await page.goto("/family");
  await page.waitForURL("**/sign-in?back=**");
  await page.goto(link);
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("This link has been used already");
});

test("a wrong password is said without telling whether the account exists", async ({ open }) => {
  const page = await open(null, noScripts);
  const sentence = "This address and password do not fit together";
  for (const email of [somebody("Runa Aske", "guardian").email, "nobody.at.all@saltgrass.example"]) {
    await page.goto("/sign-in");
    await fill(page, { "E-mail address": email, Password: "not the right one" });
    await press(page, "Sign in");
    await expect(problem(page)).toContainText(sentence);
    await expect(page.getByLabel("E-mail address", { exact: true })).toHaveValue(email);
  }
  await signIn(page, accountOf("leader"));
});
