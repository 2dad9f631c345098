import { cleanText, faceWord } from "@/lib/sheets/printable-text";
import type { Covers, FacedWord } from "@/lib/sheets/printable-text";
import type { Face, Weight } from "@/lib/sheets/sheet-fonts";

/** What setting type needs to know about the fonts. Widths in points. */
export type Metrics = {
  readonly covers: Covers;
  readonly widthOf: (face: Face, text: string, size: number) => number;
};

export type Span = { readonly text: string; readonly weight: Weight };
export type Run = { readonly text: string; readonly face: Face; readonly width: number };
/** `width` leaves out the space kept at the end of a line that goes on, so that readers do not join two words. */
export type TextLine = { readonly runs: readonly Run[]; readonly width: number };

const graphemes = new Intl.Segmenter("en", { granularity: "grapheme" });

/**
 * Breaks spans of text into lines no wider than `maxWidth` points, left aligned. A word wider than the line is
 * broken between letters: nothing is ever cut off. Empty text gives no line.
 */
export function setLines(spans: readonly Span[], size: number, maxWidth: number, metrics: Metrics): TextLine[] {
  const words = spans.flatMap((span) => facedWords(span, size, maxWidth, metrics));
  const lines: PiecedWord[][] = [];
  let line: PiecedWord[] = [];
  let used = 0;
  for (const word of words) {
    const width = metrics.widthOf(word.face, word.text, size);
    if (line.length > 0 && used + width > maxWidth) {
      lines.push(line);
      line = [];
      used = 0;
    }
    line.push(word);
    used += width + (word.endsPiece ? 0 : metrics.widthOf(word.face, " ", size));
  }
  if (line.length > 0) lines.push(line);
  return lines.map((words, index) => joinWords(words, size, index === lines.length - 1, metrics));
}

/** The width of text on one line, in points. */
export function textWidth(text: string, weight: Weight, size: number, metrics: Metrics): number {
  return setLines([{ text, weight }], size, Number.POSITIVE_INFINITY, metrics)[0]?.width ?? 0;
}

/** The width of the longest single word, in points: the least a column needs. */
export function longestWord(text: string, weight: Weight, size: number, metrics: Metrics): number {
  const words = cleanText(text).split(" ").filter(Boolean);
  return Math.max(0, ...words.map((word) => textWidth(word, weight, size, metrics)));
}

type PiecedWord = FacedWord & { readonly endsPiece?: boolean };

function facedWords(span: Span, size: number, maxWidth: number, metrics: Metrics): PiecedWord[] {
  return cleanText(span.text)
    .split(" ")
    .filter(Boolean)
    .map((word) => faceWord(word, span.weight, metrics.covers))
    .flatMap((word) =>
      metrics.widthOf(word.face, word.text, size) > maxWidth ? breakWord(word, size, maxWidth, metrics) : [word],
    );
}

/** Pieces of one word; only the last is followed by a space. */
function breakWord(word: FacedWord, size: number, maxWidth: number, metrics: Metrics): PiecedWord[] {
  const pieces: string[] = [];
  let piece = "";
  for (const { segment } of graphemes.segment(word.text)) {
    if (piece !== "" && metrics.widthOf(word.face, piece + segment, size) > maxWidth) {
      pieces.push(piece);
      piece = "";
    }
    piece += segment;
  }
  pieces.push(piece);
  return pieces.map((text, index) => ({ text, face: word.face, endsPiece: index < pieces.length - 1 }));
}

function joinWords(words: readonly PiecedWord[], size: number, isLast: boolean, metrics: Metrics): TextLine {
  const runs: Run[] = [];
  let text = "";
  words.forEach((word, index) => {
    const next = words[index + 1];
    const spaced = word.endsPiece === true || (next === undefined && isLast) ? word.text : `${word.text} `;
    text += spaced;
    if (next !== undefined && next.face === word.face) return;
    runs.push({ text, face: word.face, width: metrics.widthOf(word.face, text, size) });
    text = "";
  });
  const total = runs.reduce((sum, run) => sum + run.width, 0);
  const last = runs.at(-1);
  const hanging = last?.text.endsWith(" ") === true ? metrics.widthOf(last.face, " ", size) : 0;
  return { runs, width: total - hanging };
}
