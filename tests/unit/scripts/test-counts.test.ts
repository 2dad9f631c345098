import { describe, expect, it } from "vitest";
import { addCounts, countOne, countPlaywright, countsLine, countVitest, withFault } from "@/scripts/test-counts.mjs";

const file = (name: string, status: string, tests: string[]) => ({
  name: `/somewhere/dunlin/tests/${name}`,
  status,
  assertionResults: tests.map((each) => ({ status: each })),
});
const report = (...testResults: object[]) => JSON.stringify({ testResults });

describe("the last line", () => {
  it("counts what passed and failed, and what was skipped only when something was", () => {
    expect(countsLine({ passed: 12, failed: 0, skipped: 0 })).toBe("12 passed, 0 failed");
    expect(countsLine({ passed: 12, failed: 1, skipped: 2 })).toBe("12 passed, 1 failed, 2 skipped");
  });

  it("adds all steps up", () => {
    const all = [countOne(true), countOne(false), { passed: 40, failed: 2, skipped: 3 }];
    expect(addCounts(all)).toEqual({ passed: 41, failed: 3, skipped: 3 });
  });
});

describe("a run of the unit tests", () => {
  it("is counted by the folder under tests/", () => {
    const counts = countVitest(
      report(
        file("unit/cover/bands.test.ts", "passed", ["passed", "passed"]),
        file("unit/money.test.ts", "failed", ["passed", "failed"]),
        file("integration/register.test.ts", "passed", ["passed", "skipped", "todo", "pending"]),
      ),
    );
    expect(Object.fromEntries(counts)).toEqual({
      unit: { passed: 3, failed: 1, skipped: 0 },
      integration: { passed: 1, failed: 0, skipped: 3 },
    });
  });

  it("counts a file that does not load as a failure, though no test in it failed", () => {
    const counts = countVitest(report(file("unit/broken.test.ts", "failed", [])));
    expect(counts.get("unit")).toEqual({ passed: 0, failed: 1, skipped: 0 });
  });
});

describe("a run in the browser", () => {
  const stats = (values: object) => JSON.stringify({ stats: { expected: 0, unexpected: 0, flaky: 0, skipped: 0, ...values } });

  it("counts a test that passed only on the second try as failed", () => {
    expect(countPlaywright(stats({ expected: 5, flaky: 1, skipped: 2 }))).toEqual({ passed: 5, failed: 1, skipped: 2 });
  });

  it("that reports no failure but did not end well is one", () => {
    expect(withFault(countPlaywright(stats({ expected: 5 })), false)).toEqual({ passed: 5, failed: 1, skipped: 0 });
  });

  it("in which nothing ran is a failure", () => {
    expect(withFault(countPlaywright(stats({})), true).failed).toBe(1);
    expect(withFault(countPlaywright(stats({ skipped: 4 })), true).failed).toBe(1);
  });

  it("that failed keeps its own count", () => {
    expect(withFault(countPlaywright(stats({ expected: 5, unexpected: 3 })), false).failed).toBe(3);
  });
});
