import type { Metadata, Route } from "next";
import Link from "next/link";
import { printRosterAction } from "@/app/print-roster-action";
import { RosterPapers } from "@/components/outings/roster-papers";
import { PageHeading } from "@/components/ui/page-heading";
import { showMe } from "@/lib/people/show-me";
import { listPapers } from "@/lib/roster/list-papers";
import { totalsInWords, type RosterFacts } from "@/lib/roster/roster-facts";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";

export const metadata: Metadata = { title: "Your day" };

type Props = { params: Promise<{ slug: string }> };

export default async function FieldDayPage({ params }: Props) {
  const { slug } = await params;
  const { outing, papers, isCurrent, facts } = await ask(listPapers, { slug });
  const me = await ask(showMe, {});
  return (
    <>
      <PageHeading title={outing.title} crumbs={[{ href: "/field", text: "The days you lead" }]} facts={`${outing.whenAndWhere} Base: ${facts.basePhone}.`} />
      <section aria-labelledby="roster" className="mt-8">
        <h2 id="roster">Roster</h2>
        <p className="mt-2 font-bold">{totalsInWords(facts)}</p>
        <p className="mt-2">
          <Link href={`${pathTo.fieldDay(slug)}/contacts` as Route}>Whom to call and who may collect</Link>
        </p>
        <RosterOnScreen facts={facts} />
      </section>
      <section aria-labelledby="papers" className="mt-12">
        <h2 id="papers">On paper</h2>
        <RosterPapers slug={slug} papers={papers} isCurrent={isCurrent} sizePt={me.textSizePt} prefersLarge={me.readingFormat === "large print"} print={printRosterAction} />
      </section>
    </>
  );
}

/** One person a line, the answer first, as a refreshable display shows it: number, name, adult. */
function RosterOnScreen({ facts }: { facts: RosterFacts }) {
  const adultName = (id: string | null) => facts.adults.find((adult) => adult.id === id)?.name;
  if (facts.people.length === 0) return <p className="mt-3">Nobody is confirmed yet.</p>;
  return (
    <ul className="lines mt-3">
      {facts.people
        .toSorted((one, other) => one.number - other.number)
        .map((person) => (
          <li key={person.number}>
            <p className="text-[1.2rem] font-bold">
              {person.number} {person.nameUsed}
            </p>
            <p>
              {adultName(person.adultId) ? `with ${adultName(person.adultId)}` : "with nobody yet"}
              {person.actionNotes.length > 0 ? `; ${person.actionNotes.join("; ")}` : ""}
              {person.photo === "no" ? "; no photo" : ""}
              {person.voice === "no" ? "; no voice in recordings" : ""}
            </p>
          </li>
        ))}
    </ul>
  );
}
