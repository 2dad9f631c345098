import { paintedContent } from "@/tests/support/pdf-content";
import { asDictionary, readPdfObjects, textOf } from "@/tests/support/pdf-objects";
import type { Dictionary, Json, PdfObjects } from "@/tests/support/pdf-objects";

/**
 * The PDF/UA-1 conditions of the veraPDF profile (`PDF_UA/PDFUA-1.xml`, clause-test) that concern our sheets, read
 * from the file by qpdf. Passing them is no certification: the profile has more, and human checks have no machine.
 * Which test number within 7.2 stands for which rule of tables and lists, and that of 7.18.1, is from memory.
 */
export type PdfFinding = { readonly clause: string; readonly sentence: string };

type StructureElement = {
  readonly type: string;
  readonly dictionary: Dictionary;
  readonly parentType: string;
  readonly isParentNamed: boolean;
  readonly kids: readonly StructureElement[];
  /** `page reference` and MCID of the content it owns itself. */
  readonly content: readonly string[];
};

/** What of a file breaks the conditions; an empty list for a file that keeps them all. */
export function checkPdfConditions(bytes: Uint8Array): PdfFinding[] {
  const objects = readPdfObjects(bytes);
  const elements = structureOf(objects);
  return [
    ...checkCatalog(objects),
    ...checkMetadata(objects),
    ...elements.flatMap((element) => checkElement(element, objects)),
    ...checkHeadings(elements),
    ...checkPages(objects, elements),
    ...checkFonts(objects),
  ];
}

function found(isBroken: boolean, clause: string, sentence: string): PdfFinding[] {
  return isBroken ? [{ clause, sentence }] : [];
}

function checkCatalog(objects: PdfObjects): PdfFinding[] {
  const catalog = objects.catalog();
  const markInfo = objects.dictionary(catalog["/MarkInfo"]);
  const preferences = objects.dictionary(catalog["/ViewerPreferences"]);
  const language = textOf(objects.resolve(catalog["/Lang"]));
  return [
    ...found(markInfo["/Marked"] !== true, "6.2-1", "The document is not marked as tagged."),
    ...found(markInfo["/Suspects"] === true, "7.1-4", "The document says its tags are suspect."),
    ...found(preferences["/DisplayDocTitle"] !== true, "7.1-10", "Viewers are not told to show the title."),
    ...found(catalog["/StructTreeRoot"] === undefined, "7.1-11", "There is no structure tree."),
    ...found(!/^[a-zA-Z]{1,8}(-[a-zA-Z0-9]{1,8})*$/u.test(language), "7.2-29", "The language is not stated."),
  ];
}

function checkMetadata(objects: PdfObjects): PdfFinding[] {
  const reference = objects.catalog()["/Metadata"];
  const bytes = reference === undefined ? "" : objects.stream(reference);
  const xml = Buffer.from(bytes, "latin1").toString("utf8");
  const title = /<dc:title>[\s\S]*?<rdf:li[^>]*>([^<]*)<\/rdf:li>/u.exec(xml)?.[1] ?? "";
  return [
    ...found(bytes === "", "7.1-8", "The catalog has no metadata."),
    ...found(bytes !== "" && !isWellFormed(xml), "7.1-8", "The metadata is not well-formed XML."),
    ...found(!/<pdfuaid:part>1<\/pdfuaid:part>/u.test(xml), "5-1", "The metadata does not name PDF/UA-1."),
    ...found(title.trim() === "", "7.1-9", "The metadata has no title."),
  ];
}

