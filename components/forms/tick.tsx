"use client";

import { FieldError } from "./field-parts";
import { useField } from "./form-context";

/** One box to tick; ticked sends "yes". */
export function Tick({ name, label, hint, isTicked = false }: { name: string; label: string; hint?: string; isTicked?: boolean }) {
  const field = useField(name);
  return (
    <div>
      <FieldError id={field.id} message={field.error} />
      <div className="choice">
        <input
          id={field.id}
          type="checkbox"
          name={name}
          value="yes"
          key={String(field.isChosen("yes", isTicked ? ["yes"] : []))}
          defaultChecked={field.isChosen("yes", isTicked ? ["yes"] : [])}
          aria-invalid={field.error ? true : undefined}
          aria-describedby={[hint ? `${field.id}-note` : "", field.error ? `${field.id}-error` : ""].join(" ").trim() || undefined}
          {...field.watched}
        />
        <div>
          <label htmlFor={field.id} className="block py-0.5">
            {label}
          </label>
          {hint && (
            <span id={`${field.id}-note`} className="block text-quiet">
              {hint}
            </span>
          )}
        </div>
      </div>
    </div>
  );
}
