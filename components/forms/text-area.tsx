"use client";

import type { ReactNode } from "react";
import { FieldFrame } from "./field-frame";
import { useField } from "./form-context";

type Props = { name: string; label: string; hint?: ReactNode; value?: string; rows?: number };

export function TextArea({ name, label, hint, value = "", rows = 4 }: Props) {
  const field = useField(name);
  return (
    <FieldFrame field={field} label={label} hint={hint}>
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
    </FieldFrame>
  );
}
