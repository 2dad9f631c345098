import type { Page } from "@playwright/test";
import { listOwnParticipants } from "@/lib/families/participant-store";
import { listAnswersOf } from "@/lib/helpers/helper-store";
import { findOuting } from "@/lib/outings/outing-store";
import { pairPeople } from "@/lib/cover-board/pair-people";
import { answer, expectSaid, fill, fillOuting, press, problem } from "./support/forms";
import { readPaper } from "./support/paper";
import { contextOf, databaseOf, demoPerson, somebody } from "./support/people";
import { bornYearsAgo, dayAhead, family, helper, must, plannedOuting, registered } from "./support/prepare";
import { expect, test } from "./support/test";

const notFound = (page: Page) => page.getByRole("heading", { level: 1, name: "We could not find that page" });
const titles = async (page: Page, title: string) => {
  await page.goto("/desk");
  return page.getByRole("main").getByRole("link", { name: title });
};

test.describe("a form sent twice makes one", () => {
  test("pressed twice in a row", async ({ open }) => {
    const page = await open(demoPerson("coordinator"));
    await page.goto("/desk/outings/new");
    await fillOuting(page, { title: "Pressed twice", day: dayAhead(80), meetingText: "1. Come." });
    await page.getByRole("button", { name: "Save as a draft" }).dblclick();
    await page.waitForURL("**/desk/outings/pressed-twice");
    await expect(await titles(page, "Pressed twice")).toHaveCount(1);
  });

  test("arriving twice at the server", async ({ open }) => {
    const page = await open(demoPerson("coordinator"), { javaScriptEnabled: false });
    await page.goto("/desk/outings/new");
    await fillOuting(page, { title: "Arriving twice", day: dayAhead(80), meetingText: "1. Come." });
    const sent = page.waitForRequest((request) => request.method() === "POST");
    await press(page, "Save as a draft");
    await page.waitForURL("**/desk/outings/arriving-twice");
    const request = await sent;
    const again = await page.request.post(request.url(), {
      headers: { "content-type": request.headers()["content-type"] ?? "", origin: new URL(request.url()).origin },
      data: request.postDataBuffer() ?? "",
      maxRedirects: 0,
    });
    expect(again.headers().location).toBe("/desk/outings/arriving-twice");
    await expect(await titles(page, "Arriving twice")).toHaveCount(1);
  });

  test("sent, gone back to, and sent again", async ({ open }) => {
    const guardian = somebody("Runa Aske", "guardian");
    const page = await open(guardian);
    await page.goto("/family");
    await page.getByRole("link", { name: "Add a child" }).click();
    const child = { "What name does the group use?": "Tuva", "Legal name": "Tuva Aske", "Date of birth": bornYearsAgo(10) };
    await fill(page, child);
    await press(page, "Add");
    await page.waitForURL(/\/family\/children\/(?!new)/);
    await page.goBack();
    await page.waitForURL("**/family/children/new");
    await fill(page, child);
    await press(page, "Add");
    // The same again: either it is known to be the same form, or the same child is pointed out.
    await expect(problem(page).or(page.getByRole("heading", { level: 1, name: "Tuva" }))).toBeVisible();
    expect(listOwnParticipants(databaseOf(), guardian.personId)).toHaveLength(1);
  });

  test("a seat asked for twice is one seat", async ({ open }) => {
    const ours = await family();
    const outing = await plannedOuting();
    const page = await open(ours.guardian);
    await page.goto(`/outings/${outing.slug}/register`);
    await page.getByRole("button", { name: "Hold a seat" }).dblclick();
    await page.waitForURL("**/family/registrations/*");
    const first = page.url();
    await page.goto(`/outings/${outing.slug}/register`);
    await press(page, "Hold a seat");
    await page.waitForURL(first);
    expect(findOuting(databaseOf(), { slug: outing.slug }, new Date().toISOString())?.seatsFree).toBe(5);
  });
});

test("of two coordinators who change the same outing the second is told, and keeps what was typed", async ({ open }) => {
  const outing = await plannedOuting();
  const [first, second] = [await open(demoPerson("coordinator")), await open(demoPerson("admin"))];
  for (const page of [first, second]) await page.goto(`/desk/outings/${outing.slug}/edit`);
  await fill(first, { "Sound or theme": "Chosen first" });
  await press(first, "Save the changes");
  await first.waitForURL(`**/desk/outings/${outing.slug}`);
  await fill(second, { "Sound or theme": "Chosen second", "Meeting-point instructions": "1. Typed with care." });
  await press(second, "Save the changes");
  await expect(problem(second)).toContainText("Somebody else changed this outing after you opened it.");
  await expect(problem(second)).toBeFocused();
  await expect(second.getByLabel("Sound or theme")).toHaveValue("Chosen second");
  await expect(second.getByLabel("Meeting-point instructions")).toHaveValue("1. Typed with care.");
  await first.goto(`/outings/${outing.slug}`);
  await expect(first.getByText("Chosen first")).toBeVisible();
});

