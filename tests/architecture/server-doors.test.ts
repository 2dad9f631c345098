import ts from "typescript";
import { describe, expect, it } from "vitest";
import { directiveOf, parseSource, programPlaces, readSources, type SourceFile } from "./source-files";

const sources = readSources(...programPlaces);

const wrappers = {
  action: { formAction: "lib/web/form-action" },
  route: { httpHandler: "lib/web/http-handler", signedHandler: "lib/web/http-handler" },
} as const;

/** Exports of a route file that are settings of Next's, not doors. */
const routeSettings = new Set(["dynamic", "revalidate", "runtime", "maxDuration", "fetchCache", "preferredRegion"]);

/** What is wrong with each export that is not a use case in one of these wrappers, in words. */
function openDoors(source: SourceFile, allowed: Readonly<Record<string, string>>, settings: ReadonlySet<string> = new Set()): string[] {
  const wrapped = new Set(
    source.imports.flatMap((one) => one.names.filter((name) => allowed[name] === one.target)),
  );
  return source.tree.statements.flatMap((statement) => {
    if (ts.isExportAssignment(statement)) return [`${source.path}: the default export is not wrapped`];
    if (ts.isExportDeclaration(statement) && !statement.isTypeOnly) return [`${source.path}: export the wrapped use case where it is made`];
    if (!ts.canHaveModifiers(statement) || !isExported(statement)) return [];
    if (ts.isTypeAliasDeclaration(statement)) return [];
    if (!ts.isVariableStatement(statement)) return [`${source.path}: an exported function or class is a door without a lock`];
    return statement.declarationList.declarations.flatMap((declaration) => {
      const name = declaration.name.getText(source.tree);
      if (settings.has(name)) return [];
      const made = declaration.initializer;
      const isWrapped = made && ts.isCallExpression(made) && ts.isIdentifier(made.expression) && wrapped.has(made.expression.text);
      return isWrapped ? [] : [`${source.path}: ${name} is not made by ${Object.keys(allowed).join(" or ")}`];
    });
  });
}

function isExported(statement: ts.HasModifiers): boolean {
  return ts.getModifiers(statement)?.some((modifier) => modifier.kind === ts.SyntaxKind.ExportKeyword) ?? false;
}

/** "use server" anywhere but on the first line of a file makes an action out of a function that nobody sees from outside. */
function innerActions(source: SourceFile): string[] {
  const found: string[] = [];
  const visit = (node: ts.Node): void => {
    if (ts.isExpressionStatement(node) && ts.isStringLiteral(node.expression) && node.expression.text === "use server") {
      if (node !== source.tree.statements[0]) found.push(source.path);
    }
    ts.forEachChild(node, visit);
  };
  visit(source.tree);
  return found;
}

const actionFiles = sources.filter((source) => directiveOf(source) === "use server");
const routeFiles = sources.filter((source) => /^app\/(.*\/)?route\.tsx?$/.test(source.path));

describe("the doors to the server", () => {
  it("every export of a 'use server' file is a use case in formAction", () => {
    expect(actionFiles.flatMap((source) => openDoors(source, wrappers.action))).toEqual([]);
  });

  it("every export of a route is a use case in httpHandler or signedHandler", () => {
    expect(routeFiles.flatMap((source) => openDoors(source, wrappers.route, routeSettings))).toEqual([]);
  });

  it("no server action hides inside a component or a function", () => {
    expect(sources.flatMap(innerActions)).toEqual([]);
  });

  it("the handle on the database is held by lib/web and nobody else", () => {
    const holders = sources.filter((source) => source.imports.some((one) => one.target === "lib/web/database")).map((source) => source.path);
    expect(holders.filter((holder) => !holder.startsWith("lib/web/") && holder !== "instrumentation.ts")).toEqual([]);
    expect(holders.length).toBeGreaterThan(0);
  });

  it("no layout and no proxy decides who may see what", () => {
    const deciding = /^(notFound|redirect|permanentRedirect|unauthorized|forbidden|ask|may[A-Z].*)$/;
    const gates = sources.filter((source) => /(^|\/)(layout|template)\.tsx?$/.test(source.path) || source.path === "proxy.ts");
    expect(gates.length).toBeGreaterThan(1);
    const decisions = gates.flatMap((source) =>
      source.imports
        .filter((one) => one.names.some((name) => deciding.test(name)) || one.target.endsWith("-policy") || one.target === "lib/web/ask")
        .map((one) => `${source.path} → ${one.target}`),
    );
    expect(decisions).toEqual([]);
    expect(gates.filter((source) => source.path === "proxy.ts" && /cookie|session|NextResponse\.redirect/i.test(source.tree.text))).toEqual([]);
  });
});

describe("the check of the doors", () => {
  const doorsOf = (text: string) => openDoors(parseSource("app/actions.ts", text), wrappers.action);

  it("lets a wrapped use case through", () => {
    const text = `"use server"; import { formAction } from "@/lib/web/form-action"; export const go = formAction(x, {});`;
    expect(doorsOf(text)).toEqual([]);
  });

  it.each([
    ["a plain function", `"use server"; export async function go() {}`],
    ["an arrow function", `"use server"; export const go = async () => {};`],
    ["a default export", `"use server"; export default async function () {}`],
    ["a list of exports", `"use server"; async function go() {} export { go };`],
    ["a wrapper of one's own", `"use server"; const formAction = (x) => x; export const go = formAction(x);`],
    ["a wrapper from elsewhere", `"use server"; import { formAction } from "./mine"; export const go = formAction(x, {});`],
  ])("finds %s", (_what, text) => {
    expect(doorsOf(text)).not.toEqual([]);
  });

  it("finds an action inside a component", () => {
    expect(innerActions(parseSource("app/page.tsx", `export default function P() { async function go() { "use server"; } }`))).toHaveLength(1);
  });
});
