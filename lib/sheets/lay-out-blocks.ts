import { middleToBaseline } from "@/lib/sheets/page-design";
import type { PageDesign } from "@/lib/sheets/page-design";
import type { Mark, Part, StructureNode } from "@/lib/sheets/page-parts";
import { setLines, textWidth } from "@/lib/sheets/set-lines";
import type { Metrics, Span } from "@/lib/sheets/set-lines";
import type {
  Block,
  Entry,
  EntryLine,
  Heading,
  List,
  ListItem,
  Note,
  Paragraph,
  Sheet,
  Table,
} from "@/lib/sheets/sheet";
import type { Weight } from "@/lib/sheets/sheet-fonts";
import { layOutTable } from "@/lib/sheets/lay-out-table";

export type Setting = {
  readonly design: PageDesign;
  readonly metrics: Metrics;
  /** Every table of the sheet: those alike share their widths. */
  readonly tables: readonly Table[];
};

/** The heaviest rule: between people, where a finger's width of ink can be found at arm's length. */
const heavyRule = 2.5;
const nameScale = 1.3;
const nameSpacing = 1.25;

/** A sheet's title and blocks as parts to fill pages with, and the structure they stand in. */
export function layOutSheet(sheet: Sheet, design: PageDesign, metrics: Metrics): Part[] {
  const setting = { design, metrics, tables: sheet.blocks.filter((block) => block.kind === "table") };
  const document: StructureNode = { type: "Document", parent: null };
  const parts = layOutHeading({ level: 1, text: sheet.title }, document, setting);
  let level = 1;
  let index = 0;
  while (index < sheet.blocks.length) {
    const block = sheet.blocks[index];
    if (block === undefined) break;
    const entries = entriesFrom(sheet.blocks, index);
    if (entries.length > 0) {
      parts.push(...layOutEntries(entries, document, setting));
      index += entries.length;
      continue;
    }
    // A heading never skips a level, whatever the composer wrote: readers navigate by them.
    if (block.kind === "heading") level = Math.min(block.level, level + 1);
    parts.push(...layOutBlock(block, level, document, setting));
    index += 1;
  }
  return parts;
}

function entriesFrom(blocks: readonly Block[], start: number): Entry[] {
  const entries: Entry[] = [];
  for (const block of blocks.slice(start)) {
    if (block.kind !== "entry") break;
    entries.push(block);
  }
  return entries;
}

function layOutBlock(block: Block, level: number, document: StructureNode, setting: Setting): Part[] {
  switch (block.kind) {
    case "heading":
      return layOutHeading({ level, text: block.text }, document, setting);
    case "paragraph":
      return layOutParagraph(block, document, setting);
    case "note":
      return layOutNote(block, document, setting);
    case "list":
      return layOutList(block, document, setting);
    case "table":
      return layOutTable(block, document, setting);
    case "entry":
      return layOutEntries([block], document, setting);
  }
}

function layOutHeading(
  heading: { readonly level: number; readonly text: Heading["text"] },
  document: StructureNode,
  { design, metrics }: Setting,
): Part[] {
  const size = design.headingSizes[Math.min(heading.level, 4) - 1] ?? design.textSize;
  const lineHeight = size * 1.2;
  const node = { type: `H${heading.level}`, parent: document };
  const lines = setLines([{ text: heading.text, weight: "bold" }], size, design.contentWidth, metrics);
  const marks: Mark[] = lines.map((line, row) => ({
    kind: "text", node, x: design.left, y: row * lineHeight, size, lineHeight, line,
  }));
  return [{
    height: lines.length * lineHeight + design.textSize * (heading.level === 1 ? 0.35 : 0.2),
    before: design.textSize * (heading.level === 1 ? 0 : 1.5),
    keepWithNext: true,
    marks: [{ kind: "bookmark", level: heading.level, title: heading.text, y: 0 }, ...marks],
    cuts: marks.map((_, row) => (row + 1) * lineHeight),
  }];
}

function layOutParagraph(paragraph: Paragraph, document: StructureNode, setting: Setting): Part[] {
  const { design } = setting;
  const weight: Weight = paragraph.strong === true ? "bold" : "regular";
  const size = paragraph.strong === true ? design.textSize * 1.15 : design.textSize;
  const node = { type: "P", parent: document };
  return flowingLines([{ text: paragraph.text, weight }], node, size, design.textSize * 0.5, setting);
}

/** One part a line, so that long text runs over pages; never one line alone at the foot or the head of a page. */
function flowingLines(
  spans: readonly Span[],
  node: StructureNode,
  size: number,
  before: number,
  { design, metrics }: Setting,
): Part[] {
  const lineHeight = size * design.spacing;
  const lines = setLines(spans, size, Math.min(design.contentWidth, size * 36), metrics);
  return lines.map((line, row) => ({
    height: lineHeight,
    before: row === 0 ? before : 0,
    keepWithNext: row < lines.length - 1 && (row === 0 || row === lines.length - 2),
    marks: [{ kind: "text", node, x: design.left, y: 0, size, lineHeight, line }],
    cuts: [],
  }));
}

