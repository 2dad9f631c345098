"use client";

import dayGridPlugin from "@fullcalendar/daygrid";
import listPlugin from "@fullcalendar/list";
import FullCalendar from "@fullcalendar/react";
import { addMonths, format, parse, startOfMonth } from "date-fns";
import { useId, useRef, useState } from "react";
import useSWR from "swr";
import type { OutingView } from "@/lib/outings/outing-view";
import "./month-grid.css";

/** Its buttons and heading are ours, since the grid's own fail an accessibility check; what it draws are links. */
export function MonthGrid({ firstMonth }: { firstMonth: string }) {
  const calendar = useRef<FullCalendar>(null);
  // Seven columns do not fit a narrow screen or a large zoom: there the month is a list, drawn by the same calendar.
  const [isNarrow] = useState(() => window.matchMedia("(max-width: 44rem)").matches);
  const heading = useId();
  const [month, setMonth] = useState(() => parse(firstMonth, "yyyy-MM", new Date()));
  const { data, error, isLoading } = useSWR<OutingView[], Error>(rangeAddress(month), fetchOutings, { keepPreviousData: true });
  const inMonth = (data ?? []).filter((outing) => outing.month === format(month, "yyyy-MM"));

  function go(months: number) {
    const next = addMonths(month, months);
    setMonth(next);
    calendar.current?.getApi().gotoDate(next);
  }

  return (
    <section aria-label="Month grid" className="mt-6 month-grid">
      <div className="flex flex-wrap items-center gap-3">
        <button type="button" className="button second" onClick={() => go(-1)}>
          Month before
        </button>
        <button type="button" className="button second" onClick={() => go(1)}>
          Month after
        </button>
        <h2 id={heading}>
          {format(month, "MMMM yyyy")}
        </h2>
      </div>
      <p role="status" className="my-3">
        {error ? "The outings could not be loaded. The list below is complete." : isLoading ? "Loading the outings." : countInWords(inMonth.length)}
      </p>
      <FullCalendar
        ref={calendar}
        plugins={[dayGridPlugin, listPlugin]}
        initialView={isNarrow ? "listMonth" : "dayGridMonth"}
        noEventsContent="No outings this month."
        initialDate={month}
        headerToolbar={false}
        dayMaxEvents={false}
        showNonCurrentDates={false}
        fixedWeekCount={false}
        height="auto"
        eventInteractive
        eventDisplay="block"
        eventTimeFormat={{ hour: "numeric", minute: "2-digit", meridiem: "short" }}
        timeZone="local"
        events={inMonth.map((outing) => ({
          id: outing.id,
          title: `${outing.title}, ${outing.roomInWords}`,
          start: wallClock(outing.startsAt, outing.zone),
          end: wallClock(outing.endsAt, outing.zone),
          url: `/outings/${outing.slug}`,
        }))}
        viewDidMount={({ el }) => el.querySelector("[role=grid]")?.setAttribute("aria-labelledby", heading)}
      />
    </section>
  );
}

function rangeAddress(month: Date): string {
  const from = startOfMonth(month);
  const to = startOfMonth(addMonths(month, 1));
  // A day more on each side: a month begins and ends at other instants in other zones.
  const wide = { from: new Date(from.getTime() - 86_400_000), to: new Date(to.getTime() + 86_400_000) };
  return `/api/outings?from=${wide.from.toISOString()}&to=${wide.to.toISOString()}`;
}

async function fetchOutings(address: string): Promise<OutingView[]> {
  const response = await fetch(address);
  if (!response.ok) throw new Error(`outings answered ${response.status}`);
  return (await response.json()) as OutingView[];
}

/** The clock at the site, without a zone, so that the grid shows the day people meet, wherever it is read. */
function wallClock(instant: string, zone: string): string {
  const parts = new Intl.DateTimeFormat("sv-SE", { timeZone: zone, dateStyle: "short", timeStyle: "medium" }).format(new Date(instant));
  return parts.replace(" ", "T");
}

function countInWords(count: number): string {
  if (count === 0) return "No outings this month.";
  return count === 1 ? "1 outing this month." : `${count} outings this month.`;
}
