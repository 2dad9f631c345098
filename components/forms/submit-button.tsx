"use client";

const looks = { first: "button", second: "button second", stop: "button stop" } as const;

/** Stays in reach while it works: a disabled button would lose the focus that is on it. */
export function SubmitButton({ text, look, pending }: { text: string; look: keyof typeof looks; pending: boolean }) {
  return (
    <p className="mt-6 max-w-none">
      <button type="submit" className={looks[look]} aria-disabled={pending || undefined} onClick={(event) => pending && event.preventDefault()}>
        {pending ? `${text}: one moment` : text}
      </button>
    </p>
  );
}
