import { readdirSync, readFileSync } from "node:fs";
import { expect, it } from "vitest";

/** The whole of the top level. Something new belongs inside one of these, or is decided about here first. */
const ours = [
  "app", "components", "lib", "db", "migrations", "seeds", "emails", "fonts", "tests", "scripts", "README.md", "DEVELOPERS.md",
  "package.json", "tsconfig.json", "next.config.mjs", "tailwind.config.ts", "knexfile.ts", "docker-compose.fake-services.yml",
];
const wantedByTools = [
  "package-lock.json", ".npmrc", ".ci", ".gitignore", ".env.example", "eslint.config.mjs", "vitest.config.ts",
  "playwright.config.ts", "postcss.config.mjs", "proxy.ts", "instrumentation.ts",
];

const ignored = readFileSync(".gitignore", "utf8").split("\n").filter((line) => line !== "").map((line) => line.replace(/\/$/, ""));

const isIgnored = (name: string) => ignored.includes(name) || name.endsWith(".tsbuildinfo") || name === ".git";

it("the top level holds exactly what was decided, and nothing is lying about", () => {
  const there = readdirSync(".").filter((name) => !isIgnored(name)).sort();
  expect(there).toEqual([...ours, ...wantedByTools].sort());
});
