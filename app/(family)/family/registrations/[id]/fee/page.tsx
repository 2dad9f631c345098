import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { Choices } from "@/components/forms/choices";
import { TextField } from "@/components/forms/text-field";
import { PageHeading } from "@/components/ui/page-heading";
import { Verdict } from "@/components/ui/verdict";
import { showRegistration } from "@/lib/registrations/show-registration";
import { sentence } from "@/lib/shared/words";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { chooseFeeAction } from "../actions";

export const metadata: Metadata = { title: "The fee" };

type Props = { params: Promise<{ id: string }> };

export default async function FeePage({ params }: Props) {
  const { id } = await params;
  const { outing, child, fee, state, holdUntil } = await ask(showRegistration, { registrationId: id });
  const isFree = outing.suggestedFeeCents === 0;
  return (
    <>
      <PageHeading
        title="The fee"
        crumbs={[{ href: "/family", text: "Your family" }, { href: pathTo.registration(id), text: outing.title }]}
        facts={`For ${child.nameUsed}. ${isFree ? "This outing asks for no fee." : `We suggest ${outing.fee}.`}`}
      />
      {fee.state === "settled" ? (
        <Verdict kind="good" sentence="The fee is settled. Nothing more is to pay." />
      ) : state !== "held" ? (
        <Verdict kind="wait" sentence="No seat is held for this registration now, so there is nothing to pay.">
          <p>
            <Link href={pathTo.registration(id)}>Back to the registration</Link>
          </p>
        </Verdict>
      ) : (
        <>
          <p className="mt-4">
            {sentence(`The seat is held until ${holdUntil ?? "later today"}`)} Card payment happens on the payment service&rsquo;s own page; we never see the card. A no-fee place
            is a seat like any other: no reason is asked, and nobody but the coordinator can tell.
          </p>
          <ActionForm action={chooseFeeAction} submit="Go on" carry={{ registrationId: id }}>
            <Choices
              name="choice"
              legend="What would you like to pay?"
              pick="one"
              chosen={[isFree ? "no fee" : "suggested"]}
              choices={[
                ...(isFree ? [] : [{ value: "suggested", label: `The suggested fee, ${outing.fee}` }]),
                { value: "other", label: "Another amount" },
                { value: "no fee", label: "A no-fee place" },
              ]}
            />
            <TextField name="otherAmount" label="Another amount, in dollars" isShort inputMode="decimal" hint="Only if you chose another amount, such as 5 or 12.50." />
          </ActionForm>
        </>
      )}
    </>
  );
}
