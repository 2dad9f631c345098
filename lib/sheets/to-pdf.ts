import { layOutSheet } from "@/lib/sheets/lay-out-blocks";
import { breaksWords } from "@/lib/sheets/lay-out-table";
import { designPage, textSizeRange } from "@/lib/sheets/page-design";
import type { Background, PageDesign, Paper } from "@/lib/sheets/page-design";
import { furnish } from "@/lib/sheets/page-furniture";
import type { Furniture } from "@/lib/sheets/page-furniture";
import { drawMarks, PageWriter } from "@/lib/sheets/page-writer";
import { fillPages } from "@/lib/sheets/page-parts";
import type { PageMarks } from "@/lib/sheets/page-parts";
import { cleanText, unprintableCharacters } from "@/lib/sheets/printable-text";
import { setLines } from "@/lib/sheets/set-lines";
import type { Metrics } from "@/lib/sheets/set-lines";
import { sheetTexts } from "@/lib/sheets/sheet";
import type { Sheet } from "@/lib/sheets/sheet";
import { closeDocument, metricsOf, openTaggedDocument } from "@/lib/sheets/tagged-document";

export type PdfOptions = {
  readonly paper: Paper;
  /** Points, 10 to 48: 14 is standard, large print begins at 18. */
  readonly textSizePt: number;
  /** ISO 8601 instant, the file's creation date: the same sheet and options give the same bytes. */
  readonly printedAt: string;
  readonly background?: Background;
};

const languageTag = /^[a-zA-Z]{1,8}(-[a-zA-Z0-9]{1,8})*$/;

/**
 * A sheet as a tagged PDF that keeps the PDF/UA-1 conditions a machine can check (`tests/support/pdf-conditions.ts`
 * holds it to them; that is no certification). Everything is in the structure tree or an artifact: page furniture,
 * rules, tick boxes and the words beside them, and table headers repeated on later pages are artifacts. Black on
 * white or yellow, left aligned, no italics, no meaning in colour. Rows and entries are not split over pages
 * unless taller than one. Wide tables turn the pages of the whole sheet. Words Atkinson Hyperlegible Next lacks
 * letters for are set in Noto Sans; a character neither has is printed as its code point, `[U+1F426]`, so that a
 * name never stops a roster (`charactersWithoutFont` tells them beforehand).
 *
 * Throws a RangeError for a text size, date or language that is none: those are mistakes of the caller.
 */
export async function toPdf(sheet: Sheet, options: PdfOptions): Promise<Uint8Array> {
  const createdAt = checkedDate(sheet, options);
  const document = openTaggedDocument(cleanText(sheet.title), sheet.language, createdAt);
  const metrics = metricsOf(document);
  const { design, furniture, pages } = choosePages(sheet, options, metrics);
  const writer = new PageWriter(document);
  pages.forEach((page, index) => {
    writer.openPage(design, options.background ?? "white");
    drawFurniture(writer, furniture, design, `page ${index + 1} of ${pages.length}`, metrics);
    drawMarks(writer, page.marks);
  });
  writer.close();
  return closeDocument(document);
}

type LaidOut = {
  readonly design: PageDesign;
  readonly furniture: Furniture;
  readonly pages: readonly PageMarks[];
};

/** Upright, unless turning the pages saves a table's words from being broken, or saves pages. */
function choosePages(sheet: Sheet, options: PdfOptions, metrics: Metrics): LaidOut {
  const upright = layOutPages(sheet, designPage(options.paper, options.textSizePt, false), metrics);
  if (!sheet.blocks.some((block) => block.kind === "table")) return upright;
  const turned = layOutPages(sheet, designPage(options.paper, options.textSizePt, true), metrics);
  if (breaksWords(sheet, upright.design, metrics)) return turned;
  return turned.pages.length < upright.pages.length ? turned : upright;
}

function layOutPages(sheet: Sheet, design: PageDesign, metrics: Metrics): LaidOut {
  const furniture = furnish(sheet, design, metrics);
  const parts = layOutSheet(sheet, design, metrics);
  return { design, furniture, pages: fillPages(parts, furniture.contentTop, furniture.contentHeight) };
}

/** The characters of a sheet that no shipped font has, for a warning before printing. */
export function charactersWithoutFont(sheet: Sheet): string[] {
  const metrics = metricsOf(openTaggedDocument(sheet.title, sheet.language, new Date(0)));
  return unprintableCharacters(sheetTexts(sheet).map(({ text }) => text), metrics.covers);
}

function checkedDate(sheet: Sheet, options: PdfOptions): Date {
  const { smallest, largest } = textSizeRange;
  if (!(options.textSizePt >= smallest && options.textSizePt <= largest)) {
    throw new RangeError(`A sheet's text size is ${smallest} to ${largest} points, not ${options.textSizePt}.`);
  }
  if (!languageTag.test(sheet.language)) throw new RangeError(`“${sheet.language}” is not a language tag.`);
  const createdAt = new Date(options.printedAt);
  if (Number.isNaN(createdAt.getTime())) throw new RangeError(`“${options.printedAt}” is not an instant.`);
  return createdAt;
}

function drawFurniture(
  writer: PageWriter, furniture: Furniture, design: PageDesign, pageNumber: string, metrics: Metrics,
): void {
  const { size, lineHeight } = furniture;
  writer.pagination(() => {
    furniture.head.forEach((line, row) => {
      writer.line(line, design.left, furniture.headTop + row * lineHeight, size, lineHeight);
    });
    const number = [{ text: pageNumber, weight: "bold" }] as const;
    for (const line of setLines(number, design.textSize, design.contentWidth, metrics)) {
      const x = design.right - line.width;
      writer.line(line, x, design.top, design.textSize, design.textSize * 1.25);
    }
    const footTop = design.bottom - furniture.foot.length * lineHeight;
    furniture.foot.forEach((line, row) => {
      writer.line(line, design.left, footTop + row * lineHeight, size, lineHeight);
    });
    writer.rule(design.left, furniture.headRuleY, design.contentWidth, 1);
    if (furniture.foot.length > 0) writer.rule(design.left, furniture.footRuleY, design.contentWidth, 1);
  });
}
