import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { matchesLock, meetsRange } from "@/scripts/install.mjs";

describe("the version of Node", () => {
  it.each([
    ["20.19.0", true],
    ["20.20.2", true],
    ["22.4.1", true],
    ["20.18.9", false],
    ["18.20.0", false],
    ["23.0.0", false],
    ["100.0.0", false],
  ])("%s is within >=20.19 <23: %s", (version, within) => {
    expect(meetsRange(version, ">=20.19 <23")).toBe(within);
  });

  it("is held against the range in package.json, which can be read", () => {
    const { engines } = JSON.parse(readFileSync("package.json", "utf8"));
    expect(meetsRange(process.versions.node, engines.node)).toBe(true);
  });

  it("is not let through by a range that cannot be read", () => {
    expect(() => meetsRange("20.20.2", "^20 || ^22")).toThrow(/cannot read/);
  });
});

describe("the installed packages", () => {
  const lock = (packages: Record<string, object>) => JSON.stringify({ packages });
  const wanted = {
    "": { name: "dunlin" },
    "node_modules/knex": { version: "3.3.0", integrity: "sha512-a" },
    "node_modules/sharp-win32": { version: "0.35.5", integrity: "sha512-b", optional: true },
  };
  const knex = { version: "3.3.0", integrity: "sha512-a" };

  it("are complete without the optional ones of other machines", () => {
    expect(matchesLock(lock(wanted), lock({ "node_modules/knex": knex }))).toBe(true);
  });

  it.each([
    ["one is missing", {}],
    ["one has another version", { "node_modules/knex": { ...knex, version: "3.2.0" } }],
    ["one has other contents", { "node_modules/knex": { ...knex, integrity: "sha512-z" } }],
    ["one is too many", { "node_modules/knex": knex, "node_modules/left": { version: "1.0.0" } }],
  ])("are installed again when %s", (_, installed) => {
    expect(matchesLock(lock(wanted), lock(installed))).toBe(false);
  });

  it("of this very checkout match its lockfile", () => {
    const installed = readFileSync("node_modules/.package-lock.json", "utf8");
    expect(matchesLock(readFileSync("package-lock.json", "utf8"), installed)).toBe(true);
  });
});
