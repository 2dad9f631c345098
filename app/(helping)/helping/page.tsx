import type { Metadata } from "next";
import { ActionForm } from "@/components/forms/action-form";
import { Choices } from "@/components/forms/choices";
import { Tick } from "@/components/forms/tick";
import { PageHeading } from "@/components/ui/page-heading";
import { Verdict } from "@/components/ui/verdict";
import { WrittenText } from "@/components/ui/written-text";
import { listMyRequests } from "@/lib/helpers/list-my-requests";
import { plainDayInWords } from "@/lib/shared/dates";
import { ask } from "@/lib/web/ask";
import { answerRequestAction, changeAbilitiesAction } from "./actions";

export const metadata: Metadata = { title: "Helping" };

export default async function HelpingPage() {
  const { requests, record } = await ask(listMyRequests, {});
  const toCome = requests.filter((one) => one.outing.room !== "done" && one.outing.room !== "called off");
  const open = toCome.filter((one) => one.state === "asked");
  return (
    <>
      <PageHeading title="Helping" />
      <Verdict
        kind={open.length === 0 ? "good" : "you"}
        sentence={open.length === 0 ? "Nothing needs you." : open.length === 1 ? "One outing waits for your answer." : `${open.length} outings wait for your answer.`}
      />
      <h2 className="mt-8">Outings to come</h2>
      {toCome.length === 0 && <p className="mt-2">You are not asked to any outing just now.</p>}
      {toCome.map((one) => (
        <section key={one.answerId} className="panel mt-5" aria-labelledby={`asked-${one.answerId}`}>
          <h3 id={`asked-${one.answerId}`}>{one.outing.title}</h3>
          <p>
            {one.outing.whenAndWhere} {one.task === "leader" ? "You are asked to lead." : "You are asked as a chaperone."}
          </p>
          <ActionForm action={answerRequestAction} submit="Send my answer" look={one.state === "asked" ? "first" : "second"} carry={{ answerId: one.answerId }} answer="below" scope={one.answerId}>
            <Choices
              name="answer"
              legend={`Will you come to ${one.outing.title}?`}
              pick="one"
              chosen={one.state === "asked" ? [] : [one.state]}
              choices={[
                { value: "yes", label: "Yes" },
                { value: "maybe", label: "Maybe", hint: "Not counted for the ratio until it is a yes." },
                { value: "no", label: "No" },
              ]}
            />
          </ActionForm>
          {one.meetingText && (
            <details className="mt-4">
              <summary>Where to meet</summary>
              <WrittenText text={one.meetingText} />
            </details>
          )}
        </section>
      ))}
      <section aria-labelledby="abilities" className="mt-14">
        <h2 id="abilities">What you can do</h2>
        <p className="mt-2">
          {record?.clearedUntil ? `You are cleared to ${plainDayInWords(record.clearedUntil)}.` : "You are not cleared yet; the coordinator tells you how."} An
          adult who does not guide or drive counts in full all the same.
        </p>
        <ActionForm action={changeAbilitiesAction} submit="Save">
          <Tick name="isAdult" label="I am 18 or older" isTicked={record?.isAdult ?? false} />
          <Tick name="guidesLeft" label="I guide with my left arm" isTicked={record?.guidesLeft ?? false} />
          <Tick name="guidesRight" label="I guide with my right arm" isTicked={record?.guidesRight ?? false} />
          <Tick name="pushesChair" label="I push a wheelchair on uneven ground" isTicked={record?.pushesChair ?? false} />
          <Tick name="firstAid" label="I have a valid first-aid certificate" isTicked={record?.firstAid ?? false} />
          <Tick name="drives" label="I drive for the group" isTicked={record?.drives ?? false} />
        </ActionForm>
      </section>
    </>
  );
}
