import { ActionForm } from "@/components/forms/action-form";
import { Choices } from "@/components/forms/choices";
import { TextField } from "@/components/forms/text-field";
import { Caution } from "@/components/ui/caution";
import { Verdict } from "@/components/ui/verdict";
import type { FormAction } from "@/lib/web/form-state";

type Paper = { id: string; form: string; textSizePt: number; version: number; printedAt: string; by: string };
type Props = { slug: string; papers: Paper[]; isCurrent: boolean; sizePt: number; prefersLarge?: boolean; print: FormAction };

/** The roster: printing it, and the prints there are. The same numbers stand in every form. */
export function RosterPapers({ slug, papers, isCurrent, sizePt, prefersLarge = false, print }: Props) {
  return (
    <>
      {papers.length > 0 && (
        <Verdict kind={isCurrent ? "good" : "you"} sentence={isCurrent ? "The last roster still says what is true." : "Something has changed since the last roster. Print it again and collect the old one."} />
      )}
      <ActionForm action={print} submit="Make the roster" carry={{ slug }}>
        <Choices
          name="form"
          legend="Which form?"
          pick="one"
          chosen={[prefersLarge ? "large print" : "standard"]}
          choices={[
            { value: "standard", label: "Standard, one table", hint: "14 point, for a sighted leader." },
            { value: "large print", label: "Large print, one person a block", hint: "18 point or more; the number, the name, the adult, what to do." },
          ]}
        />
        <TextField name="textSizePt" label="Size of large print, in points" isShort inputMode="numeric" value={String(Math.max(18, sizePt))} hint="From 18 to 36." />
      </ActionForm>
      <Caution>
        A roster never holds medical detail, custody facts, addresses or fees. Follow each family&rsquo;s plan and the judgement of qualified
        people. In an emergency call the local emergency number first. Collect and shred rosters after the day.
      </Caution>
      <h2 className="mt-8">Rosters made so far</h2>
      {papers.length === 0 ? (
        <p className="mt-2">None yet.</p>
      ) : (
        <ul className="lines mt-3">
          {papers.map((paper) => (
            <li key={paper.id}>
              <a href={`/api/papers/${paper.id}`} className="font-bold">
                Roster version {paper.version}, {paper.form}, {paper.textSizePt} point
              </a>{" "}
              (tagged PDF). Made by {paper.by}, {paper.printedAt}.
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
