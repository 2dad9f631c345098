export type StateKind = "good" | "you" | "stop" | "wait" | "off";

/** A state is always a word, a shape and a colour together; this is the shape. */
export function StateMark({ kind }: { kind: StateKind }) {
  switch (kind) {
    case "good":
      return (
        <svg viewBox="0 0 24 24" aria-hidden="true" fill="none" stroke="currentColor" strokeWidth="3" className="text-marsh w-6 h-6 shrink-0">
          <circle cx="12" cy="12" r="10" />
          <path d="M7 12.5l3.5 3.5L17 9" />
        </svg>
      );
    case "you":
      return (
        <svg viewBox="0 0 24 24" aria-hidden="true" className="w-6 h-6 shrink-0">
          <path d="M12 1.5L23 22H1z" fill="var(--amber)" stroke="var(--ink)" strokeWidth="2.2" strokeLinejoin="round" />
          <path d="M12 8v7M12 17.5v2" stroke="var(--on-amber)" strokeWidth="2.6" />
        </svg>
      );
    case "stop":
      return (
        <svg viewBox="0 0 24 24" aria-hidden="true" className="text-madder w-6 h-6 shrink-0">
          <path d="M7.5 1.5h9l6 6v9l-6 6h-9l-6-6v-9z" fill="currentColor" />
          <path d="M7 12h10" stroke="var(--card)" strokeWidth="3.4" />
        </svg>
      );
    case "wait":
      return (
        <svg viewBox="0 0 24 24" aria-hidden="true" fill="none" stroke="currentColor" strokeWidth="3" className="w-6 h-6 shrink-0">
          <circle cx="12" cy="12" r="10" strokeDasharray="4 3.2" />
          <path d="M12 6.5V12l4 2.5" />
        </svg>
      );
    case "off":
      return (
        <svg viewBox="0 0 24 24" aria-hidden="true" fill="none" stroke="currentColor" strokeWidth="3" className="text-quiet w-6 h-6 shrink-0">
          <circle cx="12" cy="12" r="10" />
          <path d="M5 19L19 5" />
        </svg>
      );
  }
}
