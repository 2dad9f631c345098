import type { Metadata } from "next";
import Link from "next/link";
import { Call } from "@/components/ui/call";
import { Facts } from "@/components/ui/facts";
import { PageHeading } from "@/components/ui/page-heading";
import { Verdict } from "@/components/ui/verdict";
import { listTeachingModels } from "@/lib/teaching-models/list-teaching-models";
import { showOuting } from "@/lib/outings/show-outing";
import { isStaff } from "@/lib/shared/actor";
import { ask } from "@/lib/web/ask";
import { currentActor } from "@/lib/web/session";
import { pathTo } from "@/lib/web/paths";

type Props = { params: Promise<{ slug: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const outing = await ask(showOuting, await params);
  return { title: `${outing.title}, ${outing.dayInWords}`, description: outing.summary };
}

export default async function OutingPage({ params }: Props) {
  const outing = await ask(showOuting, await params);
  const models = await ask(listTeachingModels, { ids: outing.modelIds });
  const actor = await currentActor();
  return (
    <>
      <PageHeading title={outing.title} crumbs={[{ href: "/outings", text: "Outings" }]} facts={outing.whenAndWhere} />
      <Call name={outing.title} className="w-64 max-w-full h-16" />
      {outing.state === "draft" && <Verdict kind="wait" sentence="A draft: only staff see this page." />}
      {outing.room === "called off" && (
        <Verdict kind="stop" sentence="This outing is called off.">
          <p>{outing.calledOffBecause}</p>
        </Verdict>
      )}
      <div className="columns mt-6">
        <div>
          <p className="text-[1.15rem]">{outing.summary}</p>
          <Facts
            rows={[
              ["When", outing.when],
              ["Where", `${outing.siteName}, ${outing.landManager}`],
              ["Underfoot", outing.ground],
              ["What we listen for", outing.theme],
              ["Who it is for", `Blind and partially sighted young people, ${outing.ages}`],
              ["Fee", outing.suggestedFeeCents === 0 ? "Nothing to pay" : `${outing.fee} suggested. Another amount, or a no-fee place with no reason asked.`],
            ]}
          />
          <h2 className="mt-10 pb-1.5 border-b-2 border-edge">Teaching models of the day</h2>
          {models.length === 0 ? (
            <p className="mt-3">No model comes along this time.</p>
          ) : (
            <ul className="mt-3 space-y-3">
              {models.map((model) => (
                <li key={model.id}>
                  <Link href={`/models/${model.slug}`} prefetch={false} className="font-bold">
                    {model.title}
                  </Link>
                  . {model.concept}
                </li>
              ))}
            </ul>
          )}
        </div>
        <aside className="panel" aria-labelledby="room">
          <h2 id="room" className="text-[1.35rem]">
            {outing.roomInWords}
          </h2>
          {outing.takesRegistrations ? (
            <>
              <p className="mt-2">
                {outing.room === "full"
                  ? `All ${outing.seats} seats are taken. ${outing.waiting === 0 ? "Nobody is waiting yet." : `${outing.waiting} waiting.`}`
                  : `Of ${outing.seats} seats. A seat is held for you while you finish the form.`}
              </p>
              <p className="mt-4">
                <Link className="button w-full" href={pathTo.registering(outing.slug)} prefetch={false}>
                  {outing.room === "full" ? "Join the waiting list" : "Register a child"}
                </Link>
              </p>
            </>
          ) : (
            <p className="mt-2">This outing takes no registrations now.</p>
          )}
          <p className="mt-4">
            <a href={`/api/outings/${outing.slug}/calendar.ics`}>Calendar file of this outing</a>
          </p>
          {isStaff(actor) && (
            <p className="mt-4">
              <Link href={pathTo.deskOuting(outing.slug)}>Open at the desk</Link>
            </p>
          )}
        </aside>
      </div>
    </>
  );
}
