"use client";

import type { ReactNode } from "react";
import { FieldError, Hint } from "./field-parts";
import { useField } from "./form-context";

type Props = { name: string; label: string; hint?: ReactNode; value?: string; rows?: number };

export function TextArea({ name, label, hint, value = "", rows = 4 }: Props) {
  const field = useField(name);
  return (
    <div className="my-5">
      <label htmlFor={field.id} className="block font-bold mb-0.5">
        {label}
      </label>
      {hint && <Hint id={field.id}>{hint}</Hint>}
      <FieldError id={field.id} message={field.error} />
      <textarea
        id={field.id}
        name={name}
        rows={rows}
        defaultValue={field.typed(value)}
        aria-invalid={field.error ? true : undefined}
        aria-describedby={field.describedBy(Boolean(hint))}
        className="field-box max-w-[44rem]"
        {...field.watched}
      />
    </div>
  );
}
