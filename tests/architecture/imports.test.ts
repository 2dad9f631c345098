import { describe, expect, it } from "vitest";
import { directiveOf, packageOf, parseSource, programPlaces, readSources, wayTo, withoutEnding, type Import, type SourceFile } from "./source-files";

const sources = readSources(...programPlaces);
const byPlace = new Map(sources.map((source) => [withoutEnding(source.path), source]));

const isIn = (...places: string[]) => (source: SourceFile) =>
  places.some((place) => source.path === place || source.path.startsWith(`${place}/`));
const lib = sources.filter(isIn("lib")).filter((source) => !isIn("lib/web")(source));

const isStore = (place: string) => place.startsWith("lib/") && place.endsWith("-store");
const isUseCase = (source: SourceFile) =>
  source.imports.some((one) => one.target === "lib/shared/use-case" && one.names.some((name) => name.startsWith("define")));
const isUseCasePlace = (place: string) => {
  const source = byPlace.get(place);
  return source !== undefined && isUseCase(source);
};
/** A few files put a domain's own SQL or its several stores together for the commands around them. */
const sharedWorkings = new Set(["lib/cover-board/gather-cover"]);

const isNextOrReact = (to: Import) => ["next", "react", "react-dom"].includes(packageOf(to.target));
const isDatabasePackage = (to: Import) => ["knex", "better-sqlite3"].includes(packageOf(to.target));
const isNode = (to: Import) => to.target.startsWith("node:");
const isDatabase = (to: Import) => to.target.startsWith("db/");
const needsAServer = (to: Import) =>
  isDatabase(to) || isDatabasePackage(to) || isNode(to) || packageOf(to.target) === "next" || to.target === "lib/shared/env";

/** "lib/a.ts → lib/b" for each forbidden import, so that a failure names the line to change. */
function found(among: readonly SourceFile[], isForbidden: (to: Import, from: SourceFile) => boolean): string[] {
  return among.flatMap((source) =>
    source.imports.filter((to) => isForbidden(to, source)).map((to) => `${source.path} → ${to.target}`),
  );
}

function ways(among: readonly SourceFile[], isForbidden: (to: Import) => boolean): string[] {
  return among.flatMap((source) => wayTo(source, byPlace, isForbidden)?.join(" → ") ?? []);
}

describe("the search for imports", () => {
  it("finds the way from a command to the database, through its store", () => {
    const signUp = byPlace.get("lib/people/sign-up");
    expect(signUp && wayTo(signUp, byPlace, isDatabase)).toContain("db/connection");
  });

  it("tells a type from what survives compiling", () => {
    const { imports } = parseSource(
      "lib/people/x.ts",
      `import type { A } from "./a"; import { type B } from "@/db/b"; import { c, type D } from "next/headers"; await import("knex");`,
    );
    expect(imports.map(({ target, isType }) => [target, isType])).toEqual([
      ["lib/people/a", true],
      ["db/b", true],
      ["next/headers", false],
      ["knex", false],
    ]);
  });
});

