import { describe, expect, it } from "vitest";
import { centsFromTyped, moneyInWords, typedFromCents } from "@/lib/shared/money";

describe("an amount that is typed", () => {
  it.each([
    ["12", 1200],
    ["12.5", 1250],
    ["12.50", 1250],
    ["$12.50", 1250],
    ["$ 12", 1200],
    [" 0.07 ", 7],
    ["1,200", 120_000],
    ["1200", 120_000],
    ["1,234,567.89", 123_456_789],
    ["0", 0],
    ["007", 700],
  ])("%j is %i cents", (typed, cents) => expect(centsFromTyped(typed)).toBe(cents));

  it.each(["", "twelve", "-5", "12.345", "12.", ".50", "1,2", "12,50", "1e3", "Infinity", "0x10", "12 dollars", "１２", "$$5", "5$"])("%j is none", (typed) => {
    expect(centsFromTyped(typed)).toBeNull();
  });

  it("of every number of cents up to a hundred dollars reads back as the same", () => {
    for (let cents = 0; cents <= 10_000; cents += 1) expect(centsFromTyped(typedFromCents(cents))).toBe(cents);
  });
});

it("money in words has cents only where there are some", () => {
  expect([0, 1200, 1250, 7, 120_000].map((cents) => moneyInWords({ cents, currency: "usd" }))).toEqual(["$0", "$12", "$12.50", "$0.07", "$1,200"]);
});
