export type Choice = { value: string; label: string; hint?: string };

/**
 * The same words on the form as in the data, with a capital. In a file of its own, since a page on the server
 * calls it, and may not call what stands in a client file.
 */
export function choicesOf(values: readonly string[], words: Readonly<Record<string, string>> = {}): Choice[] {
  return values.map((value) => ({ value, label: words[value] ?? value.replace(/^./, (first) => first.toUpperCase()) }));
}
