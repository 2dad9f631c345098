"use client";

import type { ReactNode } from "react";
import { FieldError } from "./field-parts";
import { useField } from "./form-context";

/** A part of a longer form, with its heading, who sees the answers, and an error that belongs to the part as a whole. */
export function FormPart({ title, seenBy, name, children }: { title: string; seenBy?: string; name?: string; children: ReactNode }) {
  const field = useField(name ?? "");
  return (
    <section className="mt-10 border-t-2 border-edge pt-5" aria-label={title}>
      <h2 id={name ? field.id : undefined} tabIndex={name ? -1 : undefined}>
        {title}
      </h2>
      {seenBy && (
        <p className="text-quiet mt-1">
          <strong>Who sees this:</strong> {seenBy}.
        </p>
      )}
      {name && <FieldError id={field.id} message={field.error} />}
      {children}
    </section>
  );
}
