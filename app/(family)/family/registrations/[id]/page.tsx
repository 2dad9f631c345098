import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { Tick } from "@/components/forms/tick";
import { StateMark } from "@/components/ui/state-mark";
import { PageHeading } from "@/components/ui/page-heading";
import { Verdict } from "@/components/ui/verdict";
import { WrittenText } from "@/components/ui/written-text";
import type { StateKind } from "@/components/ui/state-mark";
import type { Step } from "@/lib/registrations/registration";
import type { RegistrationView } from "@/lib/registrations/registration-view";
import { showRegistration } from "@/lib/registrations/show-registration";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { withdrawAction } from "./actions";

export const metadata: Metadata = { title: "A registration" };

type Props = { params: Promise<{ id: string }> };

const stepWords: Record<Step, { name: string; todo: string; done: string }> = {
  needs: { name: "What your child needs", todo: "Say what makes it a good day, or confirm that it is still right.", done: "Told. You can still change it." },
  waiver: { name: "The waiver", todo: "Read it and sign with your name.", done: "" },
  fee: { name: "The fee", todo: "Pay the suggested fee, another amount, or take a no-fee place.", done: "" },
};

export default async function RegistrationPage({ params }: Props) {
  const { id } = await params;
  const registration = await ask(showRegistration, { registrationId: id });
  const { outing, child, stepsLeft } = registration;
  const nextStep = stepsLeft[0];
  return (
    <>
      <PageHeading title={`${child.nameUsed}: ${outing.title}`} crumbs={[{ href: "/family", text: "Your family" }]} facts={outing.whenAndWhere} />
      <Verdict kind={verdictKind(registration)} sentence={registration.stateInWords}>
        {registration.isOn && registration.state === "held" && nextStep && (
          <>
            <p>
              {stepsLeft.length} of 3 {stepsLeft.length === 1 ? "steps is" : "steps are"} left. The seat is yours when all three are done.
            </p>
            <p>
              <Link className="button" href={pathTo.registrationStep(id, nextStep)}>
                Go on: {stepWords[nextStep].name.toLowerCase()}
              </Link>
            </p>
          </>
        )}
        {registration.state === "withdrawn" && outing.takesRegistrations && (
          <p>
            {registration.fee.state === "settled" && registration.fee.amount !== "$0" ? `We give back ${registration.fee.amount}; it takes a few days. ` : ""}
            What you wrote is kept. <Link href={pathTo.registering(outing.slug)}>Register again</Link>
          </p>
        )}
        {registration.isOn && registration.state === "confirmed" && <p>We have sent you a mail with the meeting point and a calendar file. Nothing else is needed until the day.</p>}
      </Verdict>
      {registration.isOn && (
        <>
          <h2 className="mt-8 mb-3">The three steps</h2>
          <ol className="lines">
            {(["needs", "waiver", "fee"] as const).map((step) => (
              <StepLine key={step} step={step} registration={registration} />
            ))}
          </ol>
          {registration.meetingText && (
            <section aria-labelledby="where" className="mt-12">
              <h2 id="where" className="mb-3">
                Where to meet
              </h2>
              <WrittenText text={registration.meetingText} />
            </section>
          )}
          <Leaving id={id} nameUsed={child.nameUsed} />
        </>
      )}
    </>
  );
}

function Leaving({ id, nameUsed }: { id: string; nameUsed: string }) {
  return (
      <section aria-labelledby="leave" className="mt-14">
        <h2 id="leave">Not coming after all?</h2>
        <p className="mt-2">No reason needed. The seat goes to the next family on the list.</p>
        <ActionForm action={withdrawAction} submit={`Withdraw ${nameUsed}`} look="stop" carry={{ registrationId: id }}>
          <Tick name="sure" label="Yes, give the seat back" />
        </ActionForm>
      </section>
  );
}

function verdictKind({ state, isOn }: RegistrationView): StateKind {
  if (!isOn) return "off";
  if (state === "confirmed") return "good";
  if (state === "held") return "you";
  return state === "waiting" ? "wait" : "off";
}

function StepLine({ step, registration }: { step: Step; registration: RegistrationView }) {
  const isLeft = registration.stepsLeft.includes(step);
  const words = stepWords[step];
  const waits = registration.state === "waiting" && step !== "needs" && isLeft;
  const done = step === "waiver" ? registration.signed : step === "fee" ? feeInWords(registration) : words.done;
  return (
    <li className="mark-row">
      <StateMark kind={!isLeft ? "good" : waits ? "wait" : "you"} />
      <div>
        <p className="font-bold">{words.name}</p>
        <p>
          <span className={`word ${!isLeft ? "good" : waits ? "" : "you"}`}>{!isLeft ? "Done." : waits ? "Later." : "To do."}</span>{" "}
          {!isLeft ? done : waits ? "Comes when a seat is free." : words.todo}
        </p>
      </div>
      <div>
        {!waits && (isLeft || step === "needs") && (
          <Link href={pathTo.registrationStep(registration.id, step)} className="inline-block py-1.5">
            {isLeft ? `Open: ${words.name.toLowerCase()}` : "Change what your child needs"}
          </Link>
        )}
      </div>
    </li>
  );
}

function feeInWords({ fee }: RegistrationView): string {
  return fee.amount === "$0" ? "Nothing to pay." : `${fee.amount} received. Thank you.`;
}