test("a form sent after signing out in another tab is refused in words and keeps what was typed", async ({ open }) => {
  const guardian = somebody("Runa Aske", "guardian");
  const page = await open(guardian);
  await page.goto("/family/children/new");
  await fill(page, { "What name does the group use?": "Tuva", "Legal name": "Tuva Aske", "Date of birth": bornYearsAgo(10) });
  const other = await page.context().newPage();
  await other.goto("/account");
  await press(other, "Sign out");
  await other.waitForURL((url) => url.pathname === "/");
  await press(page, "Add");
  await expect(problem(page)).toContainText("You are signed out, so this was not saved. What you typed is still here");
  await expect(page.getByLabel("What name does the group use?")).toHaveValue("Tuva");
  await expect(page.getByLabel("Date of birth")).toHaveValue(bornYearsAgo(10));
  expect(listOwnParticipants(databaseOf(), guardian.personId)).toEqual([]);
});

test.describe("seats", () => {
  test("a full outing puts the next child on the waiting list and says which place", async ({ open }) => {
    const outing = await plannedOuting({ seats: 1 });
    await registered(await family(), outing, "confirmed");
    await registered(await family(), outing, "held"); // number 1 on the list
    const ours = await family({ nameUsed: "Tuva" });
    const page = await open(ours.guardian);
    await page.goto(`/outings/${outing.slug}`);
    await expect(page.getByRole("heading", { name: "Full" })).toBeVisible();
    await page.getByRole("link", { name: "Join the waiting list" }).click();
    await press(page, "Put on the waiting list");
    await expect(page.getByText("Tuva is number 2 on the waiting list.")).toBeVisible();
  });

  test("the last seat goes to one of two who ask at the same moment; the other waits first in line", async ({ open }) => {
    const outing = await plannedOuting({ seats: 1 });
    const pages = await Promise.all([await family(), await family()].map(({ guardian }) => open(guardian)));
    for (const page of pages) await page.goto(`/outings/${outing.slug}/register`);
    await Promise.all(pages.map((page) => press(page, "Hold a seat")));
    await Promise.all(pages.map((page) => page.waitForURL("**/family/registrations/*")));
    const said = await Promise.all(pages.map((page) => page.getByRole("main").innerText()));
    expect(said.filter((text) => text.includes("A seat is held for Sol"))).toHaveLength(1);
    expect(said.filter((text) => text.includes("Sol is number 1 on the waiting list"))).toHaveLength(1);
  });

  test("a child outside the ages is refused with the ages and what to do", async ({ open }) => {
    const ours = await family({ nameUsed: "Lill", age: 6 });
    const outing = await plannedOuting();
    const page = await open(ours.guardian);
    await page.goto(`/outings/${outing.slug}/register`);
    await press(page, "Hold a seat");
    await expect(problem(page)).toContainText("Lill will be 6 on the day, and this outing is for ages 8 to 14. Choose another outing, or call us");
    await expect(page.getByLabel("Lill")).toBeChecked();
  });

  test("a seat that was given back goes to the family that waits", async ({ open }) => {
    const outing = await plannedOuting({ seats: 1 });
    const [leaving, waiting] = [await family({ nameUsed: "Ask" }), await family({ nameUsed: "Embla" })];
    const id = await registered(leaving, outing, "confirmed");
    const other = await registered(waiting, outing, "held");
    const page = await open(leaving.guardian);
    await page.goto(`/family/registrations/${id}`);
    await press(page, "Withdraw Ask");
    await expect(problem(page)).toContainText("Tick the box to give the seat back.");
    await page.getByLabel("Yes, give the seat back").check();
    await press(page, "Withdraw Ask");
    await expect(page.getByText("Ask is not registered for this outing.")).toBeVisible();
    const next = await open(waiting.guardian);
    await next.goto(`/family/registrations/${other}`);
    await expect(next.getByText("A seat is held for Embla until")).toBeVisible();
  });
});

test("an outing in the past is not planned, and everything typed stays", async ({ open }) => {
  const page = await open(demoPerson("coordinator"));
  await page.goto("/desk/outings/new");
  await fillOuting(page, { title: "Yesterday's waves", day: dayAhead(-1), meetingText: "1. Come." });
  await press(page, "Save as a draft");
  await expect(problem(page)).toContainText("Enter a date that is still to come.");
  await expect(page.getByLabel("Title", { exact: true })).toHaveValue("Yesterday's waves");
  await expect(page.getByLabel("Site", { exact: true }).locator("option:checked")).toHaveText("Old Ferry Landing");
  await expect(page.getByLabel("Gallop", { exact: true })).toBeChecked();
});

