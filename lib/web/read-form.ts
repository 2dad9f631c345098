import type { FormValues } from "./form-state";

/** Names a form never gets back. */
const secrets = new Set(["password", "secret"]);

/**
 * A form as plain data: repeated names become a list, dots in a name become nesting
 * ("contacts.0.phone"). Names that could reach a prototype are left out.
 */
export function readForm(form: FormData): Record<string, unknown> {
  const data: Record<string, unknown> = {};
  for (const name of new Set(form.keys())) {
    if (name.startsWith("$ACTION")) continue;
    const values = form.getAll(name).filter((value) => typeof value === "string");
    place(data, name.split("."), values.length > 1 ? values : values[0]);
  }
  return data;
}

function place(target: Record<string, unknown>, path: string[], value: unknown): void {
  const [step, ...rest] = path;
  if (step === undefined || step === "__proto__" || step === "constructor" || step === "prototype") return;
  if (rest.length === 0) {
    target[step] = value;
    return;
  }
  const next = target[step];
  const inside = typeof next === "object" && next !== null && !Array.isArray(next) ? (next as Record<string, unknown>) : {};
  target[step] = inside;
  place(inside, rest, value);
}

/** What was typed, to be shown again. */
export function typedValues(form: FormData): FormValues {
  const values: FormValues = {};
  for (const name of new Set(form.keys())) {
    if (name.startsWith("$ACTION") || secrets.has(name)) continue;
    const all = form.getAll(name).filter((value) => typeof value === "string");
    values[name] = all.length > 1 ? all : (all[0] ?? "");
  }
  return values;
}
