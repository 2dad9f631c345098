import type { ReactNode } from "react";

/** A caution where the work can hurt someone: it defers to local rules and qualified people. */
export function Caution({ children }: { children: ReactNode }) {
  return (
    <aside className="my-6 border-t-2 border-b-2 border-edge py-3" aria-label="Caution">
      <p>
        <strong>Caution.</strong> {children}
      </p>
    </aside>
  );
}
