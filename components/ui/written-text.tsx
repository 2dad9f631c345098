/** Text that somebody wrote with lines of its own. Numbered lines become a real list, the rest paragraphs. */
export function WrittenText({ text }: { text: string }) {
  return (
    <div className="space-y-3">
      {text.split(/\n{2,}/).map((part, index) => (
        <WrittenPart key={index} lines={part.split("\n").map((line) => line.trim()).filter((line) => line !== "")} />
      ))}
    </div>
  );
}

const numbered = /^\d+[.)]\s+/;

function WrittenPart({ lines }: { lines: string[] }) {
  if (lines.length === 0) return null;
  if (lines.length > 1 && lines.every((line) => numbered.test(line))) {
    return (
      <ol className="list-decimal pl-7 space-y-2 marker:font-bold">
        {lines.map((line) => (
          <li key={line}>{line.replace(numbered, "")}</li>
        ))}
      </ol>
    );
  }
  return (
    <p>
      {lines.map((line, index) => (
        <span key={index}>
          {index > 0 && <br />}
          {line}
        </span>
      ))}
    </p>
  );
}
