"use client";

import dynamic from "next/dynamic";
import { useState, type ReactNode } from "react";

const MonthGrid = dynamic(() => import("./month-grid").then((file) => file.MonthGrid), {
  ssr: false,
  loading: () => <p className="mt-6">Loading the month grid.</p>,
});

/** The list, and beside it, once asked for, the same outings as a month grid. Nothing of the grid is loaded before. */
export function CalendarSwitch({ firstMonth, children }: { firstMonth: string; children: ReactNode }) {
  const [isGrid, setIsGrid] = useState(false);
  return (
    <>
      <p className="mt-4">
        <button type="button" className="button second" aria-pressed={isGrid} onClick={() => setIsGrid(!isGrid)}>
          Show as a month grid
        </button>
      </p>
      {isGrid && <MonthGrid firstMonth={firstMonth} />}
      {children}
    </>
  );
}
