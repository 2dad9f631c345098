import type { Setting } from "@/lib/sheets/lay-out-blocks";
import type { Mark, Part, StructureNode } from "@/lib/sheets/page-parts";
import type { PageDesign } from "@/lib/sheets/page-design";
import { longestWord, setLines, textWidth } from "@/lib/sheets/set-lines";
import type { Metrics } from "@/lib/sheets/set-lines";
import type { Column, Sheet, Table } from "@/lib/sheets/sheet";
import type { Weight } from "@/lib/sheets/sheet-fonts";

type PlacedColumn = Column & { readonly x: number; readonly width: number };

const isForPen = (column: Column) => column.kind === "tick" || column.kind === "write";
const cellWeight = (column: Column): Weight =>
  column.kind === "name" || column.kind === "number" ? "bold" : "regular";

/** A caption, a header repeated on every page, and rows that are never split unless taller than a page. */
export function layOutTable(table: Table, document: StructureNode, setting: Setting): Part[] {
  const { design, metrics } = setting;
  const node: StructureNode = { type: "Table", parent: document };
  const columns = placeColumns(withRowsOfAlike(table, setting.tables), design, metrics);
  const caption = layOutCaption(table.caption, { type: "Caption", parent: node }, setting);
  const header = layOutHeader(columns, { type: "THead", parent: node }, setting);
  const body: StructureNode = { type: "TBody", parent: node };
  const rows = table.rows.map((cells) => ({ ...layOutRow(columns, cells, body, setting), repeat: header }));
  return [caption, header, ...rows];
}

/** Tables with the same columns get the same widths, so that the eye finds a column where it was. */
function withRowsOfAlike(table: Table, tables: readonly Table[]): Table {
  const headers = (one: Table) => one.columns.map(({ header }) => header).join("\n");
  const alike = tables.filter((other) => headers(other) === headers(table));
  return { ...table, rows: [...table.rows, ...alike.flatMap((other) => other.rows)] };
}

/** Whether a page is too narrow for some table of a sheet: words would have to be broken. */
export function breaksWords(sheet: Sheet, design: PageDesign, metrics: Metrics): boolean {
  const tables = sheet.blocks.filter((block) => block.kind === "table");
  return tables.some((table) => {
    const least = table.columns.reduce((sum, _, at) => sum + columnNeeds(table, at, design, metrics).least, 0);
    return least > design.contentWidth;
  });
}

function layOutCaption(caption: string, node: StructureNode, { design, metrics }: Setting): Part {
  const size = design.textSize;
  const lineHeight = size * design.spacing;
  const lines = setLines([{ text: caption, weight: "regular" }], size, design.contentWidth, metrics);
  return {
    height: lines.length * lineHeight + size * 0.3,
    before: size * 0.6,
    keepWithNext: true,
    marks: lines.map((line, row) => ({
      kind: "text", node, x: design.left, y: row * lineHeight, size, lineHeight, line,
    })),
    cuts: lines.map((_, row) => (row + 1) * lineHeight),
  };
}

function layOutHeader(columns: readonly PlacedColumn[], head: StructureNode, { design, metrics }: Setting): Part {
  const size = design.textSize;
  const lineHeight = size * 1.2;
  const row: StructureNode = { type: "TR", parent: head };
  const set = columns.map((column) =>
    setLines([{ text: column.header, weight: "bold" }], size, column.width, metrics),
  );
  const deepest = Math.max(1, ...set.map((lines) => lines.length));
  const rule = 2;
  const height = deepest * lineHeight + size * 0.35 + rule;
  const marks = columns.flatMap((column, at): Mark[] => {
    const node: StructureNode = { type: "TH", parent: row, scope: "Column" };
    const lines = set[at] ?? [];
    const top = (deepest - lines.length) * lineHeight;
    return lines.map((line, index) => ({
      kind: "text", node, x: headerX(column, line.width), y: top + index * lineHeight, size, lineHeight, line,
    }));
  });
  const line: Mark = {
    kind: "rule", x: design.left, y: height - rule, length: design.contentWidth, thickness: rule,
  };
  return { height, before: 0, keepWithNext: true, marks: [...marks, line], cuts: [] };
}

function headerX(column: PlacedColumn, width: number): number {
  return column.kind === "tick" ? column.x + Math.max(0, (column.width - width) / 2) : column.x;
}

