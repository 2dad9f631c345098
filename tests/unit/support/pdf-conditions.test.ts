import PDFDocument from "pdfkit";
import { describe, expect, it } from "vitest";
import { faceFiles } from "@/lib/sheets/sheet-fonts";
import { heading, list, paragraph } from "@/lib/sheets/sheet";
import { toPdf } from "@/lib/sheets/to-pdf";
import { checkPdfConditions } from "@/tests/support/pdf-conditions";

const sound = await toPdf({
  title: "Cinder Hill",
  language: "en-US",
  runningHead: "Cinder Hill",
  blocks: [
    heading(2, "People"),
    {
      kind: "table",
      caption: "All.",
      columns: [{ header: "No.", kind: "number" }, { header: "Name", kind: "name" }],
      rows: [["1", "Robin"]],
    },
    list("bullet", [{ text: "boots" }]),
    heading(3, "More"),
    paragraph("The end."),
  ],
}, { paper: "letter", textSizePt: 14, printedAt: "2026-03-13T01:10:00Z" });

/** A sound file with one thing of the same length put in another's place. */
function brokenBy(from: string, to: string): Uint8Array {
  const text = Buffer.from(sound).toString("latin1");
  if (from.length !== to.length || !text.includes(from)) throw new Error(`cannot break “${from}”`);
  return Uint8Array.from(Buffer.from(text.replace(from, to), "latin1"));
}

type Drawing = (document: PDFKit.PDFDocument) => void;

function drawn(draw: Drawing, options: PDFKit.PDFDocumentOptions = {}): Promise<Uint8Array> {
  const document = new PDFDocument({
    pdfVersion: "1.7",
    tagged: true,
    lang: "en",
    displayTitle: true,
    font: faceFiles.regular,
    info: { Title: "A" },
    ...options,
  });
  return new Promise((resolve) => {
    const chunks: Uint8Array[] = [];
    document.on("data", (chunk: Uint8Array) => chunks.push(chunk));
    document.on("end", () => resolve(Uint8Array.from(Buffer.concat(chunks))));
    draw(document);
    document.end();
  });
}

const clauses = (bytes: Uint8Array) => [...new Set(checkPdfConditions(bytes).map(({ clause }) => clause))];

/** One element in the tree with text of its own. */
const element = (document: PDFKit.PDFDocument, type: string, children: PDFKit.PDFStructureElementChild[]) =>
  document.struct(type, {}, children);
const words = (document: PDFKit.PDFDocument, type: string) =>
  element(document, type, [() => { document.text("word"); }]);

describe("the check of PDF conditions", () => {
  it("finds nothing in a sound sheet", () => {
    expect(checkPdfConditions(sound)).toEqual([]);
  });

  it.each([
    ["5-1", "<pdfuaid:part>1<", "<pdfuaid:part>7<"],
    ["6.2-1", "/Marked true", "/Marked null"],
    ["7.1-8", "/Metadata ", "/Metadatq "],
    ["7.1-8", ">Cinder Hill</rdf:li>", ">Cinder&Hill</rdf:li>"],
    ["7.1-9", ">Cinder Hill</rdf:li>", ">           </rdf:li>"],
    ["7.1-10", "/DisplayDocTitle true", "/DisplayDocTitle null"],
    ["7.1-11", "/StructTreeRoot ", "/StructTreeRooq "],
    ["7.2-29", "/Lang (en-US)", "/Lang (e_-US)"],
    ["7.2-3", "/S /TBody", "/S /Tbody"],
    ["7.2-10", "/S /TD", "/S /P "],
    ["7.2-20", "/S /LBody", "/S /LBodz"],
    ["7.4.2-1", "/S /H2", "/S /H4"],
    ["7.5-1", "/Scope /Column", "/Scope /Colume"],
    ["7.21.4.1-1", "/FontFile2", "/FontFileZ"],
    ["7.21.7-1", "/ToUnicode", "/ToUnicodf"],
  ])("finds a broken %s", (clause, from, to) => {
    expect(clauses(brokenBy(from, to))).toContain(clause);
  });

  it("finds ink that is neither tagged nor an artifact", async () => {
    expect(clauses(await drawn((document) => { document.rect(10, 10, 5, 5).fill("black"); }))).toContain("7.1-3");
  });

  it("finds tagged content that is not in the tree", async () => {
    const bytes = await drawn((document) => {
      document.markStructureContent("P");
      document.text("lost");
      document.endMarkedContent();
    });
    expect(clauses(bytes)).toContain("7.1-3");
  });

  it("finds an artifact inside tagged content, and tagged content inside an artifact", async () => {
    const raw = (open: string, inside: string) => drawn((document) => {
      document.addContent(open).addContent(inside);
      document.addContent("0 0 1 1 re f").addContent("EMC").addContent("EMC");
    });
    expect(clauses(await raw("/P <</MCID 0>> BDC", "/Artifact BMC"))).toContain("7.1-1");
    expect(clauses(await raw("/Artifact BMC", "/P <</MCID 0>> BDC"))).toContain("7.1-2");
  });

  it("finds a figure without words, and cells outside rows", async () => {
    const bytes = await drawn((document) => {
      const strays = ["Figure", "TD", "LI"].map((type) => words(document, type));
      document.addStructure(element(document, "Document", strays));
    });
    expect(clauses(bytes)).toEqual(expect.arrayContaining(["7.3-1", "7.2-6", "7.2-17"]));
  });

  it("finds rows of different lengths and a head without a body", async () => {
    const bytes = await drawn((document) => {
      const row = (cells: number) => element(document, "TR", Array.from({ length: cells }, () => words(document, "TD")));
      document.addStructure(element(document, "Table", [element(document, "THead", [row(1), row(2)])]));
    });
    expect(clauses(bytes)).toEqual(expect.arrayContaining(["7.2-42", "7.2-13"]));
  });

  it("finds a silent annotation and a tab order that is not the tree's", async () => {
    const bytes = await drawn((document) => { document.link(10, 10, 20, 20, "https://example.org/"); }, { tagged: false });
    expect(clauses(bytes)).toEqual(expect.arrayContaining(["7.18.3-1", "7.18.1-2"]));
  });

  it("finds a glyph the font does not have", async () => {
    const bytes = await drawn((document) => {
      document.addStructure(element(document, "P", [() => { document.text("\u05E9"); }]));
    });
    expect(clauses(bytes)).toContain("7.21.8-1");
  });
});
