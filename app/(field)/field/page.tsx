import type { Metadata } from "next";
import Link from "next/link";
import { PageHeading } from "@/components/ui/page-heading";
import { listDays } from "@/lib/roster/list-days";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";

export const metadata: Metadata = { title: "The days you lead" };

export default async function FieldPage() {
  const days = await ask(listDays, {});
  return (
    <>
      <PageHeading title="The days you lead" facts={days.length === 0 ? undefined : days.length === 1 ? "One day." : `${days.length} days, the soonest first.`} />
      {days.length === 0 ? (
        <p className="mt-6">No days to come. When you say yes to leading an outing, it stands here until three days after it.</p>
      ) : (
        <ul className="lines mt-6">
          {days.map((day) => (
            <li key={day.id}>
              <Link href={pathTo.fieldDay(day.slug)} className="font-bold text-[1.2rem]">
                {day.title}
              </Link>
              <p>
                {day.whenAndWhere}
              </p>
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