function layOutRow(
  columns: readonly PlacedColumn[], cells: readonly string[], body: StructureNode, { design, metrics }: Setting,
): Part {
  const size = design.textSize;
  // Tighter within a row than between rows, so that each row is seen as one.
  const lineHeight = size * Math.min(design.spacing, 1.3);
  const pad = size * 0.45;
  const row: StructureNode = { type: "TR", parent: body };
  let deepest = Math.max(lineHeight, design.tickSide);
  const marks = columns.flatMap((column, at): Mark[] => {
    const isHeader = column.kind === "name";
    const node: StructureNode = isHeader
      ? { type: "TH", parent: row, scope: "Row" }
      : { type: "TD", parent: row };
    if (isForPen(column)) return penMarks(column, node, pad, lineHeight, design);
    const lines = setLines([{ text: cells[at] ?? "", weight: cellWeight(column) }], size, column.width, metrics);
    if (lines.length === 0) return [{ kind: "empty", node, y: 0 }];
    deepest = Math.max(deepest, lines.length * lineHeight);
    return lines.map((line, index) => ({
      kind: "text", node, x: column.x, y: pad + index * lineHeight, size, lineHeight, line,
    }));
  });
  const height = deepest + 2 * pad;
  const rule: Mark = {
    kind: "rule", x: design.left, y: height - 0.75, length: design.contentWidth, thickness: 0.75,
  };
  const cuts = Array.from({ length: Math.floor(deepest / lineHeight) }, (_, at) => pad + (at + 1) * lineHeight);
  return { height, before: 0, keepWithNext: false, marks: [...marks, rule], cuts };
}

function penMarks(
  column: PlacedColumn, node: StructureNode, pad: number, lineHeight: number, design: PageDesign,
): Mark[] {
  const cell: Mark = { kind: "empty", node, y: 0 };
  if (column.kind === "write") {
    const y = pad + lineHeight * 0.85;
    return [cell, { kind: "rule", x: column.x, y, length: column.width, thickness: 0.75 }];
  }
  const side = design.tickSide;
  const y = pad + Math.max(0, (lineHeight - side) / 2);
  return [cell, { kind: "box", x: column.x + Math.max(0, (column.width - side) / 2), y, side }];
}

type Needs = { readonly least: number; readonly ideal: number };

function columnNeeds(table: Table, at: number, design: PageDesign, metrics: Metrics): Needs {
  const column = table.columns[at];
  if (column === undefined) return { least: 0, ideal: 0 };
  const size = design.textSize;
  const gutter = size * 0.9;
  const headerLeast = longestWord(column.header, "bold", size, metrics);
  if (column.kind === "tick") {
    // Alike, so that the boxes stand in an even row.
    const headers = table.columns.filter(({ kind }) => kind === "tick").map(({ header }) => header);
    const words = headers.map((header) => longestWord(header, "bold", size, metrics));
    const widest = Math.max(design.tickSide, ...words);
    return { least: widest + gutter, ideal: widest + gutter };
  }
  const cells = table.rows.map((row) => row[at] ?? "");
  const weight = cellWeight(column);
  const least = Math.max(headerLeast, ...cells.map((text) => longestWord(text, weight, size, metrics)));
  const ideal = Math.max(headerLeast, ...cells.map((text) => textWidth(text, weight, size, metrics)));
  const written = column.kind === "write" ? size * 6 : 0;
  return {
    least: Math.max(least, written) + gutter,
    ideal: Math.max(Math.min(ideal, size * 18), written * 1.5) + gutter,
  };
}

/**
 * Shares the width out: each column at least its longest word, the rest in proportion to what each still lacks;
 * where even the words do not fit, all shrink alike and words are broken rather than cut off.
 */
function placeColumns(table: Table, design: PageDesign, metrics: Metrics): PlacedColumn[] {
  const needs = table.columns.map((_, at) => columnNeeds(table, at, design, metrics));
  const least = needs.reduce((sum, need) => sum + need.least, 0);
  const lacking = needs.reduce((sum, need) => sum + Math.max(0, need.ideal - need.least), 0);
  const spare = design.contentWidth - least;
  const widths = needs.map((need) => {
    if (spare < 0) return (need.least / least) * design.contentWidth;
    if (lacking === 0) return need.least + spare / needs.length;
    const share = Math.max(0, need.ideal - need.least) / lacking;
    return need.least + share * spare;
  });
  // A hair less than was added, or rounding would break the very word a column was measured by.
  const gutter = design.textSize * 0.9 - 0.1;
  let x = design.left;
  return table.columns.map((column, at) => {
    const width = widths[at] ?? 0;
    const placed = { ...column, x, width: Math.max(design.textSize, width - gutter) };
    x += width;
    return placed;
  });
}
