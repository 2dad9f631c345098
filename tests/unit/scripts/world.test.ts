import { describe, expect, it } from "vitest";
import { accountTable, readAccounts } from "@/scripts/world.mjs";

const guardian = { role: "guardian", name: "Ana Nguyễn", email: "ana@saltgrass.example", password: "heron" };
const leader = { role: "leader", name: "Jo Ash", email: "jo@saltgrass.example", password: "dunlin" };

describe("the accounts of a demo world", () => {
  it("are read from a list or from a line each, beside other lines", () => {
    expect(readAccounts(`Seeding …\n${JSON.stringify([guardian, leader])}\n`)).toEqual([guardian, leader]);
    expect(readAccounts(`${JSON.stringify(guardian)}\n${JSON.stringify(leader)}\n`)).toEqual([guardian, leader]);
  });

  it("are missed when a seed names none", () => {
    expect(() => readAccounts("Seeded.\n")).toThrow("the seed named no accounts");
    expect(() => readAccounts("[]\n")).toThrow("the seed named no accounts");
  });

  it("are shown one a line, in columns", () => {
    expect(accountTable([guardian, leader]).split("\n")).toEqual([
      "  guardian  ana@saltgrass.example  heron   (Ana Nguyễn)",
      "  leader    jo@saltgrass.example   dunlin   (Jo Ash)",
    ]);
  });
});
