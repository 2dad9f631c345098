import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { Choices } from "@/components/forms/choices";
import { DeskRooms } from "@/components/outings/desk-rooms";
import { PageHeading } from "@/components/ui/page-heading";
import { StateMark, type StateKind } from "@/components/ui/state-mark";
import { listOutingHelpers } from "@/lib/helpers/list-outing-helpers";
import { showOuting } from "@/lib/outings/show-outing";
import { plainDayInWords } from "@/lib/shared/dates";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { sentence } from "@/lib/shared/words";
import { askToHelpAction } from "./actions";

export const metadata: Metadata = { title: "Adults of an outing" };

type Props = { params: Promise<{ slug: string }> };

const marks: Record<"asked" | "yes" | "maybe" | "no", { kind: StateKind; word: string }> = {
  yes: { kind: "good", word: "Yes." },
  maybe: { kind: "wait", word: "Maybe: not counted." },
  asked: { kind: "wait", word: "Asked, no answer yet." },
  no: { kind: "off", word: "No." },
};

export default async function HelpersPage({ params }: Props) {
  const { slug } = await params;
  const { answers, others } = await ask(listOutingHelpers, { slug });
  const outing = await ask(showOuting, { slug });
  const yes = answers.filter((one) => one.state === "yes");
  const notCleared = yes.filter((one) => !one.clearedThatDay);
  return (
    <>
      <PageHeading
        title="Adults"
        crumbs={[{ href: "/desk", text: "Desk" }, { href: pathTo.deskOuting(slug), text: outing.title }]}
        facts={`${yes.length} said yes${notCleared.length === 0 ? "" : `; ${notCleared.length} of them not cleared for that day`}. ${sentence(outing.when)}`}
      />
      <DeskRooms slug={slug} here="Adults" />
      {answers.length === 0 ? (
        <p className="mt-4">Nobody has been asked yet.</p>
      ) : (
        <ul className="lines mt-4">
          {answers.map((one) => (
            <li key={one.id} className="mark-row">
              <StateMark kind={marks[one.state].kind} />
              <div>
                <p className="font-bold">
                  {one.name}, {one.task}
                </p>
                <p>
                  <span className="word">{marks[one.state].word}</span> {one.abilities}
                </p>
              </div>
              <p className={one.clearedThatDay ? "text-quiet" : "font-bold text-madder"}>{clearanceInWords(one)}</p>
            </li>
          ))}
        </ul>
      )}
      <section aria-labelledby="ask" className="mt-12">
        <h2 id="ask">Ask more people</h2>
        {others.length === 0 ? (
          <p className="mt-2">
            Everybody who helps has been asked. <Link href="/desk/people">Invite somebody new</Link>
          </p>
        ) : (
          <ActionForm action={askToHelpAction} submit="Ask by mail" carry={{ slug }}>
            <Choices
              name="task"
              legend="What for?"
              pick="one"
              chosen={["chaperone"]}
              choices={[
                { value: "chaperone", label: "To come as a chaperone" },
                { value: "leader", label: "To lead the outing" },
              ]}
            />
            <Choices
              name="personIds"
              legend="Whom?"
              pick="any"
              choices={others.map((one) => ({ value: one.personId, label: one.name, hint: `${one.abilities} ${clearanceInWords(one)}` }))}
            />
          </ActionForm>
        )}
      </section>
    </>
  );
}

function clearanceInWords(one: { clearedThatDay: boolean; clearedUntil: string | null }): string {
  if (one.clearedUntil === null) return "Not cleared.";
  const until = plainDayInWords(one.clearedUntil);
  return one.clearedThatDay ? `Cleared to ${until}.` : `Clearance ends ${until}, before the outing.`;
}
