import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { TextField } from "@/components/forms/text-field";
import { DeskRooms } from "@/components/outings/desk-rooms";
import { PeopleTable } from "@/components/registrations/people-table";
import { DeliveryTable } from "@/components/ui/delivery-table";
import { PageHeading } from "@/components/ui/page-heading";
import { StateMark, type StateKind } from "@/components/ui/state-mark";
import { Verdict } from "@/components/ui/verdict";
import { WrittenText } from "@/components/ui/written-text";
import { showOutingDesk } from "@/lib/desk/show-outing-desk";
import { listDeliveries } from "@/lib/messages/list-deliveries";
import type { OutingState } from "@/lib/outings/outing";
import type { ReadinessItem, ReadinessState } from "@/lib/readiness/readiness";
import { listOutingPeople } from "@/lib/registrations/list-outing-people";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { sendMeetingPointAction } from "../../messages/actions";
import { callOffOutingAction, closeOutingAction, publishOutingAction } from "../actions";

type Props = { params: Promise<{ slug: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { outing } = await ask(showOutingDesk, await params);
  return { title: `${outing.title} at the desk` };
}

export default async function OutingDeskPage({ params }: Props) {
  const { slug } = await params;
  const { outing, items, verdict, facts, meetingText } = await ask(showOutingDesk, { slug });
  const people = await ask(listOutingPeople, { slug });
  const { deliveries } = await ask(listDeliveries, { outingId: outing.id });
  const isLive = outing.state !== "called off" && outing.room !== "done";
  return (
    <>
      <PageHeading
        title={outing.title}
        crumbs={[{ href: "/desk", text: "Desk" }]}
        facts={`${outing.whenAndWhere} ${facts.confirmed} coming, ${facts.helpers.yes} adults, ${outing.waiting} waiting.`}
      />
      <DeskRooms slug={slug} here="Readiness" />
      {isLive ? (
        <Verdict kind={verdict.kind} sentence={verdict.sentence} />
      ) : (
        <Verdict kind="off" sentence={outing.state === "called off" ? "This outing is called off." : "This outing is over."}>
          {outing.calledOffBecause && <p>{outing.calledOffBecause}</p>}
        </Verdict>
      )}
      <div className="columns">
        <section aria-labelledby="readiness">
          <h2 id="readiness" className="mb-3">
            Readiness
          </h2>
          <ul className="lines">
            {items.map((item) => (
              <ReadinessLine key={item.name} item={item} slug={slug} />
            ))}
          </ul>
        </section>
        <aside className="space-y-5">
          <section className="panel" aria-labelledby="do">
            <h2 id="do" className="text-[1.2rem]">
              The outing
            </h2>
            <p className="mt-2">
              <Link href={pathTo.deskRoom(slug, "edit")}>Change it</Link>
              <br />
              <Link href={pathTo.outing(slug)}>See its public page</Link>
            </p>
            {/* One form in all three states, so that what it answers is still there when the state has changed. */}
            {isLive && <ActionForm {...openingOf(outing.state)} carry={{ slug }} answer="below" />}
          </section>
          <section className="panel" aria-labelledby="where">
            <h2 id="where" className="text-[1.2rem]">
              Where to meet
            </h2>
            <details className="mt-1">
              <summary>Read the instructions</summary>
              <WrittenText text={meetingText} />
            </details>
            {isLive && <ActionForm action={sendMeetingPointAction} submit="Mail it to the adults who come" look="second" carry={{ slug }} answer="below" />}
          </section>
        </aside>
      </div>
      <section aria-labelledby="people" className="mt-14">
        <h2 id="people">People</h2>
        <PeopleTable people={people} />
      </section>
      <section aria-labelledby="mails" className="mt-14">
        <h2 id="mails">Mails of this outing</h2>
        <p className="mt-2">{deliveriesInWords(deliveries)}</p>
        {deliveries.length > 0 && (
          <details className="mt-2">
            <summary>Show the mails</summary>
            <DeliveryTable deliveries={deliveries} zone={outing.zone} caption="Newest first" />
          </details>
        )}
      </section>
      {isLive && (
        <section aria-labelledby="off" className="mt-14 max-w-[44rem]">
          <h2 id="off">Call the day off</h2>
          <p className="mt-2">Every family and every adult is told at once, each in a mail of their own. This cannot be taken back.</p>
          <ActionForm action={callOffOutingAction} submit="Call it off" look="stop" carry={{ slug }}>
            <TextField name="because" label="The reason, in a sentence they will read" />
          </ActionForm>
        </section>
      )}
    </>
  );
}

function deliveriesInWords(deliveries: { state: string }[]): string {
  const sent = deliveries.filter((one) => one.state === "sent").length;
  if (deliveries.length === 0) return "None yet.";
  return sent === deliveries.length ? `All ${sent} are sent.` : `${sent} of ${deliveries.length} are sent.`;
}

function openingOf(state: OutingState) {
  if (state === "open") return { action: closeOutingAction, submit: "Close registration", look: "second" } as const;
  return { action: publishOutingAction, submit: state === "draft" ? "Publish" : "Open again" } as const;
}

const marks: Record<ReadinessState, { kind: StateKind; look: string; word: string }> = {
  ready: { kind: "good", look: "good", word: "Ready." },
  "waiting on others": { kind: "wait", look: "", word: "Waiting on others." },
  "needs you": { kind: "you", look: "you", word: "Needs you." },
  "stops the outing": { kind: "stop", look: "stop", word: "Stops the outing." },
};

function ReadinessLine({ item, slug }: { item: ReadinessItem; slug: string }) {
  const mark = marks[item.state];
  return (
    <li className="mark-row">
      <StateMark kind={mark.kind} />
      <div>
        <p className="font-bold">{item.name}</p>
        <p>
          <span className={`word ${mark.look}`}>{mark.word}</span> {item.sentence}{" "}
          {item.act && item.act.path !== "" && item.act.path !== "messages" && (
            <Link href={pathTo.deskRoom(slug, item.act.path)}>{item.act.text}</Link>
          )}
          {item.act?.path === "messages" && <a href="#where">{item.act.text}</a>}
          {item.act?.path === "" && <a href="#do">{item.act.text}</a>}
        </p>
      </div>
    </li>
  );
}
