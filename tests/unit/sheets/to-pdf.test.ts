import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { heading, list, note, paragraph } from "@/lib/sheets/sheet";
import type { Block, Column, Entry, Sheet, Table } from "@/lib/sheets/sheet";
import { charactersWithoutFont, toPdf } from "@/lib/sheets/to-pdf";
import type { PdfOptions } from "@/lib/sheets/to-pdf";
import { readOperations } from "@/tests/support/pdf-content";
import { readPdfObjects } from "@/tests/support/pdf-objects";
import { checkPdfConditions } from "@/tests/support/pdf-conditions";
import { readStructure, withRole } from "@/tests/support/pdf-reading";

const standard: PdfOptions = { paper: "letter", textSizePt: 14, printedAt: "2026-03-13T01:10:00Z" };
const largePrint: PdfOptions = { ...standard, textSizePt: 18 };

function sheetOf(blocks: readonly Block[], more: Partial<Sheet> = {}): Sheet {
  return { title: "Heron Spit", language: "en-US", runningHead: "Heron Spit, 14 March", blocks, ...more };
}

function tableOf(rows: number, action = "shade every 20 minutes"): Table {
  return {
    kind: "table",
    caption: "People by number.",
    columns: [
      { header: "No.", kind: "number" },
      { header: "Name", kind: "name" },
      { header: "What to do", kind: "text" },
      { header: "A", kind: "tick" },
    ],
    rows: Array.from({ length: rows }, (_, at) => [String(at + 1), `Robin${at + 1}`, action, ""]),
  };
}

function entryOf(number: number, text: string): Entry {
  return {
    kind: "entry", number: String(number), name: `Robin ${number}`,
    lines: [{ label: "Do", text }, { label: "Called", writeHere: true }], ticks: ["Gate", "Boardwalk"],
  };
}

/** What poppler makes of a file, standing for any reader that is not ours. */
function poppler(command: "pdftotext" | "pdfinfo", options: readonly string[], bytes: Uint8Array): string {
  const folder = mkdtempSync(path.join(tmpdir(), "dunlin-sheet-"));
  const file = path.join(folder, "sheet.pdf");
  writeFileSync(file, bytes);
  const run = spawnSync(command, [...options, file, ...(command === "pdftotext" ? ["-"] : [])], { encoding: "utf8" });
  rmSync(folder, { recursive: true, force: true });
  if (run.error !== undefined) throw run.error;
  return run.stdout;
}

type PlacedWord = { readonly page: number; readonly text: string; readonly left: number; readonly right: number;
  readonly top: number; readonly bottom: number };

function placedWords(bytes: Uint8Array): { words: PlacedWord[]; width: number; height: number } {
  const html = poppler("pdftotext", ["-bbox"], bytes);
  const words: PlacedWord[] = [];
  let page = 0;
  for (const line of html.split("\n")) {
    if (line.includes("<page ")) page += 1;
    const word = /<word xMin="([\d.-]+)" yMin="([\d.-]+)" xMax="([\d.-]+)" yMax="([\d.-]+)">(.*)<\/word>/u.exec(line);
    if (word === null) continue;
    const [left = 0, top = 0, right = 0, bottom = 0] = word.slice(1, 5).map(Number);
    words.push({ page, text: word[5] ?? "", left, top, right, bottom });
  }
  const size = /<page width="([\d.]+)" height="([\d.]+)"/u.exec(html);
  return { words, width: Number(size?.[1]), height: Number(size?.[2]) };
}

const everything = sheetOf([
  paragraph("Twelve people & five adults <all> told."),
  heading(2, "The group"),
  tableOf(60),
  heading(3, "Large blocks"),
  ...[1, 2, 3, 4, 5].map((number) => entryOf(number, "keep the hat on")),
  list("bullet", [{ text: "boots" }, { text: "water" }]),
  list("numbered", [{ text: "ring the bell" }, { text: "wait" }]),
  list("labelled", [{ label: "Base", text: "360 555 0142" }]),
  note("Before you rely on this", "Follow the plan of qualified people."),
], { title: "Dune & marsh <north>", runningFoot: "12 people, 5 adults" });

