import { addMonths, eachMonthOfInterval, endOfMonth, format, isAfter, startOfMonth } from "date-fns";
import { TZDate } from "@date-fns/tz";
import type { Metadata } from "next";
import { CalendarSwitch } from "@/components/outings/calendar-switch";
import { OutingRows } from "@/components/outings/outing-rows";
import { PageHeading } from "@/components/ui/page-heading";
import { listOutings } from "@/lib/outings/list-outings";
import { env } from "@/lib/shared/env";
import { monthInWords } from "@/lib/shared/dates";
import { ask } from "@/lib/web/ask";

export const metadata: Metadata = { title: "Outings" };

const monthsShown = 6;

/** The list comes first and whole; the month grid of the same outings is brought only when somebody wants it. */
export default async function OutingsPage() {
  const now = TZDate.tz(env().PROGRAMME_ZONE);
  const months = eachMonthOfInterval({ start: startOfMonth(now), end: addMonths(now, monthsShown - 1) });
  const last = endOfMonth(months.at(-1) ?? now);
  const outings = await ask(listOutings, { from: startOfMonth(now).toISOString(), to: last.toISOString() });
  const isToCome = (endsAt: string) => isAfter(new Date(endsAt), now);
  return (
    <>
      <PageHeading title="Outings" facts="The next six months. Each outing has room for a guide, a dog, a chair and a seat without a fee." />
      <CalendarSwitch firstMonth={format(now, "yyyy-MM")}>
        {months.map((month) => {
          const key = format(month, "yyyy-MM");
          const inMonth = outings.filter((outing) => outing.month === key && isToCome(outing.endsAt));
          return (
            <section key={key} aria-labelledby={`month-${key}`}>
              <h2 id={`month-${key}`} className="mt-10 pb-1.5 border-b-2 border-edge">
                {monthInWords(key)}
              </h2>
              {inMonth.length === 0 ? <p className="mt-4 text-quiet">No outings this month.</p> : <OutingRows outings={inMonth} />}
            </section>
          );
        })}
      </CalendarSwitch>
    </>
  );
}
