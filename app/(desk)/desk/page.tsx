import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { PageHeading } from "@/components/ui/page-heading";
import { StateMark } from "@/components/ui/state-mark";
import { Verdict } from "@/components/ui/verdict";
import { listDesk } from "@/lib/desk/list-desk";
import { listDeliveries } from "@/lib/messages/list-deliveries";
import { listMoneyToReturn } from "@/lib/payments/list-money-to-return";
import { moneyInWords } from "@/lib/shared/money";
import { counted } from "@/lib/shared/words";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { retryDeliveriesAction, returnPaymentAction } from "./messages/actions";

export const metadata: Metadata = { title: "Desk" };

export default async function DeskPage() {
  const { toCome, past } = await ask(listDesk, {});
  const { unsent } = await ask(listDeliveries, { unsentOnly: true });
  const money = await ask(listMoneyToReturn, {});
  const stopped = toCome.filter((one) => one.verdict?.kind === "stop").length;
  const needing = toCome.filter((one) => one.verdict?.kind === "you").length;
  return (
    <>
      <PageHeading title="Desk" facts={`${counted(toCome.length, "outing", "outings")} to come. ${stopped} stopped, ${needing} not yet ready.`} />
      {unsent.waiting + unsent.failed > 0 && (
        <Verdict kind="you" sentence={`${counted(unsent.waiting + unsent.failed, "mail", "mails")} could not be sent yet.`}>
          <p>
            The mail server did not take them. They are kept. Tried again by themselves: {unsent.waiting}; given up: {unsent.failed}.{" "}
            <Link href="/desk/messages">See which</Link>
          </p>
          <ActionForm action={retryDeliveriesAction} submit="Send them again now" look="second" />
        </Verdict>
      )}
      {money.length > 0 && (
        <Verdict kind="you" sentence={money.length === 1 ? "One payment is to be given back." : `${money.length} payments are to be given back.`}>
          <ul className="list-disc pl-6">
            {money.map((one) => (
              <li key={one.paymentId}>
                {one.nameUsed}: {moneyInWords({ cents: one.amountCents, currency: one.currency })}, {one.why}.
                <ActionForm action={returnPaymentAction} submit={`Note that ${one.nameUsed}'s money was given back`} look="second" carry={{ paymentId: one.paymentId }} scope={one.paymentId} />
              </li>
            ))}
          </ul>
        </Verdict>
      )}
      <div className="mt-8 flex flex-wrap items-baseline justify-between gap-3">
        <h2>Outings to come</h2>
        <Link className="button" href="/desk/outings/new">
          Plan an outing
        </Link>
      </div>
      {toCome.length === 0 ? (
        <p className="mt-4">Nothing is planned.</p>
      ) : (
        <ul className="lines mt-4">
          {toCome.map(({ outing, verdict }) => (
            <li key={outing.id} className="mark-row">
              <StateMark kind={verdict?.kind ?? "off"} />
              <div>
                <Link href={pathTo.deskOuting(outing.slug)} className="font-bold text-[1.15rem]">
                  {outing.title}
                </Link>
                <p>
                  {outing.whenAndWhere}
                </p>
                <p>{verdict?.sentence ?? "Called off."}</p>
              </div>
              <p className="text-quiet mid:text-right">
                {outing.state}
                <br />
                {outing.seats - outing.seatsFree} of {outing.seats} seats
              </p>
            </li>
          ))}
        </ul>
      )}
      {past.length > 0 && (
        <section aria-labelledby="past" className="mt-14">
          <h2 id="past">Past</h2>
          <ul className="lines mt-3">
            {past.map(({ outing }) => (
              <li key={outing.id}>
                <Link href={pathTo.deskOuting(outing.slug)} className="font-bold">
                  {outing.title}
                </Link>
                . {outing.dayInWords}. {outing.state === "called off" ? "Called off." : `${counted(outing.seats - outing.seatsFree, "person", "people")}.`}
              </li>
            ))}
          </ul>
        </section>
      )}
    </>
  );
}
