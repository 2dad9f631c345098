"use client";

import { createContext, useContext, type ChangeEventHandler, type FocusEventHandler } from "react";
import type { FormValues } from "@/lib/web/form-state";

type Watcher = {
  onChange: ChangeEventHandler;
  onBlur: FocusEventHandler;
};

/** What every field of a form needs to know: what was typed, what is wrong, and who watches while typing. */
export type FormFacts = {
  /** Tells the fields of one form from those of another on the same page. */
  scope: string;
  values: FormValues | null;
  errors: Record<string, string>;
  watch?: (name: string) => Watcher;
};

const FormContext = createContext<FormFacts>({ scope: "", values: null, errors: {} });

export const FormFactsProvider = FormContext.Provider;

export type Field = {
  id: string;
  error: string | undefined;
  typed: (fallback: string) => string;
  isChosen: (value: string, fallback: readonly string[]) => boolean;
  describedBy: (hasHint: boolean) => string | undefined;
  watched: Watcher | Record<string, never>;
};

/** Ids derive from the form's scope and the field's name, so a summary, a hint and an error always find their field. */
export function fieldId(scope: string, name: string): string {
  return `field-${scope === "" ? "" : `${scope}-`}${name.replaceAll(".", "-")}`;
}

export function useField(name: string): Field {
  const form = useContext(FormContext);
  const id = fieldId(form.scope, name);
  const error = form.errors[name];
  const sent = form.values?.[name];
  return {
    id,
    error,
    typed: (fallback) => (form.values === null ? fallback : typeof sent === "string" ? sent : (sent?.[0] ?? "")),
    isChosen: (value, fallback) =>
      form.values === null ? fallback.includes(value) : typeof sent === "string" ? sent === value : (sent?.includes(value) ?? false),
    describedBy: (hasHint) => [hasHint ? `${id}-hint` : "", error ? `${id}-error` : ""].filter((part) => part !== "").join(" ") || undefined,
    watched: form.watch?.(name) ?? {},
  };
}
