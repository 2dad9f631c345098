import { createHmac } from "node:crypto";
import type { Page } from "@playwright/test";
import { standInSecrets } from "../../scripts/services.mjs";
import { answer, expectSaid, fill, press, problem } from "./support/forms";
import { mailsTo, mailTo } from "./support/mails";
import { layOwnGround, type OwnGround } from "./support/own-ground";
import { onPayPage, tellStandIn, webhooks } from "./support/payments";
import { demoPerson } from "./support/people";
import { family, plannedOuting, registered } from "./support/prepare";
import { expect, test as base } from "./support/test";

/** The payment service and the mail server behave badly here, so this file has a program and stand-ins of its own. */
let ground: OwnGround;

const test = base.extend<{ seat: { page: Page; id: string; name: string; email: string } }>({
  /** A family that has done everything but pay, on the fee's page. */
  seat: async ({ open }, use) => {
    const ours = await family({}, ground);
    const id = await registered(ours, await plannedOuting({}, ground), "signed", ground);
    const page = await open(ours.guardian, { ground });
    await page.goto(`/family/registrations/${id}/fee`);
    await use({ page, id, name: ours.nameUsed, email: ours.guardian.email });
  },
});

test.beforeAll(async () => {
  ground = await layOwnGround();
});
test.afterAll(async () => {
  await ground.stop();
});

const toRegistration = (page: Page, id: string) => page.goto(`/family/registrations/${id}`);
const coming = (page: Page, name: string) => page.getByText(`${name} is coming. Count-off number 1.`);

test("a payment that is declined, then left, then made buys the seat once", async ({ seat: { page, id, name } }) => {
  await press(page, "Go on");
  await onPayPage(page, "Decline");
  await expect(page.getByRole("alert")).toContainText("The payment was declined.");
  await onPayPage(page, "Go back");
  await page.waitForURL(`**/registrations/${id}/fee`);
  await expect(page.getByText("The seat is held until")).toBeVisible();
  await press(page, "Go on");
  await onPayPage(page, "Pay");
  await page.waitForURL("**/fee/thank-you");
  await tellStandIn("webhooks/settle", {}, ground);
  await toRegistration(page, id);
  await expect(coming(page, name)).toBeVisible();
  await expect(page.getByText("$12 received. Thank you.")).toBeVisible();
});

test("coming back before the payment service has spoken says so and changes nothing, once or twice", async ({ seat: { page, id, name } }) => {
  await tellStandIn("webhooks/hold", {}, ground);
  await press(page, "Go on");
  await onPayPage(page, "Pay");
  const waiting = page.getByText("We are waiting for the payment service to tell us about the payment.");
  await expect(waiting).toBeVisible();
  await page.reload();
  await expect(waiting).toBeVisible();
  await toRegistration(page, id);
  await expect(page.getByText(`A seat is held for ${name} until`)).toBeVisible();
  await tellStandIn("webhooks/release", {}, ground);
  await tellStandIn("webhooks/settle", {}, ground);
  await page.goto(`/family/registrations/${id}/fee/thank-you`);
  await expect(page.getByText("$12 has arrived. Thank you.")).toBeVisible();
  await page.goto(`/family/registrations/${id}/fee`);
  await expect(page.getByText("The fee is settled. Nothing more is to pay.")).toBeVisible();
});

test("a message that never came is made up for by asking, and changes nothing when it comes after all", async ({ seat: { page, id, name }, open }) => {
  await tellStandIn("webhooks/hold", {}, ground);
  await press(page, "Go on");
  await onPayPage(page, "Pay");
  await press(page, "Ask the payment service now");
  await expect(page.getByText("$12 has arrived. Thank you.")).toBeVisible();
  await toRegistration(page, id);
  await expect(coming(page, name)).toBeVisible();
  await tellStandIn("webhooks/release", {}, ground);
  await tellStandIn("webhooks/settle", {}, ground);
  await page.reload();
  await expect(coming(page, name)).toBeVisible();
  const staff = await open(demoPerson("coordinator", ground), { ground });
  await staff.goto("/desk");
  await expect(staff.getByRole("heading", { level: 1 })).toHaveText("Desk");
  await expect(staff.getByText(`${name}: $12,`), "a payment to be given back").toHaveCount(0);
});

