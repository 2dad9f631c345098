import type { Page } from "@playwright/test";
import { place, type Ground } from "./place";

type Deliveries = { events: { id: string; type: string; delivery: string; attempts: { httpStatus: number | null }[] }[] };

/** A control of the payment stand-in, such as "webhooks/hold". Its answer is JSON. */
export async function tellStandIn<Answer = unknown>(control: string, fields: Record<string, string> = {}, ground: Ground = place()): Promise<Answer> {
  const response = await fetch(`${ground.stripe}/_stand-in/${control}`, { method: "POST", body: new URLSearchParams(fields) });
  if (!response.ok) throw new Error(`${control} answered ${response.status}`);
  return (await response.json()) as Answer;
}

/** The events the stand-in has told or keeps back. */
export async function webhooks(ground: Ground = place()): Promise<Deliveries["events"]> {
  const response = await fetch(`${ground.stripe}/_stand-in/webhooks`);
  return ((await response.json()) as Deliveries).events;
}

/** Waits on the stand-in's own page, and presses one of its three answers. */
export async function onPayPage(page: Page, answer: "Pay" | "Decline" | "Go back"): Promise<void> {
  await page.waitForURL(/\/pay\/cs_test/);
  const name = answer === "Pay" ? /^Pay \$/ : answer;
  await page.getByRole("button", { name }).click();
}
