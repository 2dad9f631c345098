import { supportInWords, type AccessProfile } from "@/lib/families/access-profile";
import type { Step } from "@/lib/registrations/registration";

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
    <div className="scroll-x mt-3" role="region" aria-label="People of this outing" tabIndex={0}>
      <table>
        <caption className="sr-only">People of this outing</caption>
        <thead>
          <tr>
            <th scope="col">Name</th>
            <th scope="col">State</th>
            <th scope="col">Missing</th>
            <th scope="col">Gets around</th>
            <th scope="col">Guide</th>
            <th scope="col">Support</th>
            <th scope="col">This time</th>
          </tr>
        </thead>
        <tbody>
          {live.map((person) => (
            <tr key={person.id}>
              <th scope="row">
                {person.number === null ? "" : `${person.number}. `}
                {person.nameUsed}, {person.age}
              </th>
              <td>{stateInWords(person)}</td>
              <td>{person.missing.length === 0 ? "Nothing" : person.missing.map((step) => missingWords[step]).join(", ")}</td>
              <td>{person.profile ? `${person.profile.travel.join(", ")}${person.profile.chair ? `, ${person.profile.chair}` : ""}` : "Not told yet"}</td>
              <td>{person.profile ? `${person.profile.guideWhen.join(", ")}; ${person.profile.guideSide} arm, ${person.profile.guideHold}` : "Not told yet"}</td>
              <td>{person.profile ? supportInWords[person.profile.support] : "Not told yet"}</td>
              <td>{person.thisTime || "Nothing different"}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function stateInWords(person: Person): string {
  if (person.state === "waiting") return `waiting, number ${person.placeInQueue ?? 1}`;
  if (person.state === "confirmed") return `confirmed, ${person.fee}`;
  return person.state === "held" ? "seat held" : person.state;
}
