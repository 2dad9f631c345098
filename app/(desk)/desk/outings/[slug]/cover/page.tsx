import type { Metadata } from "next";
import { ActionForm } from "@/components/forms/action-form";
import { SelectField } from "@/components/forms/select-field";
import { AdultsWithPeople } from "@/components/cover/adults-with-people";
import { FindingLines } from "@/components/cover/finding-lines";
import { DeskRooms } from "@/components/outings/desk-rooms";
import { Caution } from "@/components/ui/caution";
import { PageHeading } from "@/components/ui/page-heading";
import { Verdict } from "@/components/ui/verdict";
import { checkOutingCover } from "@/lib/cover-board/check-outing-cover";
import { COVER_CAUTION } from "@/lib/cover/cover";
import { showOuting } from "@/lib/outings/show-outing";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { sentence } from "@/lib/shared/words";
import { checkCoverAction, pairPeopleAction } from "./actions";

export const metadata: Metadata = { title: "Cover" };

type Props = { params: Promise<{ slug: string }> };

export default async function CoverPage({ params }: Props) {
  const { slug } = await params;
  const { verdict, people, adults, policy } = await ask(checkOutingCover, { slug });
  const outing = await ask(showOuting, { slug });
  const hindering = verdict.findings.filter((finding) => finding.severity === "stops");
  return (
    <>
      <PageHeading
        title="Cover"
        crumbs={[{ href: "/desk", text: "Desk" }, { href: pathTo.deskOuting(slug), text: outing.title }]}
        facts={`${sentence(outing.when)} Policy: ${policy.name}, version ${policy.version}.`}
      />
      <DeskRooms slug={slug} here="Cover" />
      <Verdict kind={verdict.covered ? "good" : "stop"} sentence={verdict.sentence}>
        {hindering[0]?.action && (
          <p>
            <strong>Next:</strong> {hindering[0].action}
          </p>
        )}
      </Verdict>
      <ActionForm action={checkCoverAction} submit="Check again" look="second" carry={{ slug }} />
      <Caution>{COVER_CAUTION}</Caution>
      <section aria-labelledby="answers" className="mt-10">
        <h2 id="answers" className="mb-3">
          The answers, one by one
        </h2>
        <FindingLines findings={verdict.findings} />
      </section>
      <section aria-labelledby="adults" className="mt-14">
        <h2 id="adults" className="mb-4">
          Adults and their people
        </h2>
        <AdultsWithPeople adults={adults} people={people} />
      </section>
      {people.length > 0 && (
        <section aria-labelledby="pair" className="mt-14">
          <h2 id="pair">Who goes with whom</h2>
          <p className="mt-2">Choose an adult for each person. Saving checks the cover again.</p>
          <ActionForm action={pairPeopleAction} submit="Save the pairs" carry={{ slug }}>
            <div className="mt-4 grid gap-x-8 mid:grid-cols-2">
              {people.map((person) => (
                <SelectField
                  key={person.id}
                  name={`pair.${person.id}`}
                  label={`${person.number ?? ""} ${person.nameUsed}`.trim()}
                  hint={needInWords(person)}
                  value={person.adultId ?? ""}
                  empty="Nobody yet"
                  choices={adults.map((adult) => ({ value: adult.id, label: adult.name }))}
                />
              ))}
            </div>
          </ActionForm>
        </section>
      )}
    </>
  );
}

function needInWords(person: { support: string; guide: string; guideSide: string; chair: string | null }): string {
  const guide = person.guide === "not-needed" ? "no guide" : `guide ${person.guide === "throughout" ? "all the time" : "at times"}, ${person.guideSide} arm`;
  const chair = person.chair === null ? "" : `, chair ${person.chair}`;
  return `${person.support} support, ${guide}${chair}`;
}
