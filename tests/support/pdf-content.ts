/**
 * A reader of page content streams (ISO 32000-1, 7.8.2), enough to say what is painted, under which mark, and
 * with which character codes. Inline images and form XObjects count as painting and are not looked into.
 */

export type ContentOperation = { readonly operator: string; readonly operands: readonly string[] };

const delimiters = new Set("()<>[]{}/%");
const isSpace = (character: string) => "\0\t\n\f\r ".includes(character);

/** Splits a content stream into operations; operands stay as written. */
export function readOperations(content: string): ContentOperation[] {
  const operations: ContentOperation[] = [];
  let operands: string[] = [];
  let at = 0;
  while (at < content.length) {
    const character = content.charAt(at);
    if (isSpace(character)) {
      at += 1;
      continue;
    }
    const end = tokenEnd(content, at);
    const token = content.slice(at, end);
    at = end;
    if (/^[a-zA-Z'"*]/u.test(token) && !["true", "false", "null"].includes(token)) {
      operations.push({ operator: token, operands });
      operands = [];
      continue;
    }
    operands.push(token);
  }
  return operations;
}

function tokenEnd(content: string, start: number): number {
  const first = content.charAt(start);
  if (content.startsWith("<<", start)) return nestedEnd(content, start, "<<", ">>");
  if (first === "[") return nestedEnd(content, start, "[", "]");
  if (first === "<") return content.indexOf(">", start) + 1;
  if (first === "(") return literalEnd(content, start);
  let at = start + 1;
  while (at < content.length && !isSpace(content.charAt(at)) && !delimiters.has(content.charAt(at))) at += 1;
  return at;
}

function nestedEnd(content: string, start: number, open: string, close: string): number {
  let at = start + open.length;
  while (at < content.length && !content.startsWith(close, at)) {
    at = isSpace(content.charAt(at)) ? at + 1 : tokenEnd(content, at);
  }
  return at + close.length;
}

function literalEnd(content: string, start: number): number {
  let depth = 0;
  for (let at = start; at < content.length; at += 1) {
    const character = content.charAt(at);
    if (character === "\\") at += 1;
    else if (character === "(") depth += 1;
    else if (character === ")") depth -= 1;
    if (depth === 0) return at + 1;
  }
  return content.length;
}

const paintingOperators = new Set(["S", "s", "f", "F", "f*", "B", "B*", "b", "b*", "Tj", "TJ", "'", '"', "Do", "sh", "EI"]);

export type PaintedContent = {
  /** Painting operators that are neither tagged nor artifact. */
  readonly unmarked: readonly string[];
  readonly artifactsInsideTagged: number;
  readonly taggedInsideArtifacts: number;
  readonly mcids: readonly number[];
  /** Two-byte character codes shown with each font resource. */
  readonly codesByFont: ReadonlyMap<string, ReadonlySet<number>>;
};

type MarkKind = "tagged" | "artifact" | "other";

/** Walks a page's operations with the stack of its marks. */
export function paintedContent(content: string): PaintedContent {
  const unmarked: string[] = [];
  const mcids: number[] = [];
  const codesByFont = new Map<string, Set<number>>();
  const stack: MarkKind[] = [];
  let font = "";
  let artifactsInsideTagged = 0;
  let taggedInsideArtifacts = 0;
  for (const { operator, operands } of readOperations(content)) {
    if (operator === "BMC" || operator === "BDC") {
      const mcid = /\/MCID\s+(\d+)/u.exec(operands[1] ?? "")?.[1];
      const kind: MarkKind = operands[0] === "/Artifact" ? "artifact" : mcid === undefined ? "other" : "tagged";
      if (kind === "artifact" && stack.includes("tagged")) artifactsInsideTagged += 1;
      if (kind === "tagged" && stack.includes("artifact")) taggedInsideArtifacts += 1;
      if (mcid !== undefined) mcids.push(Number(mcid));
      stack.push(kind);
    } else if (operator === "EMC") {
      stack.pop();
    } else if (operator === "Tf") {
      font = (operands[0] ?? "").slice(1);
    }
    if (!paintingOperators.has(operator)) continue;
    if (!stack.includes("tagged") && !stack.includes("artifact")) unmarked.push(operator);
    if (operator !== "Tj" && operator !== "TJ") continue;
    const codes = codesByFont.get(font) ?? new Set<number>();
    for (const code of shownCodes(operands.join(" "))) codes.add(code);
    codesByFont.set(font, codes);
  }
  return { unmarked, artifactsInsideTagged, taggedInsideArtifacts, mcids, codesByFont };
}

function shownCodes(operand: string): number[] {
  const codes: number[] = [];
  for (const [, hex = ""] of operand.matchAll(/<([0-9a-fA-F\s]*)>/gu)) {
    const digits = hex.replace(/\s/gu, "");
    for (let at = 0; at + 4 <= digits.length; at += 4) codes.push(Number.parseInt(digits.slice(at, at + 4), 16));
  }
  return codes;
}