test("asking about a payment that was not made says so, and the seat stays held", async ({ seat: { page, id } }) => {
  await press(page, "Go on");
  await page.waitForURL(/\/pay\/cs_test/);
  await page.goto(`/family/registrations/${id}/fee/thank-you`);
  await press(page, "Ask the payment service now");
  await expectSaid(page, "The payment service has no payment for this seat yet.");
});

test("the payment service may say the same thing twice; a message with a bad signature is refused", async ({ seat: { page, id, name }, request }) => {
  await press(page, "Go on");
  await onPayPage(page, "Pay");
  await tellStandIn("webhooks/settle", {}, ground);
  const event = (await webhooks(ground)).findLast((one) => one.type === "checkout.session.completed");
  expect(event?.attempts.map((attempt) => attempt.httpStatus)).toEqual([200]);
  expect(await tellStandIn("webhooks/redeliver", { event: event?.id ?? "" }, ground)).toEqual({ httpStatus: 200 });
  await toRegistration(page, id);
  await expect(coming(page, name)).toBeVisible();

  const body = JSON.stringify({ id: "evt_forged", object: "event", type: "checkout.session.completed" });
  const at = Math.floor(Date.now() / 1000);
  const sign = (secret: string, second: number) => `t=${second},v1=${createHmac("sha256", secret).update(`${second}.${body}`).digest("hex")}`;
  const signatures = ["", "t=1,v1=00", sign("whsec_of_somebody_else", at), sign(standInSecrets.STRIPE_WEBHOOK_SECRET, at - 3600)];
  for (const signature of signatures) {
    const answered = await request.post(`${ground.app}/api/stripe/webhook`, { headers: { "stripe-signature": signature }, data: body });
    expect(answered.status(), signature).toBe(400);
    expect(answered.headers()["content-type"]).toBe("application/problem+json");
  }
});

test("a payment page that cannot be opened is said plainly; the seat and what was typed are kept, and trying again works", async ({ seat: { page, id, name } }) => {
  await tellStandIn("fail", { calls: "2" }, ground); // the call and its one repetition
  await answer(page, "What would you like to pay?", "Another amount");
  await fill(page, { "Another amount, in dollars": "7.50" });
  await press(page, "Go on");
  await expect(problem(page)).toContainText("The payment page cannot be reached just now. Nothing was charged and your seat stays held.");
  await expect(page.getByLabel("Another amount", { exact: true })).toBeChecked();
  await expect(page.getByLabel("Another amount, in dollars")).toHaveValue("7.50");
  const other = await page.context().newPage();
  await toRegistration(other, id);
  await expect(other.getByText(`A seat is held for ${name} until`)).toBeVisible();

  await press(page, "Go on");
  await page.waitForURL(/\/pay\/cs_test/);
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Pay $7.50");
});

test("an answer of the payment service that is lost on the way opens one page, not two", async ({ seat: { page, id, name } }) => {
  await tellStandIn("fail", { calls: "1", kind: "lost-reply" }, ground);
  await press(page, "Go on");
  await onPayPage(page, "Pay");
  await tellStandIn("webhooks/settle", {}, ground);
  await toRegistration(page, id);
  await expect(coming(page, name)).toBeVisible();
});

test("with the mail server down mails are kept and shown at the desk, and go out when it is back", async ({ open }) => {
  const ours = await family({}, ground);
  const outing = await plannedOuting({}, ground);
  await registered(ours, outing, "confirmed", ground);
  const staff = await open(demoPerson("coordinator", ground), { ground });
  await expect(async () => {
    await staff.goto(`/desk/outings/${outing.slug}`);
    await staff.getByText("Show the mails").click();
    const row = staff.getByRole("row").filter({ hasText: ours.guardian.email });
    await expect(row).toContainText(/waiting to be sent/i, { timeout: 1000 });
    await expect(row).toContainText(/Tried \d+ times?\./, { timeout: 1000 });
  }).toPass();
  await staff.goto("/desk");
  await expect(staff.getByRole("heading", { name: /could not be sent yet\.$/ })).toBeVisible();

  await ground.startMail();
  await press(staff, "Send them again now");
  const mail = await mailTo(ours.guardian.email, /^Confirmed for /, ground.mailApi);
  expect(mail.text).toContain(outing.title);
  await expect(async () => {
    await staff.goto("/desk");
    await expect(staff.getByRole("heading", { name: /could not be sent yet\.$/ })).toHaveCount(0, { timeout: 1000 });
  }).toPass();
  expect(await mailsTo(ours.guardian.email, ground.mailApi)).toHaveLength(1);
});
