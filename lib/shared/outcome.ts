/**
 * What a use case answers. A refusal is a value a person can act on; an exception is a bug.
 * `sentence` is read by people, `code` by programs, `fields` names inputs and what to do about each.
 */
export type Refusal =
  | { kind: "invalid"; sentence: string; fields: Record<string, string> }
  | { kind: "not-found"; sentence: string }
  | { kind: "forbidden"; sentence: string }
  | { kind: "conflict"; code: string; sentence: string };

export type Outcome<T> = { ok: true; value: T } | { ok: false; refusal: Refusal };

export function ok<T>(value: T): Outcome<T> {
  return { ok: true, value };
}

export function invalid(fields: Record<string, string>, sentence = "There is a problem"): Outcome<never> {
  return { ok: false, refusal: { kind: "invalid", sentence, fields } };
}

export function notFound(sentence = "We could not find that."): Outcome<never> {
  return { ok: false, refusal: { kind: "not-found", sentence } };
}

export function forbidden(sentence = "This account may not do that."): Outcome<never> {
  return { ok: false, refusal: { kind: "forbidden", sentence } };
}

export function conflict(code: string, sentence: string): Outcome<never> {
  return { ok: false, refusal: { kind: "conflict", code, sentence } };
}
