import type { ReactNode } from "react";

export function Hint({ id, children }: { id: string; children: ReactNode }) {
  return (
    <span id={`${id}-hint`} className="block text-quiet max-w-[60ch] mb-1.5">
      {children}
    </span>
  );
}

export function FieldError({ id, message }: { id: string; message: string | undefined }) {
  if (!message) return null;
  return (
    <span id={`${id}-error`} className="flex gap-2 text-madder font-bold mb-1.5">
      <svg viewBox="0 0 24 24" aria-hidden="true" className="w-6 h-6 shrink-0">
        <path d="M7.5 1.5h9l6 6v9l-6 6h-9l-6-6v-9z" fill="currentColor" />
        <path d="M12 6v8M12 16.5v2" stroke="var(--paper)" strokeWidth="3" />
      </svg>
      <span>
        <span className="sr-only">Error: </span>
        {message}
      </span>
    </span>
  );
}
