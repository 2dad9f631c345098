"use client";

import type { ReactNode } from "react";
import type { Choice } from "./choice";
import { FieldFrame } from "./field-frame";
import { useField } from "./form-context";

type Props = { name: string; label: string; hint?: ReactNode; choices: readonly Choice[]; value?: string; empty?: string; isInline?: boolean };

export function SelectField({ name, label, hint, choices, value = "", empty, isInline = false }: Props) {
  const field = useField(name);
  const chosen = field.typed(value);
  return (
    <FieldFrame field={field} label={label} hint={hint} isInline={isInline}>
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
    </FieldFrame>
  );
}
