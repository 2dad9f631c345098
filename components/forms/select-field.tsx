"use client";

import type { ReactNode } from "react";
import type { Choice } from "./choice";
import { FieldError, Hint } from "./field-parts";
import { useField } from "./form-context";

type Props = { name: string; label: string; hint?: ReactNode; choices: readonly Choice[]; value?: string; empty?: string; isInline?: boolean };

export function SelectField({ name, label, hint, choices, value = "", empty, isInline = false }: Props) {
  const field = useField(name);
  const chosen = field.typed(value);
  return (
    <div className={isInline ? "flex flex-wrap items-center gap-x-4 gap-y-1" : "my-5"}>
      <label htmlFor={field.id} className="block font-bold mb-0.5">
        {label}
      </label>
      {hint && <Hint id={field.id}>{hint}</Hint>}
      <FieldError id={field.id} message={field.error} />
      <select
        id={field.id}
        name={name}
        key={chosen}
        defaultValue={chosen}
        aria-invalid={field.error ? true : undefined}
        aria-describedby={field.describedBy(Boolean(hint))}
        className={`field-box ${isInline ? "short" : ""}`}
        {...field.watched}
      >
        {empty !== undefined && <option value="">{empty}</option>}
        {choices.map((choice) => (
          <option key={choice.value} value={choice.value}>
            {choice.label}
          </option>
        ))}
      </select>
    </div>
  );
}
