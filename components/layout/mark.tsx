/** The mark: five short strokes turning together, a flock. */
export function Mark({ className = "w-10 h-7" }: { className?: string }) {
  return (
    <svg viewBox="0 0 48 32" aria-hidden="true" fill="none" stroke="currentColor" strokeWidth="4" strokeLinecap="round" className={className}>
      <path d="M5 24l3 4M14 15l5 5M25 10l7 3M36 11l7-1M40 22l5-4" />
    </svg>
  );
}
