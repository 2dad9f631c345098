import type { ReactNode } from "react";
import { FieldError, Hint } from "./field-parts";
import type { Field } from "./form-context";

/** What stands around every field: its label, what helps to answer, and what is wrong, all close to it. */
export function FieldFrame({ field, label, hint, isInline = false, children }: { field: Field; label: string; hint?: ReactNode; isInline?: boolean; children: ReactNode }) {
  return (
    <div className={isInline ? "flex flex-wrap items-center gap-x-4 gap-y-1" : "my-5"}>
      <label htmlFor={field.id} className="block font-bold mb-0.5">
        {label}
      </label>
      {hint && <Hint id={field.id}>{hint}</Hint>}
      <FieldError id={field.id} message={field.error} />
      {children}
    </div>
  );
}
