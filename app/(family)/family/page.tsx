import type { Metadata } from "next";
import Link from "next/link";
import { RegistrationLines } from "@/components/registrations/registration-lines";
import { PageHeading } from "@/components/ui/page-heading";
import { Verdict } from "@/components/ui/verdict";
import { listChildren } from "@/lib/families/list-children";
import { listMyRegistrations } from "@/lib/registrations/list-my-registrations";
import { sentence } from "@/lib/shared/words";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";

export const metadata: Metadata = { title: "Your family" };

export default async function FamilyPage() {
  const [children, registrations] = [await ask(listChildren, {}), await ask(listMyRegistrations, {})];
  const toCome = registrations.filter((one) => one.isOn);
  const past = registrations.filter((one) => one.state === "confirmed" && !one.isOn);
  const unfinished = toCome.filter((one) => one.state === "held");
  return (
    <>
      <PageHeading title="Your family" />
      {unfinished.length === 0 ? (
        <Verdict kind="good" sentence={toCome.length === 0 ? "Nothing needs you. Have a look at the outings." : "Nothing needs you: everything is in."} />
      ) : (
        <Verdict kind="you" sentence={unfinished.length === 1 ? "One registration needs you." : `${unfinished.length} registrations need you.`}>
          <ul className="space-y-1">
            {unfinished.map((one) => (
              <li key={one.id}>
                <Link href={pathTo.registration(one.id)} className="font-bold">
                  Finish {one.child.nameUsed}, {one.outing.title}
                </Link>
                . {sentence(`The seat is held until ${one.holdUntil ?? "later today"}`)}
              </li>
            ))}
          </ul>
        </Verdict>
      )}
      <section aria-labelledby="coming" className="mt-10">
        <h2 id="coming" className="mb-3">
          Registrations
        </h2>
        {toCome.length === 0 ? (
          <p>
            No registrations to come. <Link href="/outings">See the next outings</Link>
          </p>
        ) : (
          <RegistrationLines registrations={toCome} />
        )}
      </section>
      <section aria-labelledby="children" className="mt-12">
        <h2 id="children" className="mb-3">
          Children
        </h2>
        {children.length === 0 ? (
          <p>Nobody yet.</p>
        ) : (
          <ul className="lines">
            {children.map((child) => (
              <li key={child.id}>
                <Link href={pathTo.child(child.id)} className="font-bold text-[1.15rem]">
                  {child.nameUsed}
                </Link>
                . {child.hasProfile ? "You have told us what makes a good day." : "Not yet told: what makes a good day."}
              </li>
            ))}
          </ul>
        )}
        <p className="mt-4">
          <Link className="button second" href="/family/children/new">
            Add a child
          </Link>
        </p>
      </section>
      {past.length > 0 && (
        <section aria-labelledby="past" className="mt-12">
          <h2 id="past" className="mb-3">
            Past and called off
          </h2>
          <RegistrationLines registrations={past} />
        </section>
      )}
    </>
  );
}
