import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import type { Page } from "@playwright/test";

/** What poppler reads from a paper: its text as one line, its tags as a tree with the text in it. */
export type ReadPaper = { text: string; tags: string; info: string };

/** Opens a paper with the session of the page, as a click on its link does. */
export async function readPaper(page: Page, address: string): Promise<ReadPaper> {
  const response = await page.request.get(address);
  if (response.status() !== 200) throw new Error(`${address} answered ${response.status()}`);
  const folder = mkdtempSync(path.join(tmpdir(), "dunlin-paper-"));
  const file = path.join(folder, "roster.pdf");
  try {
    writeFileSync(file, await response.body());
    const text = execFileSync("pdftotext", ["-layout", file, "-"], { encoding: "utf8" });
    const tags = execFileSync("pdfinfo", ["-struct-text", file], { encoding: "utf8" });
    const info = execFileSync("pdfinfo", [file], { encoding: "utf8" });
    return { text: text.replaceAll(/\s+/g, " "), tags, info };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
