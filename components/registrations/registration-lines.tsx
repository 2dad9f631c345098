import Link from "next/link";
import { StateMark, type StateKind } from "@/components/ui/state-mark";
import type { RegistrationView } from "@/lib/registrations/registration-view";
import { pathTo } from "@/lib/web/paths";

const marks: Record<RegistrationView["state"], { kind: StateKind; word: string; look: string }> = {
  confirmed: { kind: "good", word: "Confirmed.", look: "good" },
  held: { kind: "you", word: "Needs you.", look: "you" },
  waiting: { kind: "wait", word: "Waiting.", look: "" },
  withdrawn: { kind: "off", word: "Withdrawn.", look: "" },
  "turned away": { kind: "off", word: "Not taken.", look: "" },
};

export function RegistrationLines({ registrations }: { registrations: RegistrationView[] }) {
  return (
    <ul className="lines">
      {registrations.map((one) => {
        const mark = marks[one.state];
        return (
          <li key={one.id} className="mark-row">
            <StateMark kind={mark.kind} />
            <div>
              <Link href={pathTo.registration(one.id)} className="font-bold text-[1.15rem]">
                {one.child.nameUsed}: {one.outing.title}
              </Link>
              <p>
                {one.outing.whenAndWhere}
              </p>
              <p>
                <span className={`word ${mark.look}`}>{mark.word}</span> {one.stateInWords}
              </p>
            </div>
          </li>
        );
      })}
    </ul>
  );
}