function layOutNote(note: Note, document: StructureNode, { design, metrics }: Setting): Part[] {
  const size = design.textSize;
  const lineHeight = size * design.spacing;
  const indent = size * 0.9;
  const width = Math.min(design.contentWidth - indent, size * 36);
  const texts: readonly (readonly [string, Weight])[] = [[note.title, "bold"], [note.text, "regular"]];
  const marks: Mark[] = [];
  for (const [text, weight] of texts) {
    const node = { type: "P", parent: document };
    for (const line of setLines([{ text, weight }], size, width, metrics)) {
      const y = marks.length * lineHeight;
      marks.push({ kind: "text", node, x: design.left + indent, y, size, lineHeight, line });
    }
  }
  const height = marks.length * lineHeight;
  const bars: Mark[] = marks.map((_, row) => ({
    kind: "rule", x: design.left + 2, y: row * lineHeight, length: lineHeight, thickness: 4, upright: true,
  }));
  return [{
    height,
    before: size * 1.2,
    keepWithNext: false,
    marks: [...bars, ...marks],
    cuts: marks.map((_, row) => (row + 1) * lineHeight),
  }];
}

function layOutList(list: List, document: StructureNode, setting: Setting): Part[] {
  const { design, metrics } = setting;
  const numbering = { bullet: "Disc", numbered: "Decimal", labelled: "None" } as const;
  const node: StructureNode = { type: "L", parent: document, listNumbering: numbering[list.style] };
  const labels = list.items.map((item, index) => labelOf(list, item, index));
  const weight: Weight = list.style === "labelled" ? "bold" : "regular";
  const widest = Math.max(0, ...labels.map((label) => textWidth(label, weight, design.textSize, metrics)));
  const gap = design.textSize * (list.style === "labelled" ? 1 : 0.6);
  // Beside one another as long as both have room, else the label above its text.
  const isStacked = widest + gap > design.contentWidth * 0.4;
  return list.items.map((item, index) => ({
    ...layOutItem(labels[index] ?? "", item.text, weight, isStacked ? 0 : widest + gap, node, setting),
    before: design.textSize * (index === 0 ? 0.5 : list.style === "labelled" ? 0.25 : 0.1),
    keepWithNext: index === 0 && list.items.length > 1,
  }));
}

function labelOf(list: List, item: ListItem, index: number): string {
  if (item.label !== undefined) return item.label;
  if (list.style === "numbered") return `${index + 1}.`;
  return list.style === "bullet" ? "•" : "";
}

function layOutItem(
  label: string, text: string, weight: Weight, indent: number, list: StructureNode, { design, metrics }: Setting,
): Part {
  const size = design.textSize;
  const lineHeight = size * design.spacing;
  const item: StructureNode = { type: "LI", parent: list };
  const setting = { size, lineHeight } as const;
  const labelLines = label === "" ? [] : setLines([{ text: label, weight }], size, design.contentWidth, metrics);
  const width = Math.min(design.contentWidth - indent, size * 36);
  const bodyLines = setLines([{ text, weight: "regular" }], size, width, metrics);
  const bodyTop = indent === 0 ? labelLines.length : 0;
  const labelNode = { type: "Lbl", parent: item };
  const bodyNode = { type: "LBody", parent: item };
  const marks: Mark[] = [
    ...labelLines.map((line, row): Mark => ({
      kind: "text", node: labelNode, x: design.left, y: row * lineHeight, ...setting, line,
    })),
    ...bodyLines.map((line, row): Mark => ({
      kind: "text", node: bodyNode, x: design.left + indent, y: (bodyTop + row) * lineHeight, ...setting, line,
    })),
  ];
  const rows = Math.max(labelLines.length, bodyTop + bodyLines.length);
  const cuts = Array.from({ length: rows }, (_, row) => (row + 1) * lineHeight);
  return { height: rows * lineHeight, before: 0, keepWithNext: false, marks, cuts };
}

function layOutEntries(entries: readonly Entry[], document: StructureNode, setting: Setting): Part[] {
  const { design, metrics } = setting;
  const size = design.textSize * 2;
  const list: StructureNode = { type: "L", parent: document, listNumbering: "None" };
  const widest = Math.max(0, ...entries.map((entry) => textWidth(entry.number, "bold", size, metrics)));
  const two = textWidth("00", "bold", size, metrics);
  const indent = widest === 0 ? 0 : Math.max(widest, two) + design.textSize * 0.8;
  return entries.map((entry, index) => {
    const part = layOutEntry(entry, indent, list, setting);
    const spaced = index === 0 ? { ...part, before: design.textSize * 0.6 } : part;
    return index === entries.length - 1 ? closeWithRule(spaced, design) : spaced;
  });
}

