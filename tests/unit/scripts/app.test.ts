import { mkdirSync, mkdtempSync, rmSync, statSync, utimesSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { newestIn } from "@/scripts/app.mjs";

describe("the age of the sources", () => {
  let folder = "";
  const past = new Date("2020-01-01T00:00:00Z");
  const at = (...parts: string[]) => path.join(folder, ...parts);

  beforeEach(() => {
    folder = mkdtempSync(path.join(tmpdir(), "dunlin-sources-"));
    mkdirSync(at("app", "outings"), { recursive: true });
    for (const name of ["page.tsx", "form.tsx"]) writeFileSync(at("app", "outings", name), "");
    for (const old of [["page.tsx"], ["form.tsx"], []]) utimesSync(at("app", "outings", ...old), past, past);
    utimesSync(at("app"), past, past);
  });
  afterEach(() => rmSync(folder, { recursive: true, force: true }));

  it("is that of the newest file, however deep", () => {
    expect(newestIn(at("app"))).toBe(past.getTime());
    const later = new Date("2021-01-01T00:00:00Z");
    utimesSync(at("app", "outings", "page.tsx"), later, later);
    expect(newestIn(at("app"))).toBe(later.getTime());
  });

  it("notices a file that was taken away", () => {
    rmSync(at("app", "outings", "form.tsx"));
    expect(newestIn(at("app"))).toBe(statSync(at("app", "outings")).mtimeMs);
    expect(newestIn(at("app"))).toBeGreaterThan(past.getTime());
  });

  it("is nothing for what is not there", () => {
    expect(newestIn(at("nowhere"))).toBe(0);
  });
});
