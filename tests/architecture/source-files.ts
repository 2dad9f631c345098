import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import ts from "typescript";

export type Import = {
  /** A path from the root without its ending ("lib/shared/money") for our own files, else the package as written. */
  target: string;
  isOurs: boolean;
  /** Gone after compiling: types only. */
  isType: boolean;
  names: readonly string[];
};

export type SourceFile = { path: string; tree: ts.SourceFile; imports: readonly Import[] };

const root = process.cwd();

/** Every TypeScript file of the program under these folders or files, with what it imports. */
export function readSources(...places: string[]): SourceFile[] {
  return places.flatMap((place) => filesUnder(place)).map(readSource);
}

/** What the program itself is made of. */
export const programPlaces = ["app", "components", "emails", "lib", "db", "proxy.ts", "instrumentation.ts"];

function filesUnder(place: string): string[] {
  if (/\.tsx?$/.test(place)) return [place];
  return readdirSync(path.join(root, place), { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile() && /\.tsx?$/.test(entry.name))
    .map((entry) => path.relative(root, path.join(entry.parentPath, entry.name)))
    .sort();
}

function readSource(file: string): SourceFile {
  return parseSource(file, readFileSync(path.join(root, file), "utf8"));
}

export function parseSource(file: string, text: string): SourceFile {
  const kind = file.endsWith("x") ? ts.ScriptKind.TSX : ts.ScriptKind.TS;
  const tree = ts.createSourceFile(file, text, ts.ScriptTarget.Latest, true, kind);
  return { path: file, tree, imports: importsOf(file, tree) };
}

function importsOf(file: string, tree: ts.SourceFile): Import[] {
  const found: Import[] = [];
  const visit = (node: ts.Node): void => {
    if (ts.isImportDeclaration(node) && ts.isStringLiteral(node.moduleSpecifier)) {
      const clause = node.importClause;
      const isType = clause?.phaseModifier === ts.SyntaxKind.TypeKeyword || onlyTypes(clause);
      found.push({ ...placeOf(file, node.moduleSpecifier.text), isType, names: namesOf(clause) });
    } else if (ts.isExportDeclaration(node) && node.moduleSpecifier && ts.isStringLiteral(node.moduleSpecifier)) {
      found.push({ ...placeOf(file, node.moduleSpecifier.text), isType: node.isTypeOnly, names: [] });
    } else if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
      const [what] = node.arguments;
      if (what && ts.isStringLiteral(what)) found.push({ ...placeOf(file, what.text), isType: false, names: [] });
    }
    ts.forEachChild(node, visit);
  };
  visit(tree);
  return found;
}

function onlyTypes(clause: ts.ImportClause | undefined): boolean {
  const named = clause?.namedBindings;
  if (!clause || clause.name || !named || !ts.isNamedImports(named)) return false;
  return named.elements.length > 0 && named.elements.every((element) => element.isTypeOnly);
}

function namesOf(clause: ts.ImportClause | undefined): string[] {
  const named = clause?.namedBindings;
  const bound = named && ts.isNamedImports(named) ? named.elements.map((element) => (element.propertyName ?? element.name).text) : [];
  return clause?.name ? ["default", ...bound] : bound;
}

function placeOf(file: string, specifier: string): Pick<Import, "target" | "isOurs"> {
  if (specifier.startsWith("@/")) return { target: specifier.slice(2), isOurs: true };
  if (specifier.startsWith(".")) return { target: path.join(path.dirname(file), specifier), isOurs: true };
  return { target: specifier, isOurs: false };
}

/** "next" of "next/navigation", "@scope/name" of "@scope/name/part". */
export function packageOf(target: string): string {
  return target.split("/").slice(0, target.startsWith("@") ? 2 : 1).join("/");
}

export function withoutEnding(file: string): string {
  return file.replace(/\.tsx?$/, "");
}

/** A file's directive on its first line, such as "use server". */
export function directiveOf({ tree }: SourceFile): string | null {
  const [first] = tree.statements;
  return first && ts.isExpressionStatement(first) && ts.isStringLiteral(first.expression) ? first.expression.text : null;
}

/** The way from a file to the first import that `wanted` asks for, over imports that survive compiling; null: there is none. */
export function wayTo(start: SourceFile, sources: ReadonlyMap<string, SourceFile>, wanted: (to: Import) => boolean): string[] | null {
  const seen = new Set<string>();
  const search = (file: SourceFile, way: string[]): string[] | null => {
    for (const to of file.imports.filter((one) => !one.isType)) {
      if (wanted(to)) return [...way, to.target];
      const next = to.isOurs ? sources.get(to.target) : undefined;
      // What a 'use server' file exports is called over the network; its imports stay on the server.
      if (!next || seen.has(to.target) || directiveOf(next) === "use server") continue;
      seen.add(to.target);
      const found = search(next, [...way, to.target]);
      if (found) return found;
    }
    return null;
  };
  return search(start, [start.path]);
}
