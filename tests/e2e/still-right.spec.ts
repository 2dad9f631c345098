import { registrationFor } from "./support/pages";
import { expect, test } from "./support/test";

test("what a family told before is on the form as it was told, and sending it as still right changes nothing", async ({ open }) => {
  const { path, guardian, participantId } = await registrationFor("needs told");
  const page = await open(guardian);
  const chosen = () =>
    page.getByRole("main").locator("input").evaluateAll((inputs) =>
      inputs.flatMap((input) => {
        if (!(input instanceof HTMLInputElement) || input.type === "hidden") return [];
        if (input.type !== "checkbox" && input.type !== "radio") return [`${input.name}: ${input.value}`];
        return input.checked ? [`${input.name}: ${input.value}`] : [];
      }),
    );
  await page.goto(`/family/children/${participantId}`);
  await page.getByLabel("Long cane").uncheck();
  await page.getByLabel("Walks").check();
  await page.getByRole("button", { name: "Save" }).click();
  await expect(page.getByRole("status")).toContainText("Saved.");
  await page.goto(`/family/children/${participantId}`);
  await page.waitForLoadState("networkidle");
  const before = await chosen();
  // One tick, the first of its group: where a form that ticks by itself would show.
  expect(before.filter((line) => line.startsWith("travel: "))).toEqual(["travel: walks"]);

  await page.goto(`${path}/needs`);
  await page.getByRole("button", { name: "Still right: send this" }).click();
  await page.waitForURL(`**${path}`);
  await page.goto(`/family/children/${participantId}`);
  await page.waitForLoadState("networkidle");
  expect(await chosen()).toEqual(before);
});
