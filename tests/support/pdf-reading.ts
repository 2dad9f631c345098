import { getDocument } from "pdfjs-dist/legacy/build/pdf.mjs";

/** An element of a PDF's structure tree as a screen reader meets it: its role, its own text, its children. */
export type ReadElement = { readonly role: string; readonly text: string; readonly children: readonly ReadElement[] };

type TreeNode = { role?: string; type?: string; id?: string; children?: TreeNode[] };

/** The structure of every page in order, read by pdf.js and so independent of what wrote the file. */
export async function readStructure(bytes: Uint8Array): Promise<ReadElement[]> {
  const task = getDocument({ data: Uint8Array.from(bytes), verbosity: 0 });
  const document = await task.promise;
  const elements: ReadElement[] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const tree = (await page.getStructTree()) as TreeNode | null;
    const { items } = await page.getTextContent({ includeMarkedContent: true });
    const texts = textsByMark(items as MarkedItem[]);
    elements.push(...(tree?.children ?? []).map((node) => readNode(node, texts)));
  }
  await task.destroy();
  return elements.flatMap((element) => (element.role === "Document" ? element.children : [element]));
}

type MarkedItem = { type?: string; id?: string; str?: string; hasEOL?: boolean };

function textsByMark(items: readonly MarkedItem[]): Map<string, string> {
  const texts = new Map<string, string>();
  const open: string[] = [];
  for (const item of items) {
    if (item.type === "beginMarkedContent" || item.type === "beginMarkedContentProps") open.push(item.id ?? "");
    else if (item.type === "endMarkedContent") open.pop();
    const mark = open.at(-1);
    const text = `${item.str ?? ""}${item.hasEOL === true ? " " : ""}`;
    if (mark !== undefined && text !== "") texts.set(mark, (texts.get(mark) ?? "") + text);
  }
  return texts;
}

function readNode(node: TreeNode, texts: ReadonlyMap<string, string>): ReadElement {
  const own = (node.children ?? []).filter((child) => child.type === "content");
  const text = own.map((child) => texts.get(child.id ?? "") ?? "").join("").replace(/\s+/gu, " ").trim();
  const children = (node.children ?? []).filter((child) => child.role !== undefined);
  const read = children.map((child) => readNode(child, texts));
  return { role: node.role ?? "", text, children: read.filter((child) => child.role === "TD" || hasText(child)) };
}

/** pdf.js gives every page the whole tree; what stands on other pages comes without text and is left out. */
function hasText(element: ReadElement): boolean {
  return element.text !== "" || element.children.some(hasText);
}

/** Everything below an element with a role, itself included. */
export function withRole(elements: readonly ReadElement[], role: string): ReadElement[] {
  return elements.flatMap((element) => [
    ...(element.role === role ? [element] : []),
    ...withRole(element.children, role),
  ]);
}
