"use client";

import type { ReactNode } from "react";
import type { Choice } from "./choice";
import { FieldError, Hint } from "./field-parts";
import { useField } from "./form-context";

type Props = {
  name: string;
  legend: string;
  hint?: ReactNode;
  choices: readonly Choice[];
  chosen?: readonly string[];
  /** "one" is a group of radio buttons, "any" of tick boxes. */
  pick: "one" | "any";
};

/** A question with a few answers. The first answer carries the field's id, so an error's link lands on it. */
export function Choices({ name, legend, hint, choices, chosen = [], pick }: Props) {
  const field = useField(name);
  return (
    <fieldset className="my-6" aria-describedby={field.describedBy(Boolean(hint))} aria-invalid={field.error ? true : undefined}>
      <legend className="font-bold mb-0.5">{legend}</legend>
      {hint && <Hint id={field.id}>{hint}</Hint>}
      <FieldError id={field.id} message={field.error} />
      {choices.map((choice, index) => {
        const id = index === 0 ? field.id : `${field.id}-${index + 1}`;
        return (
          <div key={choice.value} className="choice">
            <input
              id={id}
              type={pick === "one" ? "radio" : "checkbox"}
              name={name}
              value={choice.value}
              key={String(field.isChosen(choice.value, chosen))}
              defaultChecked={field.isChosen(choice.value, chosen)}
              aria-describedby={choice.hint ? `${id}-note` : undefined}
              {...field.watched}
            />
            <div>
              <label htmlFor={id} className="block py-0.5">
                {choice.label}
              </label>
              {choice.hint && (
                <span id={`${id}-note`} className="block text-quiet max-w-[60ch]">
                  {choice.hint}
                </span>
              )}
            </div>
          </div>
        );
      })}
    </fieldset>
  );
}
