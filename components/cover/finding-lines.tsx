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

const worstFirst = ["stops", "warns", "met"] as const;

/** The six questions, each with its worst answer as its mark, and under it what was found. */
export function FindingLines({ findings }: { findings: readonly Finding[] }) {
  return (
    <ul className="lines">
      {coverQuestions.map((question) => {
        const own = findings.filter((finding) => finding.question === question);
        const worst = worstFirst.find((severity) => own.some((finding) => finding.severity === severity)) ?? "met";
        return (
          <li key={question} className="mark-row">
            <StateMark kind={marks[worst].kind} />
            <div>
              <h3 className="text-[1.1rem]">
                {names[question]}: <span className={`word ${marks[worst].look}`}>{marks[worst].word}</span>
              </h3>
              {own.length === 0 && <p>Nothing to judge yet.</p>}
              {worstFirst.flatMap((severity) => own.filter((finding) => finding.severity === severity)).map((finding) => (
                <FoundThis key={`${finding.rule}-${finding.sentence}`} finding={finding} isOneOfMany={own.length > 1} />
              ))}
              <Sources findings={own} />
            </div>
          </li>
        );
      })}
    </ul>
  );
}

function FoundThis({ finding, isOneOfMany }: { finding: Finding; isOneOfMany: boolean }) {
  const mark = marks[finding.severity];
  return (
    <div className="mt-2">
      <p>
        {isOneOfMany && <strong>{mark.word} </strong>}
        {finding.sentence}{" "}
        <span className="text-quiet">
          (needed {finding.needed}, have {finding.have}
          {finding.short > 0 ? `, short by ${finding.short}` : ""})
        </span>
      </p>
      {finding.action && (
        <p>
          <strong>Do this:</strong> {finding.action}
        </p>
      )}
    </div>
  );
}

function Sources({ findings }: { findings: Finding[] }) {
  const sources = [...new Set(findings.map((finding) => finding.source))];
  if (sources.length === 0) return null;
  return (
    <details>
      <summary className="text-quiet font-normal!">Where the figures come from</summary>
      <ul className="list-disc pl-6">
        {sources.map((source) => (
          <li key={source}>{source}</li>
        ))}
      </ul>
    </details>
  );
}
