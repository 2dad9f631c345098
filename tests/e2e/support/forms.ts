import { expect, type Locator, type Page } from "@playwright/test";
import type { Account } from "../../../scripts/world.mjs";
import { dayAhead } from "./prepare";

/** Forms filled as people meet them: by their labels and legends. */

type Place = Page | Locator;

/** A question with a few answers; picks those with these labels. */
export async function answer(place: Place, legend: string | RegExp, ...labels: string[]): Promise<void> {
  const question = place.getByRole("group", { name: legend });
  for (const label of labels) await question.getByLabel(label, { exact: true }).check();
}

export async function fill(place: Place, texts: Record<string, string>): Promise<void> {
  for (const [label, text] of Object.entries(texts)) await place.getByLabel(label, { exact: true }).fill(text);
}

export async function press(place: Place, button: string): Promise<void> {
  await place.getByRole("button", { name: button, exact: true }).click();
}

export async function signIn(page: Page, { email, password }: Pick<Account, "email" | "password">): Promise<void> {
  await page.goto("/sign-in");
  await fill(page, { "E-mail address": email, Password: password });
  await press(page, "Sign in");
  await page.waitForURL("**/account");
}

/** What the page answers to a form that worked, once it is there. */
export async function expectSaid(page: Page, sentence: string | RegExp): Promise<void> {
  await expect(page.getByRole("status").filter({ hasText: sentence })).toBeVisible();
}

/** What the page answers to a form that did not: its summary, with focus where there are scripts. */
export function problem(page: Page): Locator {
  return page.getByRole("group", { name: "There is a problem" });
}

export type OutingTexts = { title: string; day: string; meetingText: string; seats?: string };

export async function fillOuting(page: Page, { title, day, meetingText, seats = "6" }: OutingTexts): Promise<void> {
  await fill(page, {
    Title: title,
    "Sound or theme": "Ropes, bells and water",
    "What the day is like": "A slow morning on the quay, with many stops.",
    Date: day,
    "Starts at": "09:30",
    "Ends at": "12:00",
    Seats: seats,
    "Youngest age": "8",
    "Oldest age": "14",
    "Suggested fee, in dollars": "12.50",
    "Meeting-point instructions": meetingText,
  });
  await page.getByLabel("Site", { exact: true }).selectOption({ label: "Old Ferry Landing" });
  await answer(page, "Which models come along?", "Gallop");
}

/** What a child needs, from a family that says much: a chair that is pushed, a guide at times, somebody close by. */
export async function fillNeeds(page: Page, name: string): Promise<void> {
  await answer(page, "What will you do on the day?", `Bring ${name} and come back`);
  await answer(page, `How does ${name} like to get around outdoors?`, "Walks", "Wheelchair");
  await answer(page, "With a wheelchair: how does it move?", "Pushed");
  await answer(page, `With a wheelchair: can ${name} move to a vehicle seat?`, "With one adult");
  await answer(page, "How long before a sit-down is good?", "20 minutes");
  await answer(page, "When is a guide welcome?", "Uneven ground", "Crowds");
  await answer(page, "Which arm of the guide?", "The guide's left arm");
  await answer(page, `Where does ${name} hold?`, "Above the elbow");
  await answer(page, `How much help makes a good day for ${name}?`, "Somebody close by (one adult for two)");
  await fill(page, { "One thing the leader should do (optional)": "stop where the sound is good" });
  await answer(page, `How would ${name} like printed things?`, "Contracted braille");
  await answer(page, `May we take pictures with ${name} in them?`, "No");
  await answer(page, `May recordings we keep have ${name}'s voice in them?`, "Yes");
  await fillPeople(page);
}

async function fillPeople(page: Page): Promise<void> {
  const first = (part: string) => page.getByRole("region", { name: part }).getByRole("group", { name: "First person" });
  await fill(first("Whom we call"), { Name: "Runa Aske", "Who they are to the child": "mother", "Phone number": "360 555 0188" });
  await fill(first("Who may collect"), { "Full name": "Odd Aske", "Who they are to the child": "uncle" });
}

export async function signWaiver(page: Page, name: string): Promise<void> {
  await page.getByLabel(/I am a legal guardian of .*, I have read the text above and I agree to it\./).check();
  await fill(page, { "Your full name, as your signature": name, "Today's date": dayAhead(0) });
  await press(page, "Sign");
}
