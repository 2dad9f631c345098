import { DataTable } from "@/components/ui/data-table";
import { guideNeedOf, supportInWords, type AccessProfile } from "@/lib/families/access-profile";
import type { Step } from "@/lib/registrations/registration";
import { counted } from "@/lib/shared/words";

type Person = {
  id: string;
  nameUsed: string;
  age: number;
  state: "held" | "waiting" | "confirmed" | "withdrawn" | "turned away";
  number: number | null;
  placeInQueue: number | null;
  profile: AccessProfile | null;
  guardianStays: string | null;
  thisTime: string;
  missing: Step[];
  fee: string;
};

const missingWords: Record<Step, string> = { needs: "needs", waiver: "waiver", fee: "fee" };

/** Who comes, with what is missing first; each row makes sense read alone. */
export function PeopleTable({ people }: { people: Person[] }) {
  const live = people.filter((person) => person.state !== "withdrawn");
  if (live.length === 0) return <p className="mt-3">Nobody is registered yet.</p>;
  return (
    <DataTable
      caption={counted(live.length, "person", "people")}
      columns={["Name", "State", "Missing", "Gets around", "Guide", "Support", "Guardian", "This time"]}
      rows={live.map((person) => ({
        key: person.id,
        name: `${person.number === null ? "" : `${person.number}. `}${person.nameUsed}, ${person.age}`,
        cells: [
          stateInWords(person),
          person.missing.length === 0 ? "nothing" : person.missing.map((step) => missingWords[step]).join(", "),
          ...needsInWords(person.profile),
          person.guardianStays ?? "not told yet",
          person.thisTime || "nothing different",
        ],
      }))}
    />
  );
}

function needsInWords(profile: AccessProfile | null): string[] {
  if (!profile) return ["not told yet", "not told yet", "not told yet"];
  const chair = profile.chair ? `, ${profile.chair}` : "";
  return [
    `${profile.travel.join(", ")}${chair}`,
    guideNeedOf(profile) === "not-needed" ? "not needed" : `${profile.guideWhen.join(", ")}; ${profile.guideSide} arm, ${profile.guideHold}`,
    supportInWords[profile.support],
  ];
}

function stateInWords(person: Person): string {
  if (person.state === "waiting") return `waiting, number ${person.placeInQueue ?? 1}`;
  if (person.state === "confirmed") return `confirmed, ${person.fee}`;
  return person.state === "held" ? "seat held" : person.state;
}
