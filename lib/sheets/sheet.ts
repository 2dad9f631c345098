/**
 * A sheet is a document a person takes away, composed once and rendered in several forms. The tree says what
 * things are, never how they look: a renderer for paper, braille, plain text or rows decides that for its reader.
 */

/** One labelled line of an entry. A line to write on is a labelled gap that paper rules and other forms skip. */
export type EntryLine =
  | { readonly label?: string; readonly text: string }
  | { readonly label: string; readonly writeHere: true };

export type ListItem = { readonly label?: string; readonly text: string };

/**
 * `number` and `name` columns identify the row; exactly one column is the `name`, the row's header. `tick` and
 * `write` columns are for a pen: their cells are empty strings.
 */
export type ColumnKind = "number" | "name" | "text" | "tick" | "write";
export type Column = { readonly header: string; readonly kind: ColumnKind };

export type Heading = { readonly kind: "heading"; readonly level: 2 | 3 | 4; readonly text: string };
export type Paragraph = { readonly kind: "paragraph"; readonly text: string; readonly strong?: boolean };
/** A caution or a remark that must not be missed. */
export type Note = { readonly kind: "note"; readonly title: string; readonly text: string };
export type List = {
  readonly kind: "list";
  readonly style: "bullet" | "numbered" | "labelled";
  readonly items: readonly ListItem[];
};
/** A labelled block about one person or thing; neighbouring entries are read as one list. */
export type Entry = {
  readonly kind: "entry";
  /** Shown large, at most a few characters: a count-off number. */
  readonly number: string;
  readonly name: string;
  readonly lines: readonly EntryLine[];
  /** One box to tick for each word. */
  readonly ticks: readonly string[];
};
export type Table = {
  readonly kind: "table";
  readonly caption: string;
  readonly columns: readonly Column[];
  readonly rows: readonly (readonly string[])[];
};

export type Block = Heading | Paragraph | Note | List | Entry | Table;

export type Sheet = {
  /** The document's title and its first heading. */
  readonly title: string;
  /** BCP 47, for instance `en-US`. */
  readonly language: string;
  /** Page furniture, repeated at the head of every page; never the only place where something is said. */
  readonly runningHead: string;
  /** Page furniture at the foot of every page. */
  readonly runningFoot?: string;
  readonly blocks: readonly Block[];
};

export const heading = (level: Heading["level"], text: string): Heading => ({ kind: "heading", level, text });
export const paragraph = (text: string): Paragraph => ({ kind: "paragraph", text });
export const strongParagraph = (text: string): Paragraph => ({ kind: "paragraph", text, strong: true });
export const note = (title: string, text: string): Note => ({ kind: "note", title, text });
export const list = (style: List["style"], items: readonly ListItem[]): List => ({ kind: "list", style, items });

/** A piece of a sheet's text and where it stands, in words a person can follow. */
export type SheetText = { readonly where: string; readonly text: string };

/** Every text of a sheet in reading order, page furniture first: what a check of its content has to look at. */
export function sheetTexts(sheet: Sheet): SheetText[] {
  const furniture = [
    { where: "the title", text: sheet.title },
    { where: "the running head", text: sheet.runningHead },
    ...(sheet.runningFoot === undefined ? [] : [{ where: "the running foot", text: sheet.runningFoot }]),
  ];
  return [...furniture, ...sheet.blocks.flatMap(blockTexts)];
}

function blockTexts(block: Block): SheetText[] {
  switch (block.kind) {
    case "heading":
      return [{ where: "a heading", text: block.text }];
    case "paragraph":
      return [{ where: "a paragraph", text: block.text }];
    case "note":
      return [
        { where: "a note's title", text: block.title },
        { where: `the note “${block.title}”`, text: block.text },
      ];
    case "list":
      return block.items.map(({ label, text }) => ({
        where: label === undefined ? "a list" : `the list, at “${label}”`,
        text: label === undefined ? text : `${label}: ${text}`,
      }));
    case "entry":
      return entryTexts(block);
    case "table":
      return tableTexts(block);
  }
}

function entryTexts(entry: Entry): SheetText[] {
  const where = `the entry of number ${entry.number}`;
  const lines = entry.lines.map((line) =>
    "writeHere" in line ? line.label : line.label === undefined ? line.text : `${line.label}: ${line.text}`,
  );
  return [entry.number, entry.name, ...lines, ...entry.ticks].map((text) => ({ where, text }));
}

function tableTexts(table: Table): SheetText[] {
  const nameAt = table.columns.findIndex((column) => column.kind === "name");
  const headers = table.columns.map((column) => ({ where: "a column's header", text: column.header }));
  const cells = table.rows.flatMap((row) =>
    row
      .filter((text) => text !== "")
      .map((text) => ({ where: `the table “${table.caption}”, row ${row[nameAt] ?? ""}`.trim(), text })),
  );
  return [{ where: "a table's caption", text: table.caption }, ...headers, ...cells];
}