test("a name with any letters goes from the form to the roster", async ({ open }) => {
  const name = "Nguyễn Ánh-Łucja O’Brien Ωμέγα Жанна";
  const guardian = somebody("Søren Ğül", "guardian");
  const page = await open(guardian);
  await page.goto("/family/children/new");
  await fill(page, { "What name does the group use?": name, "Legal name": name, "Date of birth": bornYearsAgo(12) });
  await press(page, "Add");
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(name);
  const [child] = listOwnParticipants(databaseOf(), guardian.personId);
  const outing = await plannedOuting();
  const id = await registered({ guardian, participantId: child?.id ?? "", nameUsed: name }, outing, "confirmed");
  const chaperone = await helper(outing, { answer: "yes", name: "Þóra Ďurišová" });
  must(await pairPeople(contextOf(demoPerson("coordinator")), { slug: outing.slug, pair: { [id]: chaperone.personId } }));

  const staff = await open(demoPerson("coordinator"));
  await staff.goto(`/desk/outings/${outing.slug}/papers`);
  for (const form of ["Standard, one table", "Large print, one person a block"]) {
    await answer(staff, "Which form?", form);
    await press(staff, "Make the roster");
    const made = staff.getByRole("link", { name: new RegExp(`version 1, ${form.startsWith("S") ? "standard" : "large print"}`) });
    const { tags } = await readPaper(staff, (await made.getAttribute("href")) ?? "");
    const spoken = tags.normalize("NFC").replaceAll(/"\s+"/g, " ").replaceAll(/\s+/g, " ");
    for (const part of name.split(" ")) expect(spoken).toContain(part);
    expect(spoken).toContain("Þóra");
  }
});

test.describe("what is not somebody's own is not found", () => {
  test("the desk for a chaperone, a guardian and a leader", async ({ open }) => {
    for (const role of ["chaperone", "guardian", "leader"] as const) {
      const page = await open(demoPerson(role));
      for (const path of ["/desk", "/desk/people", "/desk/messages", "/desk/outings/low-tide-at-heron-spit/cover"]) {
        const response = await page.goto(path);
        await expect(notFound(page), `${role} at ${path}`).toBeVisible();
        expect(response?.status(), path).toBe(404);
      }
    }
  });

  test("a roster, but for the desk and the leader of that day", async ({ open }) => {
    const outing = await plannedOuting();
    await registered(await family({ nameUsed: "Tuva" }), outing, "confirmed");
    const [leader, chaperone] = [await helper(outing, { task: "leader", answer: "yes" }), await helper(outing, { answer: "yes" })];
    const page = await open(leader);
    await page.goto(`/field/${outing.slug}`);
    await press(page, "Make the roster");
    await expectSaid(page, "Roster version 1 is made.");
    const address = (await page.getByRole("link", { name: /Roster version 1/ }).getAttribute("href")) ?? "";
    expect((await page.request.get(address)).status()).toBe(200);

    const others = [chaperone, demoPerson("leader"), demoPerson("guardian"), null];
    for (const who of others) {
      const other = await open(who);
      const answered = await other.request.get(address);
      expect([401, 403, 404], `${who?.name ?? "nobody"}: ${answered.status()}`).toContain(answered.status());
      expect(await answered.text()).not.toContain("%PDF");
      if (who) {
        await other.goto(`/field/${outing.slug}`);
        await expect(notFound(other)).toBeVisible();
      }
    }
  });

  test("another family's registration, child and waiver", async ({ open }) => {
    const ours = await family({ nameUsed: "Tuva" });
    const id = await registered(ours, await plannedOuting(), "held");
    const page = await open(somebody("Another Family", "guardian"));
    for (const path of [`/family/registrations/${id}`, `/family/registrations/${id}/needs`, `/family/registrations/${id}/waiver`, `/family/registrations/${id}/fee`, `/family/children/${ours.participantId}`]) {
      await page.goto(path);
      await expect(notFound(page), path).toBeVisible();
      expect(await page.content()).not.toContain("Tuva");
    }
  });

  test("a draft, but for the desk", async ({ open }) => {
    const draft = await plannedOuting({ isDraft: true });
    const page = await open(null);
    await page.goto(`/outings/${draft.slug}`);
    await expect(notFound(page)).toBeVisible();
    const staff = await open(demoPerson("coordinator"));
    await staff.goto(`/outings/${draft.slug}`);
    await expect(staff.getByText("A draft: only staff see this page.")).toBeVisible();
  });
});

test("a chaperone whose yes becomes a no is nobody's adult any more", async ({ open }) => {
  const outing = await plannedOuting();
  const id = await registered(await family({ nameUsed: "Tuva" }), outing, "confirmed");
  const chaperone = await helper(outing, { answer: "yes", name: "Gro Moe" });
  must(await pairPeople(contextOf(demoPerson("coordinator")), { slug: outing.slug, pair: { [id]: chaperone.personId } }));
  const staff = await open(demoPerson("coordinator"));
  await staff.goto(`/desk/outings/${outing.slug}/cover`);
  await expect(staff.getByRole("region", { name: "Gro Moe" }).getByText("Tuva")).toBeVisible();

  const page = await open(chaperone);
  await page.goto("/helping");
  await answer(page, `Will you come to ${outing.title}?`, "No");
  await press(page, "Send my answer");
  await expectSaid(page, `Your answer for ${outing.title} is no.`);
  expect(listAnswersOf(databaseOf(), findOuting(databaseOf(), { slug: outing.slug }, new Date().toISOString())?.id ?? "").map((one) => one.state)).toEqual(["no"]);
  await staff.reload();
  await expect(staff.getByRole("region", { name: "Nobody yet" }).getByText("Tuva")).toBeVisible();
});
