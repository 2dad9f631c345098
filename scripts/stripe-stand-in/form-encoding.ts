export type FormValue = string | FormFields;
export type FormFields = { [name: string]: FormValue };

export type FormReading = { ok: true; fields: FormFields } | { ok: false; reason: string };

const DEEPEST_NAME = 8;
const NAMES_NEVER_TAKEN = new Set(["__proto__", "constructor", "prototype"]);

/**
 * Reads `a[b][0][c]=v`, the way Stripe's client writes every body and query, into nested fields.
 *
 * A list stays a set of fields named 0, 1, 2 …: only the reader of a parameter knows whether it asked for a list
 * (metadata may have a key called 0). `a[]=v` takes the next free number.
 */
export function readForm(text: string): FormReading {
  const fields = emptyFields();
  for (const [name, value] of new URLSearchParams(text)) {
    const path = splitName(name);
    if (path === null) return { ok: false, reason: `The parameter name "${name}" cannot be read.` };
    const problem = put(fields, path, value);
    if (problem !== null) return { ok: false, reason: `${problem}: "${name}".` };
  }
  return { ok: true, fields };
}

// No prototype, so that a name such as toString is only ever a name.
function emptyFields(): FormFields {
  return Object.create(null);
}

function splitName(name: string): string[] | null {
  const match = /^([^[\]]+)((?:\[[^[\]]*\])*)$/.exec(name);
  if (match === null) return null;
  const [, first = "", brackets = ""] = match;
  const inner = [...brackets.matchAll(/\[([^[\]]*)\]/g)].map(([, part = ""]) => part);
  return [first, ...inner];
}

function put(fields: FormFields, path: string[], value: string): string | null {
  if (path.length > DEEPEST_NAME) return "The parameter is nested too deeply";
  if (path.some((part) => NAMES_NEVER_TAKEN.has(part))) return "The parameter name is not allowed";
  let here = fields;
  for (const [depth, part] of path.entries()) {
    const name = part === "" ? String(Object.keys(here).length) : part;
    const present = here[name];
    if (depth === path.length - 1) {
      if (typeof present === "object") return "The parameter is both a value and a group";
      here[name] = value;
      return null;
    }
    if (typeof present === "string") return "The parameter is both a value and a group";
    const next = present ?? emptyFields();
    here[name] = next;
    here = next;
  }
  return null;
}
