export type WaiverText = { id: string; version: number; title: string; body: string; sha256: string };

/** Headings are lines that begin with "# "; a blank line ends a paragraph. Nothing else is markup, so the text is its own record. */
export type WaiverBlock = { kind: "heading" | "paragraph"; text: string };

export function waiverBlocks(body: string): WaiverBlock[] {
  return body
    .split(/\n{2,}/)
    .map((part) => part.trim())
    .filter((part) => part !== "")
    .map((part) => (part.startsWith("# ") ? { kind: "heading", text: part.slice(2) } : { kind: "paragraph", text: part.replaceAll("\n", " ") }));
}
