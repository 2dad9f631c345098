import type { ReactNode } from "react";

/** Pairs of a label and its value, read as a list. */
export function Facts({ rows }: { rows: (readonly [label: string, value: ReactNode] | null)[] }) {
  return (
    <dl className="grid gap-x-6 gap-y-2 my-4 mid:grid-cols-[max-content_minmax(0,1fr)]">
      {rows.map((row) =>
        row === null ? null : (
          <div key={row[0]} className="contents">
            <dt className="font-bold">{row[0]}</dt>
            <dd className="mb-2 mid:mb-0">{row[1]}</dd>
          </div>
        ),
      )}
    </dl>
  );
}
