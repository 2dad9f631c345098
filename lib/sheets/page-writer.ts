import { middleToBaseline } from "@/lib/sheets/page-design";
import type { Background, PageDesign } from "@/lib/sheets/page-design";
import type { Mark, StructureNode } from "@/lib/sheets/page-parts";
import type { TextLine } from "@/lib/sheets/set-lines";
import { shaping } from "@/lib/sheets/tagged-document";
import type { TaggedDocument } from "@/lib/sheets/tagged-document";

type TaggedElement = PDFKit.PDFStructureElement & { dictionary: { data: Record<string, unknown> } };

const yellow = "#FFE600";

/**
 * Draws on a tagged document. Structure elements come into being with their first mark, so their order is the
 * reading order; text of one element that runs over pages is added to it in closures, which pdfkit keeps together.
 */
export class PageWriter {
  private readonly elements = new Map<StructureNode, TaggedElement>();
  private readonly outlines: PDFKit.PDFOutline[];

  constructor(private readonly document: TaggedDocument) {
    this.outlines = [document.outline];
  }

  openPage(design: PageDesign, background: Background): void {
    const { width, height } = design;
    this.document.addPage({ size: [width, height], margin: 0 });
    if (background === "yellow") {
      this.artifact("Page", () => this.document.rect(0, 0, width, height).fill(yellow), [0, 0, width, height]);
    }
    this.document.fillColor("black").strokeColor("black");
  }

  pagination(draw: () => void): void {
    this.artifact("Pagination", draw);
  }

  layout(draw: () => void): void {
    this.artifact("Layout", draw);
  }

  tagged(node: StructureNode, draw: () => void): void {
    this.element(node).add(draw);
  }

  element(node: StructureNode): TaggedElement {
    const known = this.elements.get(node);
    if (known !== undefined) return known;
    const element = this.document.struct(node.type) as TaggedElement;
    if (node.scope !== undefined) element.dictionary.data.A = { O: "Table", Scope: node.scope };
    if (node.listNumbering !== undefined) {
      element.dictionary.data.A = { O: "List", ListNumbering: node.listNumbering };
    }
    if (node.parent === null) this.document.addStructure(element);
    else this.element(node.parent).add(element);
    this.elements.set(node, element);
    return element;
  }

  line(line: TextLine, x: number, top: number, size: number, lineHeight: number): void {
    const baseline = top + lineHeight / 2 + size * middleToBaseline;
    let at = x;
    for (const run of line.runs) {
      this.document.font(run.face).fontSize(size);
      this.document.text(run.text, at, baseline, {
        lineBreak: false,
        baseline: "alphabetic",
        ...shaping(run.face),
      });
      at += run.width;
    }
  }

  rule(x: number, y: number, length: number, thickness: number): void {
    this.document.rect(x, y, length, thickness).fill("black");
  }

  upright(x: number, y: number, length: number, thickness: number): void {
    this.document.rect(x, y, thickness, length).fill("black");
  }

  box(x: number, y: number, side: number): void {
    this.document.lineWidth(1.25).rect(x, y, side, side).stroke("black");
  }

  /** Bookmarks nest by level; pdfkit counts a destination's left from the right edge. */
  bookmark(level: number, title: string, y: number): void {
    const parent = this.outlines.slice(0, level).at(-1) ?? this.document.outline;
    const place = { expanded: true, left: this.document.page.width, top: Math.max(0, y) };
    this.outlines.length = Math.min(this.outlines.length, level);
    this.outlines.push(parent.addItem(title, place));
  }

  close(): void {
    for (const [node, element] of this.elements) if (node.parent === null) element.end();
  }

  private artifact(
    type: "Pagination" | "Layout" | "Page",
    draw: () => void,
    bbox?: [number, number, number, number],
  ): void {
    this.document.markContent("Artifact", bbox === undefined ? { type } : { type, bbox });
    draw();
    this.document.endMarkedContent();
  }
}

/** Draws a page's marks in order: neighbours of one element together, and neighbours that say nothing. */
export function drawMarks(writer: PageWriter, marks: readonly Mark[]): void {
  let from = 0;
  while (from < marks.length) {
    const owner = ownerOf(marks[from]);
    let to = from + 1;
    while (to < marks.length && ownerOf(marks[to]) === owner) to += 1;
    const group = marks.slice(from, to);
    const draw = () => group.forEach((mark) => drawMark(writer, mark));
    if (owner === "artifact") writer.layout(draw);
    else if (owner === "bookmark") draw();
    else if (group.some((mark) => mark.kind === "text")) writer.tagged(owner, draw);
    else writer.element(owner);
    from = to;
  }
}

function ownerOf(mark: Mark | undefined): StructureNode | "artifact" | "bookmark" {
  if (mark === undefined || mark.kind === "rule" || mark.kind === "box") return "artifact";
  if (mark.kind === "bookmark") return "bookmark";
  return mark.node ?? "artifact";
}

function drawMark(writer: PageWriter, mark: Mark): void {
  switch (mark.kind) {
    case "text":
      return writer.line(mark.line, mark.x, mark.y, mark.size, mark.lineHeight);
    case "rule":
      if (mark.upright === true) return writer.upright(mark.x, mark.y, mark.length, mark.thickness);
      return writer.rule(mark.x, mark.y, mark.length, mark.thickness);
    case "box":
      return writer.box(mark.x, mark.y, mark.side);
    case "bookmark":
      return writer.bookmark(mark.level, mark.title, mark.y);
    case "empty":
      return;
  }
}
