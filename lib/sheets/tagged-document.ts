import PDFDocument from "pdfkit";
import type { Metrics } from "@/lib/sheets/set-lines";
import { faceFiles, faces } from "@/lib/sheets/sheet-fonts";
import type { Face } from "@/lib/sheets/sheet-fonts";

export type TaggedDocument = PDFKit.PDFDocument;

/** The parts of pdfkit that its type package leaves out. */
type DocumentInside = {
  info: PDFKit.DocumentInfo;
  _addInfo: () => void;
  _font: { font: OpenFont };
};

type OpenFont = { hasGlyphForCodePoint: (codePoint: number) => boolean; _glyphs: Record<number, unknown> };

/** Reading a font file takes most of the time a short sheet takes: each is read once. */
const openFonts = new Map<Face, OpenFont>();

/**
 * An empty tagged document: PDF 1.7, marked, with a language, a title that viewers show, and the PDF/UA-1
 * identification in its metadata. The same input and `createdAt` give the same bytes.
 */
export function openTaggedDocument(title: string, language: string, createdAt: Date): TaggedDocument {
  const document = new PDFDocument({
    pdfVersion: "1.7",
    subset: "PDF/UA" as PDFKit.Mixins.PDFSubsets,
    tagged: true,
    lang: language,
    displayTitle: true,
    autoFirstPage: false,
    font: "",
    info: { Title: title, Creator: "Dunlin", Producer: "Dunlin", CreationDate: createdAt, ModDate: createdAt },
  });
  registerFaces(document);
  escapeMetadata(document as unknown as DocumentInside);
  return document;
}

/**
 * A font remembers for each glyph the character it was first drawn for, and that is what a reader copies out of
 * the file: every document starts with a blank memory, or its bytes would depend on those printed before.
 */
function registerFaces(document: TaggedDocument): void {
  for (const face of faces) {
    const open = openFonts.get(face);
    if (open === undefined) {
      document.registerFont(face, faceFiles[face]);
      continue;
    }
    open._glyphs = {};
    document.registerFont(face, open as unknown as PDFKit.Mixins.PDFFontSource);
  }
}

/** pdfkit writes the title into its XML metadata as it is: "Dune & marsh" would make it unreadable. */
function escapeMetadata(document: DocumentInside): void {
  const addInfo = document._addInfo.bind(document);
  document._addInfo = () => {
    const info = document.info;
    document.info = { ...info, Title: escapeXml(info.Title ?? "") };
    addInfo();
    document.info = info;
  };
}

function escapeXml(text: string): string {
  return text.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;");
}

/** Measures with the very fonts that will draw. A face is loaded, and later embedded, only once it is asked for. */
export function metricsOf(document: TaggedDocument): Metrics {
  const coverage = new Map<string, boolean>();
  const widths = new Map<string, number>();
  return {
    covers: (face, codePoint) => {
      const key = `${face} ${codePoint}`;
      const known = coverage.get(key);
      if (known !== undefined) return known;
      const covered = fontInside(document, face).hasGlyphForCodePoint(codePoint);
      coverage.set(key, covered);
      return covered;
    },
    widthOf: (face, text, size) => {
      const key = `${face} ${text}`;
      const known = widths.get(key);
      if (known !== undefined) return known * size;
      const ofOnePoint = document.font(face).fontSize(1000).widthOfString(text, shaping(face)) / 1000;
      widths.set(key, ofOnePoint);
      return ofOnePoint * size;
    },
  };
}

/**
 * Noto Sans takes letters such as ễ apart into a base and accents (`ccmp`) whose glyphs stand for no character,
 * so a screen reader would lose them. Its composed glyphs are there: they are drawn as they are.
 */
export function shaping(face: Face): PDFKit.Mixins.TextOptions {
  if (!face.startsWith("fallback")) return {};
  return { features: { ccmp: false } as unknown as PDFKit.Mixins.OpenTypeFeatures[] };
}

function fontInside(document: TaggedDocument, face: Face): OpenFont {
  document.font(face);
  const { font } = (document as unknown as DocumentInside)._font;
  openFonts.set(face, font);
  return font;
}

/** The finished file. */
export function closeDocument(document: TaggedDocument): Promise<Uint8Array> {
  return new Promise((resolve, reject) => {
    const chunks: Uint8Array[] = [];
    document.on("data", (chunk: Uint8Array) => chunks.push(chunk));
    document.on("end", () => resolve(Uint8Array.from(Buffer.concat(chunks))));
    document.on("error", reject);
    document.end();
  });
}
