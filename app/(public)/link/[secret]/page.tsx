import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { Choices } from "@/components/forms/choices";
import { TextField } from "@/components/forms/text-field";
import { PageHeading } from "@/components/ui/page-heading";
import { showRequestByLink } from "@/lib/helpers/show-request-by-link";
import { showMailLink } from "@/lib/people/show-mail-link";
import { ask } from "@/lib/web/ask";
import { acceptInvitationAction, answerByLinkAction, followLinkAction } from "./actions";

export const metadata: Metadata = { title: "A link from our mail", robots: { index: false } };

type Props = { params: Promise<{ secret: string }> };

/** Where every link in a mail leads. Opening it does nothing yet, since mail programs open links on their own. */
export default async function LinkPage({ params }: Props) {
  const { secret } = await params;
  const link = await ask(showMailLink, { secret });
  if (link.purpose === "answer") return <AnswerPage secret={secret} />;
  if (link.purpose === "invitation" && link.hasPassword && link.state === "good") return <KnownPage name={link.name} />;
  if (link.state !== "good") return <SpentPage state={link.state} />;
  if (link.purpose === "invitation") return <InvitationPage secret={secret} name={link.name} email={link.email} />;
  const isConfirming = link.purpose === "confirm-email";
  return (
    <>
      <PageHeading title={isConfirming ? "Confirm your e-mail" : "Sign in"} facts={`For ${link.name}, ${link.email}.`} />
      <ActionForm action={followLinkAction} submit={isConfirming ? "Yes, this is my address" : "Sign me in"} carry={{ secret }} />
    </>
  );
}

function InvitationPage({ secret, name, email }: { secret: string; name: string; email: string }) {
  return (
    <>
      <PageHeading title="Welcome" facts={`Your account is for ${email}. Say what we shall call you, and choose a password.`} />
      <ActionForm action={acceptInvitationAction} submit="Start" carry={{ secret }}>
        <TextField name="name" label="Your name" autoComplete="name" value={name} />
        <TextField name="password" label="Choose a password" type="password" autoComplete="new-password" hint="At least 10 characters. Several words in a row are easy to keep." />
      </ActionForm>
    </>
  );
}

function KnownPage({ name }: { name: string }) {
  return (
    <>
      <PageHeading title="You have an account already" facts={`${name}, what you were invited to is open to you now.`} />
      <p className="mt-4">
        <Link className="button" href="/sign-in">
          Sign in
        </Link>
      </p>
    </>
  );
}

function SpentPage({ state }: { state: "used" | "late" }) {
  return (
    <>
      <PageHeading title={state === "used" ? "This link has been used already" : "This link is too old"} facts="Links in our mails work once. You can have a new one in a minute." />
      <p className="mt-4">
        <Link className="button" href="/sign-in">
          Ask for a new link
        </Link>
      </p>
    </>
  );
}

const states = { asked: "You have not answered yet.", yes: "Your answer so far: yes.", maybe: "Your answer so far: maybe.", no: "Your answer so far: no." };

async function AnswerPage({ secret }: { secret: string }) {
  const request = await ask(showRequestByLink, { secret });
  const { outing } = request;
  return (
    <>
      <PageHeading title={`Can you help at ${outing.title}?`} facts={outing.whenAndWhere} />
      <p className="mt-4">
        Hello {request.name}. We ask you to {request.task === "leader" ? "lead this outing" : "come along as a chaperone"}. {states[request.state]}
      </p>
      {request.late || outing.room === "called off" || outing.room === "done" ? (
        <p className="mt-4 font-bold">This outing is {outing.room === "called off" ? "called off" : "over"}, so no answer is needed.</p>
      ) : (
        <ActionForm action={answerByLinkAction} submit="Send my answer" carry={{ secret }}>
          <Choices
            name="answer"
            legend="Will you come?"
            pick="one"
            chosen={request.state === "asked" ? [] : [request.state]}
            choices={[
              { value: "yes", label: "Yes, I am coming" },
              { value: "maybe", label: "Maybe", hint: "Not counted for the ratio until it is a yes." },
              { value: "no", label: "No" },
            ]}
          />
        </ActionForm>
      )}
    </>
  );
}
