import { expect, it } from "vitest";
import { safeBack } from "@/lib/web/safe-back";

it.each(["/", "/family", "/outings/low-tide?from=2027-01-01#top", "/family/children/new?back=/outings"])("%s is a way back", (path) => {
  expect(safeBack(path)).toBe(path);
});

it.each([
  "//elsewhere.example", "/\\elsewhere.example", "https://elsewhere.example", "javascript:alert(1)", "elsewhere", "", "/\t/elsewhere.example",
  "/\n/elsewhere.example", "\t//elsewhere.example", null, undefined, ["/family"], 7,
])("%j leads nowhere else", (raw) => {
  const back = safeBack(raw);
  expect(new URL(back, "https://dunlin.example").origin).toBe("https://dunlin.example");
  expect(back).toBe("/account");
});
