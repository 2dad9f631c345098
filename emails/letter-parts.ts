/** A mail is written once, as parts, and comes out as HTML and as plain text that is complete on its own. */
export type LetterPart =
  | { kind: "heading"; text: string }
  | { kind: "paragraph"; text: string }
  | { kind: "facts"; rows: readonly (readonly [label: string, value: string])[] }
  /** Text that somebody wrote with lines of its own, kept as it is. */
  | { kind: "written"; text: string }
  | { kind: "link"; text: string; href: string };

/** The subject says the action and the date; the first three lines hold the key facts. */
export type Draft = { subject: string; parts: readonly LetterPart[] };

export const heading = (text: string): LetterPart => ({ kind: "heading", text });
export const paragraph = (text: string): LetterPart => ({ kind: "paragraph", text });
export const facts = (...rows: (readonly [string, string])[]): LetterPart => ({ kind: "facts", rows });
export const written = (text: string): LetterPart => ({ kind: "written", text });
export const link = (text: string, href: string): LetterPart => ({ kind: "link", text, href });

export function letterText(draft: Draft, signature: string): string {
  return [...draft.parts.map(partText), signature].join("\n\n") + "\n";
}

function partText(part: LetterPart): string {
  switch (part.kind) {
    case "heading":
      return `${part.text}:`;
    case "paragraph":
    case "written":
      return part.text;
    case "facts":
      return part.rows.map(([label, value]) => `${label}: ${value}`).join("\n");
    case "link":
      return `${part.text}:\n${part.href}`;
  }
}
