import type { Route } from "next";
import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { choicesOf } from "@/components/forms/choice";
import { Choices } from "@/components/forms/choices";
import { TextField } from "@/components/forms/text-field";
import { PageHeading } from "@/components/ui/page-heading";
import { readingFormats } from "@/lib/people/person";
import { showMe } from "@/lib/people/show-me";
import type { Role } from "@/lib/shared/actor";
import { ask } from "@/lib/web/ask";
import { becomeGuardianAction, changeReadingAction, signOutAction } from "./actions";

export const metadata: Metadata = { title: "Your account" };

const doors: Record<Role, { href: Route; text: string }> = {
  guardian: { href: "/family", text: "Your family: what needs you, children, registrations" },
  chaperone: { href: "/helping", text: "Helping: what you are asked, and where to meet" },
  leader: { href: "/field", text: "The days you lead, with their rosters" },
  coordinator: { href: "/desk", text: "The desk: what needs you, across outings" },
  admin: { href: "/desk/people", text: "People and their roles" },
};

export default async function AccountPage() {
  const me = await ask(showMe, {});
  return (
    <>
      <PageHeading title={`Hello, ${me.name}`} facts={`Signed in as ${me.email}.`} />
      <ul className="lines mt-6">
        {me.roles.map((role) => (
          <li key={role}>
            <Link href={doors[role].href} className="text-[1.2rem] font-bold">
              {doors[role].text}
            </Link>
          </li>
        ))}
      </ul>
      <section aria-labelledby="reading" className="mt-12">
        <h2 id="reading" className="pb-1.5 border-b-2 border-edge">
          How you read
        </h2>
        <ActionForm action={changeReadingAction} submit="Save">
          <Choices name="readingFormat" legend="Papers for you come as" pick="one" chosen={[me.readingFormat]} choices={choicesOf(readingFormats)} />
          <TextField name="textSizePt" label="Size of large print, in points" isShort inputMode="numeric" value={String(me.textSizePt)} hint="18 is common large print; from 14 to 36." />
        </ActionForm>
      </section>
      {!me.roles.includes("guardian") && (
        <section aria-labelledby="children" className="mt-12">
          <h2 id="children" className="pb-1.5 border-b-2 border-edge">
            Children of your own
          </h2>
          <p className="mt-3">With this account you can register your own children as well.</p>
          <ActionForm action={becomeGuardianAction} submit="Start a family page" look="second" />
        </section>
      )}
      <section aria-labelledby="leave" className="mt-12">
        <h2 id="leave" className="pb-1.5 border-b-2 border-edge">
          Leave
        </h2>
        <ActionForm action={signOutAction} submit="Sign out" look="second" />
      </section>
    </>
  );
}
