"use client";

import { useEffect, useRef } from "react";
import { fieldId } from "./form-context";

/**
 * Takes focus when a form comes back, says what is wrong and leads to each field. It is no live region:
 * taking focus already has it read once.
 */
export function ErrorSummary({ scope = "", sentence, fields, attempt }: { scope?: string; sentence: string; fields: Record<string, string>; attempt: number }) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    box.current?.focus();
    const plain = document.title.replace(/^Error: /, "");
    document.title = `Error: ${plain}`;
    return () => {
      document.title = plain;
    };
  }, [attempt]);
  const entries = Object.entries(fields);
  return (
    <div ref={box} tabIndex={-1} className="slab stop my-6" role="group" aria-labelledby={`${scope}problem`}>
      <h2 id={`${scope}problem`} className="text-[1.35rem]">
        There is a problem
      </h2>
      {entries.length === 0 || sentence !== "There is a problem" ? <p className="mt-2">{sentence}</p> : null}
      {entries.length > 0 && (
        <ul className="mt-2 space-y-1 list-disc pl-6">
          {entries.map(([name, message]) => (
            <li key={name}>
              <a href={`#${fieldId(scope, name)}`} className="text-madder font-bold">
                {message}
              </a>
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
