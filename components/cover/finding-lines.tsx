import { StateMark, type StateKind } from "@/components/ui/state-mark";
import { coverQuestions, type CoverQuestion, type Finding } from "@/lib/cover/cover";

const names: Record<CoverQuestion, string> = {
  supervision: "Supervision by age",
  support: "Support levels",
  guides: "Guides and chairs",
  roles: "Roles",
  "two-adults": "Two unrelated adults",
  cancellation: "If one adult cancels",
};

const marks: Record<Finding["severity"], { kind: StateKind; word: string; look: string }> = {
  met: { kind: "good", word: "Met.", look: "good" },
  warns: { kind: "you", word: "Look at this.", look: "you" },
  stops: { kind: "stop", word: "Short.", look: "stop" },
};

/** Each question with its findings: the rule, what is needed, what there is, how many short, one thing to do. */
export function FindingLines({ findings }: { findings: readonly Finding[] }) {
  return (
    <ul className="lines">
      {coverQuestions.flatMap((question) =>
        findings
          .filter((finding) => finding.question === question)
          .map((finding, index) => (
            <li key={`${question}-${index}`} className="mark-row">
              <StateMark kind={marks[finding.severity].kind} />
              <div>
                <h3 className="text-[1.05rem]">{names[question]}</h3>
                <p>
                  <span className={`word ${marks[finding.severity].look}`}>{marks[finding.severity].word}</span> {finding.sentence}
                </p>
                {finding.action && (
                  <p>
                    <strong>Do this:</strong> {finding.action}
                  </p>
                )}
                <p className="text-quiet">Source: {finding.source}</p>
              </div>
              <p className="mid:text-right text-quiet">
                {finding.short > 0 ? <strong className="text-ink">short by {finding.short}</strong> : null}
                <span className="block">
                  needed {finding.needed}, have {finding.have}
                </span>
              </p>
            </li>
          )),
      )}
    </ul>
  );
}
