import Link from "next/link";
import { StateMark } from "@/components/ui/state-mark";
import type { OutingView } from "@/lib/outings/outing-view";
import { pathTo } from "@/lib/web/paths";

/** Outings as a list: the whole of each in one heading and two lines, so that a row makes sense read alone. */
export function OutingRows({ outings }: { outings: OutingView[] }) {
  return (
    <ul>
      {outings.map((outing) => (
        <li key={outing.id} className="outing-row">
          <p className="font-extrabold text-[2.4rem] leading-none" aria-hidden="true">
            {dayNumber(outing.day)}
            <span className="block text-[0.95rem] font-semibold mt-1.5">{outing.dayInWords.split(" ")[0]}</span>
          </p>
          <div>
            <h3 className="text-[1.35rem]">
              <Link href={pathTo.outing(outing.slug)} prefetch={false} className="text-ink decoration-marsh">
                {outing.title}
              </Link>
            </h3>
            <p className="mt-1.5">
              {outing.dayInWords}, {outing.hours}, {outing.siteName}
            </p>
            <p className="text-quiet">{outing.ground}</p>
          </div>
          <div className="mid:text-right">
            <p className="font-bold flex gap-2 mid:justify-end items-center">
              {outing.room === "called off" && <StateMark kind="stop" />}
              {outing.roomInWords}
            </p>
            <p className="text-quiet">{outing.ages}</p>
            {outing.waiting > 0 && <p className="text-quiet">{outing.waiting} waiting</p>}
          </div>
        </li>
      ))}
    </ul>
  );
}

function dayNumber(day: string): number {
  return Number(day.slice(8));
}