describe("who may import whom", () => {
  it("every import of our own names a file that is there", () => {
    const lost = found(sources, (to) => to.isOurs && !byPlace.has(to.target) && !/\.(css|json|mjs)$/.test(to.target));
    expect(lost).toEqual([]);
  });

  it("Next and React stay out of lib but for lib/web", () => {
    expect(found(lib, isNextOrReact)).toEqual([]);
  });

  it("lib knows no screen and no mail, and goes over the bridge to Next nowhere", () => {
    expect(found(lib, (to) => /^(app|components|emails|lib\/web)\//.test(to.target))).toEqual([]);
    expect(found(sources.filter(isIn("lib/web")), (to) => /^(app|components)\//.test(to.target))).toEqual([]);
  });

  it("only db imports the database packages", () => {
    expect(found(sources.filter((source) => !isIn("db")(source)), isDatabasePackage)).toEqual([]);
  });

  it("db knows tables and nothing above them", () => {
    expect(found(sources.filter(isIn("db")), (to) => to.isOurs && !to.target.startsWith("db/"))).toEqual([]);
  });

  it("only stores build queries; commands are given the connection", () => {
    const others = sources.filter((source) => {
      const place = withoutEnding(source.path);
      return !isIn("db")(source) && !isStore(place) && !sharedWorkings.has(place) && place !== "lib/web/database";
    });
    expect(found(others, (to) => to.target === "db/connection" && !to.isType && to.names.some((name) => name !== "Connection"))).toEqual([]);
  });

  it("stores import the database, pure files and other stores, never a command or query", () => {
    const stores = sources.filter((source) => isStore(withoutEnding(source.path)));
    expect(stores.length).toBeGreaterThan(5);
    expect(found(stores, (to) => to.isOurs && isUseCasePlace(to.target) && !to.isType)).toEqual([]);
  });

  it("schemas, policies and the other pure files of a domain run anywhere", () => {
    const named = lib.filter((source) => /-(schema|policy|view)\.ts$/.test(source.path));
    expect(named.length).toBeGreaterThan(8);
    expect(ways(named, needsAServer)).toEqual([]);
  });

  it("the engines import nothing of a server, and of lib only themselves and what has no domain words", () => {
    const engines = ["lib/cover", "lib/sheets"];
    for (const engine of engines) {
      const files = sources.filter(isIn(engine));
      expect(files.length).toBeGreaterThan(5);
      expect(found(files, (to) => isDatabase(to) || isDatabasePackage(to) || isNextOrReact(to))).toEqual([]);
      const others = found(files, (to) => to.isOurs && !to.target.startsWith(`${engine}/`) && !to.target.startsWith("lib/shared/"));
      expect(others).toEqual([]);
    }
    // The fonts of a PDF are files; nothing else of lib/sheets and nothing of lib/cover looks at the machine.
    const pure = sources.filter(isIn(...engines)).filter((source) => source.path !== "lib/sheets/sheet-fonts.ts");
    expect(found(pure, (to) => isNode(to) && to.target !== "node:path")).toEqual([]);
  });

  it("what has no domain words needs no server either, but for surroundings, log, ids and addresses", () => {
    const serverSide = new Set(["env", "log", "ids", "addresses"].map((name) => `lib/shared/${name}.ts`));
    const shared = sources.filter(isIn("lib/shared")).filter((source) => !serverSide.has(source.path));
    expect(shared.length).toBeGreaterThan(4);
    expect(ways(shared, (to) => needsAServer(to))).toEqual([]);
    expect(found(shared, (to) => to.isOurs && !to.isType && !to.target.startsWith("lib/shared/"))).toEqual([]);
  });

  it("pages and components ask use cases: no SQL, no store, no handle on the database", () => {
    const screens = sources.filter(isIn("app", "components", "emails"));
    const forbidden = (to: Import) =>
      isDatabase(to) || isStore(to.target) || sharedWorkings.has(to.target) || to.target === "lib/web/database" || to.target === "lib/people/lucia";
    expect(found(screens, (to) => forbidden(to) && !to.isType)).toEqual([]);
    expect(found(screens, (to) => isDatabase(to))).toEqual([]);
  });

  it("components and emails show what they are given: they ask nothing and know no page", () => {
    const shown = sources.filter(isIn("components", "emails"));
    expect(found(shown, (to) => to.target.startsWith("app/"))).toEqual([]);
    expect(found(shown, (to) => isUseCasePlace(to.target) && !to.isType)).toEqual([]);
    expect(found(sources.filter(isIn("emails")), (to) => packageOf(to.target) === "next" || to.target.startsWith("components/"))).toEqual([]);
  });

  it("what runs in a browser carries nothing of the server along", () => {
    const inBrowser = sources.filter((source) => directiveOf(source) === "use client");
    const onServer = (to: Import) =>
      isDatabase(to) || isDatabasePackage(to) || isNode(to) || to.target === "lib/shared/env" || /^next\/(headers|server)$/.test(to.target);
    expect(ways(inBrowser, onServer)).toEqual([]);
  });

  it("no two files need each other", () => {
    const rings = sources.flatMap((source) => {
      const own = withoutEnding(source.path);
      return wayTo(source, byPlace, (to) => to.isOurs && to.target === own)?.join(" → ") ?? [];
    });
    expect(rings).toEqual([]);
  });

  it("the program needs nothing of its tests, scripts or seeds", () => {
    expect(found(sources, (to) => /^(tests|scripts|seeds)\//.test(to.target))).toEqual([]);
  });
});
