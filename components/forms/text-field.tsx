"use client";

import type { ReactNode } from "react";
import { FieldFrame } from "./field-frame";
import { useField } from "./form-context";

type Props = {
  name: string;
  label: string;
  hint?: ReactNode;
  type?: "text" | "email" | "tel" | "password" | "url";
  autoComplete?: string;
  inputMode?: "numeric" | "decimal" | "tel" | "email";
  value?: string;
  isShort?: boolean;
  spellCheck?: boolean;
};

export function TextField({ name, label, hint, type = "text", autoComplete, inputMode, value = "", isShort = false, spellCheck }: Props) {
  const field = useField(name);
  return (
    <FieldFrame field={field} label={label} hint={hint}>
      <input
        id={field.id}
        name={name}
        type={type}
        defaultValue={type === "password" ? "" : field.typed(value)}
        autoComplete={autoComplete}
        inputMode={inputMode}
        spellCheck={spellCheck}
        aria-invalid={field.error ? true : undefined}
        aria-describedby={field.describedBy(Boolean(hint))}
        className={`field-box ${isShort ? "short" : ""}`}
        {...field.watched}
      />
    </FieldFrame>
  );
}