describe("a sheet as a PDF", () => {
  it.each([
    ["standard", standard],
    ["large print", largePrint],
    ["the largest large print on yellow", { ...standard, textSizePt: 36, background: "yellow" }],
    ["A4", { ...standard, paper: "a4" }],
  ] as const)("keeps the conditions of a tagged document: %s", async (_, options) => {
    expect(checkPdfConditions(await toPdf(everything, options))).toEqual([]);
  });

  it("is read in the order it was composed", async () => {
    const elements = await readStructure(await toPdf(everything, standard));
    const headings = elements.filter((element) => /^H\d$/u.test(element.role));
    expect(headings.map(({ role, text }) => `${role} ${text}`)).toEqual([
      "H1 Dune & marsh <north>", "H2 The group", "H3 Large blocks",
    ]);
    const items = withRole(elements, "LI").map((item) => item.children.map((child) => child.text));
    expect(items).toContainEqual(["2.", "wait"]);
    expect(items).toContainEqual(["Base", "360 555 0142"]);
    const rows = withRole(withRole(elements, "TBody"), "TR");
    expect(rows.map((row) => row.children[1]?.text)).toEqual(Array.from({ length: 60 }, (_, at) => `Robin${at + 1}`));
    expect(rows[0]?.children.map((cell) => cell.role)).toEqual(["TD", "TH", "TD", "TD"]);
  });

  it("gives the same bytes for the same sheet, whatever was printed before", async () => {
    const first = await toPdf(everything, standard);
    await toPdf(sheetOf([paragraph("Đặng Ðà Ω µ Ηλίας")]), standard);
    expect(Buffer.from(await toPdf(everything, standard)).equals(Buffer.from(first))).toBe(true);
  });

  it("repeats a table's header on every page for the eye and once for the ear", async () => {
    const bytes = await toPdf(sheetOf([tableOf(60)]), standard);
    const pages = poppler("pdftotext", [], bytes).split("\f").filter((page) => page.trim() !== "");
    expect(pages.length).toBeGreaterThan(1);
    for (const page of pages) expect(page).toContain("What to do");
    const headers = withRole(await readStructure(bytes), "THead").flatMap((head) => withRole([head], "TH"));
    expect(headers.map((header) => header.text)).toEqual(["No.", "Name", "What to do", "A"]);
  });

  it("splits no row and no entry over a page", async () => {
    const long = "shade every 20 minutes, then speak first and offer the back of your hand, then wait endword";
    const bytes = await toPdf(sheetOf([tableOf(25, long), ...[1, 2, 3, 4, 5, 6, 7].map((n) => entryOf(n, long))]), largePrint);
    const { words } = placedWords(bytes);
    const starts = words.filter((word) => word.text.startsWith("Robin")).map((word) => word.page);
    const ends = words.filter((word) => word.text.startsWith("endword")).map((word) => word.page);
    expect(starts).toHaveLength(32);
    expect(ends).toEqual(starts);
  });

  it("numbers its pages with figures as large as the text", async () => {
    const { words } = placedWords(await toPdf(everything, { ...standard, textSizePt: 28 }));
    const text = words.find((word) => word.text === "Twelve");
    const label = words.find((word) => word.text === "page");
    expect((label?.bottom ?? 0) - (label?.top ?? 0)).toBeCloseTo((text?.bottom ?? -1) - (text?.top ?? 0), 1);
    expect(poppler("pdftotext", ["-f", "2", "-l", "2"], await toPdf(everything, standard))).toMatch(/page 2 of \d/u);
  });

  it.each([18, 28, 36, 48])("cuts nothing off at %d points, not even words no line is wide enough for", async (size) => {
    const endless = "Chrysanthemumsandnasturtiums".repeat(6);
    const blocks = [paragraph(endless), entryOf(1, endless), tableOf(2, endless), list("bullet", [{ text: endless }])];
    const sheet = sheetOf(blocks, { runningHead: endless, runningFoot: endless, title: endless });
    const bytes = await toPdf(sheet, { ...standard, textSizePt: size });
    const { words, width, height } = placedWords(bytes);
    for (const word of words) {
      expect(word.left).toBeGreaterThan(30);
      expect(word.right).toBeLessThan(width - 30);
      expect(word.bottom).toBeLessThan(height - 20);
    }
    const letters = withRole(await readStructure(bytes), "P").map((element) => element.text).join("").replace(/ /gu, "");
    expect(letters).toContain(endless);
  });

  it("lets no two lines of text overlap", async () => {
    const { words } = placedWords(await toPdf(everything, { ...standard, textSizePt: 30 }));
    const overlapping = words.filter((one, at) => words.slice(at + 1).some((other) =>
      one.page === other.page && Math.min(one.right, other.right) - Math.max(one.left, other.left) > 1 &&
      Math.min(one.bottom, other.bottom) - Math.max(one.top, other.top) > 30 * 0.45));
    expect(overlapping).toEqual([]);
  });

  it("keeps every letter of names from many languages", async () => {
    const names = ["Ngọc Nguyễn", "Łucja Brzęczyszczykiewicz", "Ștefan Țurcanu", "Ηλίας", "Юлия", "Gőző", "José"];
    const bytes = await toPdf(sheetOf([list("bullet", names.map((text) => ({ text })))]), standard);
    expect(checkPdfConditions(bytes)).toEqual([]);
    const bodies = withRole(await readStructure(bytes), "LBody").map((element) => element.text);
    expect(bodies).toEqual(names.map((name) => name.normalize("NFC")));
  });

  it("prints the code point of a character no font has, and says so beforehand", async () => {
    const sheet = sheetOf([paragraph("Wren 🐦 and שרה")]);
    const bytes = await toPdf(sheet, standard);
    expect(checkPdfConditions(bytes)).toEqual([]);
    const [text] = withRole(await readStructure(bytes), "P").map((element) => element.text);
    expect(text).toBe("Wren [U+1F426] and [U+05E9 U+05E8 U+05D4]");
    expect(charactersWithoutFont(sheet)).toEqual(["🐦", "ש", "ר", "ה"]);
  });

  it("draws boxes of one centimetre in large print, one for each word", async () => {
    const objects = readPdfObjects(await toPdf(sheetOf([entryOf(1, "wait"), entryOf(2, "wait")]), largePrint));
    const operations = objects.pages().flatMap(({ page }) => readOperations(objects.stream(page["/Contents"])));
    const squares = operations.filter(({ operator, operands }) => operator === "re" && operands[2] === operands[3]);
    expect(squares).toHaveLength(4);
    for (const { operands } of squares) expect((Number(operands[2]) * 2.54) / 72).toBeCloseTo(1, 3);
  });

  it("says on the next page whose block goes on there", async () => {
    const long = "shade every 20 minutes and then wait ".repeat(12);
    const bytes = await toPdf(sheetOf([entryOf(7, long)]), { ...standard, textSizePt: 36 });
    const pages = poppler("pdftotext", [], bytes).split("\f").filter((page) => page.includes("minutes"));
    expect(pages.length).toBeGreaterThan(1);
    for (const page of pages) expect(page).toContain("Robin 7");
    const names = withRole(await readStructure(bytes), "P").filter(({ text }) => text.includes("Robin 7"));
    expect(names).toHaveLength(1);
  });

  it("never skips a heading level", async () => {
    const bytes = await toPdf(sheetOf([heading(4, "Too deep"), paragraph("x")]), standard);
    expect(checkPdfConditions(bytes)).toEqual([]);
    expect(withRole(await readStructure(bytes), "H2").map(({ text }) => text)).toEqual(["Too deep"]);
  });

  it("turns the pages for a table too wide to stand upright", async () => {
    const letters = [..."abcdefgh"];
    const ticks = letters.map((letter): Column => ({ header: `Boardwalk${letter}`, kind: "tick" }));
    const wide: Table = {
      kind: "table",
      caption: "Wide.",
      columns: [{ header: "Name", kind: "name" }, ...ticks],
      rows: [["Robin", ...letters.map(() => "")]],
    };
    expect(placedWords(await toPdf(sheetOf([wide]), standard)).width).toBe(792);
    expect(placedWords(await toPdf(sheetOf([tableOf(3)]), standard)).width).toBe(612);
  });

  it("opens with its title, language and bookmarks for anyone else's reader", async () => {
    const info = poppler("pdfinfo", [], await toPdf(everything, standard));
    expect(info).toMatch(/^Title:\s+Dune & marsh <north>$/mu);
    expect(info).toMatch(/^Tagged:\s+yes$/mu);
    expect(info).toMatch(/^PDF version:\s+1\.7$/mu);
    const tree = poppler("pdfinfo", ["-struct-text"], await toPdf(everything, standard));
    expect(tree.indexOf("The group")).toBeLessThan(tree.indexOf("Large blocks"));
  });

  it.each([
    [{ ...standard, textSizePt: 9 }],
    [{ ...standard, textSizePt: Number.NaN }],
    [{ ...standard, printedAt: "yesterday" }],
  ])("refuses options that are a mistake: %o", async (options) => {
    await expect(toPdf(everything, options)).rejects.toThrow(RangeError);
  });

  it("refuses a language that is none", async () => {
    await expect(toPdf(sheetOf([], { language: "plain English" }), standard)).rejects.toThrow(RangeError);
  });
});
