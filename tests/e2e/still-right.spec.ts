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
  await page.waitForLoadState("networkidle");
  const before = await chosen();
  // A child has some ways of getting around, never all five: a form that ticks by itself would show here.
  const ways = before.filter((line) => line.startsWith("travel: "));
  expect(ways.length).toBeGreaterThan(0);
  expect(ways.length).toBeLessThan(5);

  await page.goto(`${path}/needs`);
  await page.getByRole("button", { name: "Still right: send this" }).click();
  await page.waitForURL(`**${path}`);
  await page.goto(`/family/children/${participantId}`);
  await page.waitForLoadState("networkidle");
  expect(await chosen()).toEqual(before);
});
