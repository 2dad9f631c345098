"use client";

/** A bug, said plainly: what is stored is safe, and there is a way on. */
export default function ErrorPage({ reset }: { reset: () => void }) {
  return (
    <div className="pt-8">
      <h1>Something went wrong on our side</h1>
      <p className="mt-3">What was saved before is safe. Try again; if it happens again, call us and say what you were doing.</p>
      <button type="button" className="button mt-4" onClick={reset}>
        Try again
      </button>
    </div>
  );
}