/** Every tag closed in order and every ampersand an entity: what goes wrong when text is not escaped. */
function isWellFormed(xml: string): boolean {
  const body = xml.replace(/<\?[\s\S]*?\?>/gu, "");
  if (/&(?!(?:amp|lt|gt|quot|apos|#\d+|#x[0-9a-fA-F]+);)/u.test(body)) return false;
  const open: string[] = [];
  for (const [, closing, name = "", empty] of body.matchAll(/<(\/?)([\w:.-]*)[^<>]*?(\/?)>/gu)) {
    if (name === "") return false;
    if (closing === "/" && open.pop() !== name) return false;
    if (closing !== "/" && empty !== "/") open.push(name);
  }
  return open.length === 0 && !body.replace(/<\/?[\w:.-]+[^<>]*>/gu, "").includes("<");
}

/** Every element of the structure tree, in reading order. */
function structureOf(objects: PdfObjects): StructureElement[] {
  const rootReference = objects.catalog()["/StructTreeRoot"];
  if (rootReference === undefined) return [];
  const all: StructureElement[] = [];
  const walk = (reference: Json, parentReference: Json, parentType: string): StructureElement => {
    const dictionary = objects.dictionary(reference);
    const type = String(dictionary["/S"] ?? "").slice(1);
    const kids: StructureElement[] = [];
    const content: string[] = [];
    const place = all.length;
    for (const kid of kidsOf(dictionary, objects)) {
      if (typeof kid === "number") content.push(`${String(dictionary["/Pg"])} ${kid}`);
      else if (isMarkedContent(kid)) content.push(markOf(asDictionary(kid), dictionary));
      else if (objects.dictionary(kid)["/S"] !== undefined) kids.push(walk(kid, reference, type));
    }
    const isParentNamed = dictionary["/P"] === parentReference;
    const element = { type, dictionary, parentType, isParentNamed, kids, content };
    all.splice(place, 0, element);
    return element;
  };
  for (const kid of kidsOf(objects.dictionary(rootReference), objects)) walk(kid, rootReference, "");
  return all;
}

function kidsOf(dictionary: Dictionary, objects: PdfObjects): Json[] {
  const kids = dictionary["/K"];
  if (kids === undefined) return [];
  const resolved = objects.resolve(kids);
  return Array.isArray(resolved) ? resolved : [kids];
}

function markOf(reference: Dictionary, element: Dictionary): string {
  return `${String(reference["/Pg"] ?? element["/Pg"])} ${String(reference["/MCID"])}`;
}

function isMarkedContent(kid: Json): boolean {
  return asDictionary(kid)["/MCID"] !== undefined;
}

/** Which elements may stand in which, as far as tables and lists go (7.2-3 to 7.2-20). */
const mayHold: Readonly<Record<string, { readonly clause: string; readonly kids: readonly string[] }>> = {
  Table: { clause: "7.2-3", kids: ["Caption", "THead", "TBody", "TFoot", "TR"] },
  THead: { clause: "7.2-7", kids: ["TR"] },
  TBody: { clause: "7.2-8", kids: ["TR"] },
  TFoot: { clause: "7.2-9", kids: ["TR"] },
  TR: { clause: "7.2-10", kids: ["TH", "TD"] },
  L: { clause: "7.2-19", kids: ["L", "LI", "Caption"] },
  LI: { clause: "7.2-20", kids: ["Lbl", "LBody"] },
};

const mustStandIn: Readonly<Record<string, { readonly clause: string; readonly parents: readonly string[] }>> = {
  TR: { clause: "7.2-4", parents: ["Table", "THead", "TBody", "TFoot"] },
  THead: { clause: "7.2-5", parents: ["Table"] },
  TBody: { clause: "7.2-5", parents: ["Table"] },
  TH: { clause: "7.2-6", parents: ["TR"] },
  TD: { clause: "7.2-6", parents: ["TR"] },
  LI: { clause: "7.2-17", parents: ["L"] },
  Lbl: { clause: "7.2-18", parents: ["LI", "Note", "TOCI"] },
  LBody: { clause: "7.2-18", parents: ["LI"] },
};

function checkElement(element: StructureElement, objects: PdfObjects): PdfFinding[] {
  const { type, dictionary, parentType } = element;
  const holds = mayHold[type];
  const stands = mustStandIn[type];
  const strangers = holds === undefined ? [] : element.kids.filter((kid) => !holds.kids.includes(kid.type));
  return [
    ...found(!element.isParentNamed, "7.1-12", `A ${type} does not name the element it stands in.`),
    ...found(strangers.length > 0, holds?.clause ?? "", `A ${type} holds a ${strangers[0]?.type ?? ""}.`),
    ...found(
      stands !== undefined && !stands.parents.includes(parentType),
      stands?.clause ?? "",
      `A ${type} stands in a ${parentType}.`,
    ),
    ...found(type === "TH" && !hasScope(dictionary, objects), "7.5-1", "A header cell has no scope."),
    ...found(
      type === "Figure" && textOf(dictionary["/Alt"]) === "" && textOf(dictionary["/ActualText"]) === "",
      "7.3-1",
      "A figure has no text in its place.",
    ),
    ...(type === "Table" ? checkTable(element) : []),
  ];
}

function hasScope(dictionary: Dictionary, objects: PdfObjects): boolean {
  const attributes = objects.resolve(dictionary["/A"]);
  const all = Array.isArray(attributes) ? attributes : [attributes];
  return all.some((one) => ["/Row", "/Column", "/Both"].includes(String(objects.dictionary(one)["/Scope"])));
}

function checkTable(table: StructureElement): PdfFinding[] {
  const heads = table.kids.filter((kid) => kid.type === "THead").length;
  const bodies = table.kids.filter((kid) => kid.type === "TBody").length;
  const rows = table.kids.flatMap((kid) => (kid.type === "TR" ? [kid] : kid.kids)).filter((kid) => kid.type === "TR");
  const widths = new Set(rows.map((row) => row.kids.length));
  return [
    ...found(heads > 1, "7.2-11", "A table has more than one head."),
    ...found(heads > 0 && bodies === 0, "7.2-13", "A table has a head and no body."),
    ...found(widths.size > 1, "7.2-42", "The rows of a table have different numbers of cells."),
  ];
}

function checkHeadings(elements: readonly StructureElement[]): PdfFinding[] {
  const levels = elements.flatMap(({ type }) => (/^H[1-6]$/u.test(type) ? [Number(type.slice(1))] : []));
  return levels.flatMap((level, at) => {
    const before = levels[at - 1] ?? 0;
    return found(level > before + 1, "7.4.2-1", `A heading of level ${level} follows one of level ${before}.`);
  });
}

function checkPages(objects: PdfObjects, elements: readonly StructureElement[]): PdfFinding[] {
  const inTree = new Set(elements.flatMap((element) => element.content));
  const onPages = new Set<string>();
  const findings = objects.pages().flatMap(({ reference, page }, index) => {
    const where = `on page ${index + 1}`;
    const painted = paintedContent(objects.stream(page["/Contents"]));
    const marks = painted.mcids.map((mcid) => `${reference} ${mcid}`);
    marks.forEach((mark) => onPages.add(mark));
    const annotations = objects.array(page["/Annots"]).map((one) => objects.dictionary(one));
    const silent = annotations.filter((one) => textOf(objects.resolve(one["/Contents"])) === "");
    return [
      ...found(painted.artifactsInsideTagged > 0, "7.1-1", `An artifact stands inside tagged content ${where}.`),
      ...found(painted.taggedInsideArtifacts > 0, "7.1-2", `Tagged content stands inside an artifact ${where}.`),
      ...found(painted.unmarked.length > 0, "7.1-3", `${painted.unmarked.join(" ")} paints without a mark ${where}.`),
      ...found(marks.some((mark) => !inTree.has(mark)), "7.1-3", `Tagged content ${where} is not in the tree.`),
      ...found(
        annotations.length > 0 && page["/Tabs"] !== "/S",
        "7.18.3-1",
        `The tab order ${where} is not the tree's.`,
      ),
      ...found(silent.length > 0, "7.18.1-2", `An annotation ${where} says nothing.`),
    ];
  });
  const missing = [...inTree].filter((mark) => !onPages.has(mark));
  return [...findings, ...found(missing.length > 0, "7.1-3", "The tree names content that no page has.")];
}

function checkFonts(objects: PdfObjects): PdfFinding[] {
  return objects.pages().flatMap(({ page }) => {
    const fonts = objects.dictionary(objects.dictionary(page["/Resources"])["/Font"]);
    const { codesByFont } = paintedContent(objects.stream(page["/Contents"]));
    return [...codesByFont].flatMap(([name, codes]) => {
      return checkFont(name, codes, objects.dictionary(fonts[`/${name}`]), objects);
    });
  });
}

function checkFont(name: string, codes: ReadonlySet<number>, font: Dictionary, objects: PdfObjects): PdfFinding[] {
  const descendant = objects.dictionary(objects.array(font["/DescendantFonts"])[0]);
  const descriptor = objects.dictionary(descendant["/FontDescriptor"] ?? font["/FontDescriptor"]);
  const isEmbedded = ["/FontFile", "/FontFile2", "/FontFile3"].some((key) => descriptor[key] !== undefined);
  const unicode = font["/ToUnicode"] === undefined ? null : unicodeMap(objects.stream(font["/ToUnicode"]));
  const isComposite = font["/Subtype"] === "/Type0";
  const unmapped = unicode === null ? [] : [...codes].filter((code) => (unicode.get(code) ?? "") === "");
  return [
    ...found(!isEmbedded, "7.21.4.1-1", `The font ${name} is not embedded.`),
    ...found(isComposite && unicode === null, "7.21.7-1", `The font ${name} does not say which characters it shows.`),
    ...found(isComposite && unmapped.length > 0, "7.21.7-1", `The font ${name} shows glyphs of no character.`),
    ...found(isComposite && codes.has(0), "7.21.8-1", `The font ${name} lacks a glyph and shows .notdef.`),
  ];
}

/** The `bfrange` arrays of a ToUnicode map as pdfkit writes them: first code, last code, one value a code. */
function unicodeMap(cmap: string): Map<number, string> {
  const map = new Map<number, string>();
  for (const [, first = "", , values = ""] of cmap.matchAll(/<([0-9a-fA-F]+)>\s*<([0-9a-fA-F]+)>\s*\[([^\]]*)\]/gu)) {
    [...values.matchAll(/<([0-9a-fA-F\s]*)>/gu)].forEach(([, value = ""], offset) => {
      map.set(Number.parseInt(first, 16) + offset, value.replace(/\s/gu, ""));
    });
  }
  return map;
}
