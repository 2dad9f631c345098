import { ESLint } from "eslint";
import { expect, it } from "vitest";

/** What the lint rules of this project are for, each shown once to be caught. */
const caught: [file: string, code: string, rule: string][] = [
  ["lib/people/x.ts", `import { headers } from "next/headers"; headers();`, "@typescript-eslint/no-restricted-imports"],
  ["lib/people/x.ts", `import { useState } from "react"; useState();`, "@typescript-eslint/no-restricted-imports"],
  ["lib/people/x.ts", `import knex from "knex"; knex({});`, "@typescript-eslint/no-restricted-imports"],
  ["lib/people/x.ts", `import { database } from "@/lib/web/database"; database();`, "@typescript-eslint/no-restricted-imports"],
  ["app/page.tsx", `import { findPerson } from "@/lib/people/person-store"; findPerson();`, "@typescript-eslint/no-restricted-imports"],
  ["app/page.tsx", `import { knex } from "@/db/connection"; knex("people");`, "@typescript-eslint/no-restricted-imports"],
  ["components/ui/x.tsx", `import { x } from "@/app/x"; x();`, "@typescript-eslint/no-restricted-imports"],
  ["emails/x.ts", `import { x } from "@/components/x"; x();`, "@typescript-eslint/no-restricted-imports"],
  ["lib/people/x.ts", `export async function f() { await knex.transaction(async () => {}); }`, "no-restricted-syntax"],
  ["lib/people/x.ts", `export const f = () => knex.transaction(() => 1);`, "no-restricted-syntax"],
  ["lib/people/x.ts", `export async function f() { await conn.transaction(() => 1); }`, "no-restricted-syntax"],
  ["lib/people/x.ts", `export async function f() { return await knex("people"); }`, "no-restricted-syntax"],
  ["lib/people/x.ts", `export async function f() { return await knex("people").where({ id: 1 }).select("id"); }`, "no-restricted-syntax"],
  ["lib/people/x.ts", `export const q = knex("people").select("*");`, "no-restricted-syntax"],
  ["lib/people/index.ts", `export { findPerson } from "./person-store";`, "no-restricted-syntax"],
  ["lib/people/index.ts", `export * from "./person";`, "no-restricted-syntax"],
  ["lib/people/x.ts", `export interface Person { id: string }`, "no-restricted-syntax"],
  ["lib/people/x.ts", `export const x = (y: string | null) => y!.length;`, "@typescript-eslint/no-non-null-assertion"],
  ["lib/people/x.ts", `export const x = (y: any) => y;`, "@typescript-eslint/no-explicit-any"],
  ["lib/people/x.ts", `import { Person } from "./person"; export type X = Person;`, "@typescript-eslint/consistent-type-imports"],
  ["lib/people/x.ts", `// @ts-ignore\nexport const x = 1;`, "@typescript-eslint/ban-ts-comment"],
];

it("what the house style forbids is an error while typing, and cannot be switched off in a file", { timeout: 60_000 }, async () => {
  const eslint = new ESLint();
  const rulesOf = async (code: string, filePath: string) => (await eslint.lintText(code, { filePath })).flatMap((one) => one.messages.map((m) => m.ruleId));
  for (const [file, code, rule] of caught) expect(await rulesOf(code, file), code).toContain(rule);
  const silenced = `/* eslint-disable */\nexport const x = (y: any) => y;`;
  expect(await rulesOf(silenced, "lib/people/x.ts")).toContain("@typescript-eslint/no-explicit-any");
});

it("migrations and seeds may await their queries", { timeout: 60_000 }, async () => {
  const eslint = new ESLint();
  const code = `export async function up(knex: (table: string) => Promise<unknown>) { await knex("people"); }`;
  const [result] = await eslint.lintText(code, { filePath: "migrations/x.ts" });
  expect(result?.messages).toEqual([]);
});
