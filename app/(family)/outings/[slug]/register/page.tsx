import type { Metadata, Route } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { Choices } from "@/components/forms/choices";
import { PageHeading } from "@/components/ui/page-heading";
import { listChildren } from "@/lib/families/list-children";
import { showOuting } from "@/lib/outings/show-outing";
import { ageOn } from "@/lib/shared/dates";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { sentence } from "@/lib/shared/words";
import { registerChildAction } from "./actions";

export const metadata: Metadata = { title: "Register a child" };

type Props = { params: Promise<{ slug: string }> };

export default async function RegisterPage({ params }: Props) {
  const { slug } = await params;
  const children = await ask(listChildren, {});
  const outing = await ask(showOuting, { slug });
  const add = `/family/children/new?back=${encodeURIComponent(pathTo.registering(slug))}` as Route;
  return (
    <>
      <PageHeading
        title={outing.room === "full" ? "Join the waiting list" : "Register a child"}
        crumbs={[{ href: "/outings", text: "Outings" }, { href: pathTo.outing(slug), text: outing.title }]}
        facts={`${outing.title}. ${sentence(outing.when)} ${outing.roomInWords}, ${outing.ages}.`}
      />
      {!outing.takesRegistrations ? (
        <p className="mt-6">
          This outing takes no registrations now. <Link href="/outings">See the next outings</Link>
        </p>
      ) : children.length === 0 ? (
        <>
          <p className="mt-6">First tell us who is coming: a name and a date of birth.</p>
          <p className="mt-4">
            <Link className="button" href={add}>
              Add a child
            </Link>
          </p>
        </>
      ) : (
        <>
          <p className="mt-4">
            {outing.room === "full"
              ? "All seats are taken. We put your child on the waiting list and tell you the place in it; there is nothing to pay until a seat is free."
              : "We hold a seat for 45 minutes while you finish three steps: what your child needs, the waiver and the fee."}
          </p>
          <ActionForm action={registerChildAction} submit={outing.room === "full" ? "Put on the waiting list" : "Hold a seat"} carry={{ slug }}>
            <Choices
              name="participantId"
              legend="Who is coming?"
              pick="one"
              chosen={children.length === 1 && children[0] ? [children[0].id] : []}
              choices={children.map((child) => ({ value: child.id, label: child.nameUsed, hint: `${ageOn(child.birthDate, outing.day)} years old on the day` }))}
            />
          </ActionForm>
          <p className="mt-6">
            <Link href={add}>Add another child</Link>
          </p>
        </>
      )}
    </>
  );
}
