import { fallbackFace, houseFace } from "@/lib/sheets/sheet-fonts";
import type { Face, Weight } from "@/lib/sheets/sheet-fonts";

/** Whether a face has a glyph for a code point. */
export type Covers = (face: Face, codePoint: number) => boolean;

export type FacedWord = { readonly text: string; readonly face: Face };

/**
 * Text as it may be set: composed (NFC), so that a name typed as letter plus accent finds its one glyph; without
 * control, direction, joining and variation characters, which have no shape of their own; every other white
 * space but the no-break space is one space.
 */
export function cleanText(text: string): string {
  return text
    .normalize("NFC")
    .replace(/\p{Cs}/gu, "\uFFFD")
    .replace(/[\p{Cf}\uFE00-\uFE0F\u{E0100}-\u{E01EF}]/gu, "")
    .replace(/[\p{Cc}\p{Zl}\p{Zp} \u2000-\u200A\u205F\u3000]+/gu, " ")
    .replace(/\u202F/gu, "\u00A0")
    .trim();
}

/**
 * Chooses the face for one word, whole words at a time so that no word is set in two faces. A character that no
 * shipped font has is written as its code point, `[U+1F426]`, neighbours together: a person's name must never
 * stop a roster, and a dropped letter would be worse than an ugly one. `unprintableCharacters` finds them first.
 */
export function faceWord(word: string, weight: Weight, covers: Covers): FacedWord {
  const house = houseFace(weight);
  const fallback = fallbackFace(weight);
  const text = word.replaceAll("\u00A0", " ");
  const codePoints = Array.from(text, codePointOf);
  if (codePoints.every((point) => covers(house, point))) return { text, face: house };
  if (codePoints.every((point) => covers(fallback, point))) return { text, face: fallback };
  const spelled = spellOut(text, (point) => covers(house, point) || covers(fallback, point));
  const face = Array.from(spelled, codePointOf).every((point) => covers(house, point)) ? house : fallback;
  // The two faces together may have what neither has alone; then only what the chosen one lacks is spelled too.
  return { text: spellOut(spelled, (point) => covers(face, point)), face };
}

/** The characters of `texts` that no shipped font can print, each once, in order of appearance. */
export function unprintableCharacters(texts: readonly string[], covers: Covers): string[] {
  const missing = new Set<string>();
  for (const character of texts.flatMap((text) => Array.from(cleanText(text)))) {
    const point = codePointOf(character);
    if (!covers("regular", point) && !covers("fallback-regular", point)) missing.add(character);
  }
  return [...missing];
}

function spellOut(text: string, isCovered: (codePoint: number) => boolean): string {
  let spelled = "";
  let run: string[] = [];
  const closeRun = () => {
    if (run.length > 0) spelled += `[${run.join(" ")}]`;
    run = [];
  };
  for (const character of text) {
    const point = codePointOf(character);
    if (!isCovered(point)) {
      run.push(`U+${point.toString(16).toUpperCase().padStart(4, "0")}`);
      continue;
    }
    closeRun();
    spelled += character;
  }
  closeRun();
  return spelled;
}

function codePointOf(character: string): number {
  return character.codePointAt(0) ?? 0xfffd;
}