/** A large number, a name, lines, and boxes to tick; a heavy rule above. */
function layOutEntry(entry: Entry, indent: number, list: StructureNode, setting: Setting): Part {
  const { design } = setting;
  const item: StructureNode = { type: "LI", parent: list };
  const body: StructureNode = { type: "LBody", parent: item };
  const pad = design.textSize * 0.6;
  const number = numberMarks(entry.number, pad, { type: "Lbl", parent: item }, setting);
  const writer = new ColumnWriter(design.left + indent, design.contentWidth - indent, pad, setting);
  const nameSize = design.textSize * nameScale;
  const nameNode = { type: "P", parent: body };
  writer.text([{ text: entry.name, weight: "bold" }], nameNode, nameSize, nameSize * nameSpacing);
  const nameBottom = writer.y;
  const nameMarks = [...writer.marks];
  for (const line of entry.lines) writeEntryLine(line, body, writer, design);
  writer.ticks(entry.ticks);
  const rule: Mark = { kind: "rule", x: design.left, y: 0, length: design.contentWidth, thickness: heavyRule };
  return {
    height: Math.max(writer.y, pad + design.textSize * 2) + pad * 0.8,
    before: 0,
    keepWithNext: false,
    marks: [rule, ...number, ...writer.marks],
    cuts: writer.cuts,
    continued: {
      height: nameBottom + design.textSize * 0.3,
      before: 0,
      keepWithNext: true,
      marks: [rule, ...number, ...nameMarks],
      cuts: [],
    },
  };
}

/** The number's first line shares the name's base line: one glance takes in both. */
function numberMarks(number: string, top: number, node: StructureNode, { design, metrics }: Setting): Mark[] {
  const size = design.textSize * 2;
  const nameSize = design.textSize * nameScale;
  const baseline = (nameSize * nameSpacing) / 2 + nameSize * middleToBaseline;
  const lineHeight = 2 * (baseline - size * middleToBaseline);
  return setLines([{ text: number, weight: "bold" }], size, design.contentWidth / 2, metrics).map((line, row) => ({
    kind: "text", node, x: design.left, y: top + row * size * 1.2, size, lineHeight, line,
  }));
}

function writeEntryLine(line: EntryLine, body: StructureNode, writer: ColumnWriter, design: PageDesign): void {
  const size = design.textSize;
  const node = { type: "P", parent: body };
  if ("writeHere" in line) {
    writer.gap(line.label, node, size, size * design.spacing);
    return;
  }
  const label: Span[] = line.label === undefined ? [] : [{ text: `${line.label}:`, weight: "bold" }];
  writer.text([...label, { text: line.text, weight: "regular" }], node, size, size * design.spacing);
}

function closeWithRule(part: Part, design: PageDesign): Part {
  const rule: Mark = {
    kind: "rule", x: design.left, y: part.height, length: design.contentWidth, thickness: heavyRule,
  };
  return { ...part, height: part.height + heavyRule, marks: [...part.marks, rule] };
}

/** Sets one thing under another in a column and remembers where a cut would be harmless. */
class ColumnWriter {
  readonly marks: Mark[] = [];
  readonly cuts: number[] = [];

  constructor(
    private readonly x: number,
    private readonly width: number,
    public y: number,
    private readonly setting: Setting,
  ) {}

  text(spans: readonly Span[], node: StructureNode, size: number, lineHeight: number): void {
    for (const line of setLines(spans, size, this.width, this.setting.metrics)) {
      this.marks.push({ kind: "text", node, x: this.x, y: this.y, size, lineHeight, line });
      this.advance(lineHeight);
    }
  }

  /** A label and a rule after it to write on. */
  gap(label: string, node: StructureNode, size: number, lineHeight: number): void {
    this.text([{ text: `${label}:`, weight: "bold" }], node, size, lineHeight);
    const used = textWidth(`${label}:`, "bold", size, this.setting.metrics) + size * 0.4;
    if (used >= this.width) return;
    const length = Math.min(this.width - used, size * 10);
    this.marks.push({ kind: "rule", x: this.x + used, y: this.y - lineHeight * 0.22, length, thickness: 1 });
  }

  /** Boxes with their words beside them, as many in a row as fit; marks for a pen, not text to be read again. */
  ticks(words: readonly string[]): void {
    if (words.length === 0) return;
    const { design, metrics } = this.setting;
    const side = design.tickSide;
    const rowHeight = Math.max(side, design.textSize * 1.3) + design.textSize * 0.35;
    const gap = design.textSize * 0.45;
    let x = this.x;
    this.y += design.textSize * 0.25;
    for (const word of words) {
      const room = this.width - side - gap;
      const lines = setLines([{ text: word, weight: "regular" }], design.textSize, room, metrics);
      const wordWidth = Math.max(0, ...lines.map((line) => line.width));
      if (x > this.x && x + side + gap + wordWidth > this.x + this.width) {
        x = this.x;
        this.advance(rowHeight);
      }
      this.marks.push({ kind: "box", x, y: this.y, side });
      lines.forEach((line, row) => {
        const y = this.y + row * design.textSize * 1.3;
        this.marks.push({ kind: "text", node: null, x: x + side + gap, y, size: design.textSize,
          lineHeight: row === 0 ? side : design.textSize * 1.3, line });
      });
      if (lines.length > 1) this.y += (lines.length - 1) * design.textSize * 1.3;
      x += side + gap + wordWidth + design.textSize * 1.1;
    }
    this.advance(rowHeight);
  }

  private advance(by: number): void {
    this.y += by;
    this.cuts.push(this.y);
  }
}
