import type { TextLine } from "@/lib/sheets/set-lines";

/** A node of the structure tree that assistive technology reads; marks on paper that say nothing have none. */
export type StructureNode = {
  readonly type: string;
  readonly parent: StructureNode | null;
  readonly scope?: "Row" | "Column";
  readonly listNumbering?: "Disc" | "Decimal" | "None";
};

/** Marks of a page. `y` is the top of a line or box, `x` its left; points, y down. */
export type Mark =
  | { readonly kind: "text"; readonly node: StructureNode | null; readonly x: number; readonly y: number;
      readonly size: number; readonly lineHeight: number; readonly line: TextLine }
  | { readonly kind: "rule"; readonly x: number; readonly y: number; readonly length: number;
      readonly thickness: number; readonly upright?: boolean }
  | { readonly kind: "box"; readonly x: number; readonly y: number; readonly side: number }
  /** Makes a structure element that has no text, such as the cell under a tick box. */
  | { readonly kind: "empty"; readonly node: StructureNode; readonly y: number }
  | { readonly kind: "bookmark"; readonly level: number; readonly title: string; readonly y: number };

/** What stays together on one page unless it is taller than a page; marks are placed from its own top. */
export type Part = {
  readonly height: number;
  /** Space above, left out at the top of a page. */
  readonly before: number;
  readonly keepWithNext: boolean;
  readonly marks: readonly Mark[];
  /** Heights at which the part may be cut if it is taller than a page. */
  readonly cuts: readonly number[];
  /** A table's header, repeated as an artifact when the part opens a page. */
  readonly repeat?: Part;
  /** What says on the next page whose part goes on there, if it has to be cut. An artifact too. */
  readonly continued?: Part;
};

export type PageMarks = { readonly marks: readonly Mark[] };

/**
 * Fills pages of `height` points from `top`. Parts are not split unless taller than a page; parts that keep with
 * the next move over together; a table row that opens a page gets its header again.
 */
export function fillPages(parts: readonly Part[], top: number, height: number): PageMarks[] {
  const fitting = parts.flatMap((part) => cutToFit(part, height - (part.repeat?.height ?? 0)));
  const pages: Mark[][] = [[]];
  let used = 0;
  const place = (part: Part, at: number) => pages.at(-1)?.push(...part.marks.map((mark) => moved(mark, top + at)));
  const openPage = (part: Part) => {
    pages.push([]);
    used = 0;
    if (part.repeat === undefined) return;
    place(asArtifact(part.repeat), 0);
    used = part.repeat.height;
  };
  fitting.forEach((part, index) => {
    const isOpening = used === 0;
    const needed = heightWithFollowers(fitting, index, height);
    if (!isOpening && used + part.before + needed > height) openPage(part);
    const at = used + (used === 0 ? 0 : part.before);
    place(part, at);
    used = at + part.height;
  });
  return pages.map((marks) => ({ marks }));
}

/** The height of a part and those it keeps with, or its own alone where all of them would not fit on any page. */
function heightWithFollowers(parts: readonly Part[], index: number, pageHeight: number): number {
  const first = parts[index];
  if (first === undefined) return 0;
  let total = first.height;
  let last = first;
  for (const next of parts.slice(index + 1)) {
    if (!last.keepWithNext) break;
    total += next.before + next.height;
    last = next;
  }
  return total > pageHeight ? first.height : total;
}

function cutToFit(part: Part, height: number): Part[] {
  if (part.height <= height) return [part];
  const pieces: Part[] = [];
  let from = 0;
  while (part.height - from > room(part, from, height)) {
    const to = part.cuts.filter((cut) => cut > from && cut - from <= room(part, from, height)).at(-1);
    if (to === undefined) break;
    pieces.push(piece(part, from, to));
    from = to;
  }
  pieces.push(piece(part, from, part.height + 1));
  return pieces;
}

function piece(part: Part, from: number, to: number): Part {
  const marks = part.marks.filter((mark) => mark.y >= from && mark.y < to).map((mark) => moved(mark, -from));
  const placed = { ...part, marks, height: Math.min(to, part.height) - from, cuts: [] };
  if (from === 0) return placed;
  return { ...placed, before: 0, ...(part.continued === undefined ? {} : { repeat: part.continued }) };
}

function room(part: Part, from: number, height: number): number {
  return from === 0 ? height : height - (part.continued?.height ?? 0);
}

function moved(mark: Mark, by: number): Mark {
  return { ...mark, y: mark.y + by };
}

function asArtifact(part: Part): Part {
  const marks = part.marks
    .filter((mark) => mark.kind !== "empty" && mark.kind !== "bookmark")
    .map((mark) => (mark.kind === "text" ? { ...mark, node: null } : mark));
  return { ...part, marks };
}
