import type { ReactNode } from "react";
import type { Draft, LetterPart } from "./letter-parts";

const ink = "#10222b";
const paper = "#fbfaf5";
const marsh = "#0b5446";

/** Simple HTML that every mail program reads in order: no pictures of text, no tables for layout. */
export function LetterPage({ draft, signature }: { draft: Draft; signature: string }) {
  return (
    <html lang="en">
      <head>
        <meta charSet="utf-8" />
        <title>{draft.subject}</title>
      </head>
      <body style={{ margin: 0, backgroundColor: paper, color: ink, fontFamily: "Verdana, Arial, sans-serif", fontSize: 18, lineHeight: 1.6 }}>
        <div style={{ maxWidth: "36em", margin: "0 auto", padding: 24, borderTop: `6px solid ${marsh}` }}>
          {draft.parts.map((part, index) => (
            <Part key={index} part={part} />
          ))}
          <p style={{ borderTop: `2px solid ${ink}`, paddingTop: 16, marginTop: 32 }}>{lines(signature)}</p>
        </div>
      </body>
    </html>
  );
}

function Part({ part }: { part: LetterPart }) {
  switch (part.kind) {
    case "heading":
      return <h2 style={{ fontSize: 22, margin: "28px 0 8px" }}>{part.text}</h2>;
    case "paragraph":
      return <p style={{ margin: "12px 0" }}>{part.text}</p>;
    case "written":
      return <p style={{ margin: "12px 0" }}>{lines(part.text)}</p>;
    case "facts":
      return (
        <p style={{ margin: "12px 0" }}>
          {part.rows.map(([label, value], index) => (
            <span key={label}>
              {index > 0 && <br />}
              <strong>{label}:</strong> {value}
            </span>
          ))}
        </p>
      );
    case "link":
      return (
        <p style={{ margin: "20px 0" }}>
          <a href={part.href} style={{ color: marsh, fontWeight: "bold" }}>
            {part.text}
          </a>
        </p>
      );
  }
}

function lines(text: string): ReactNode[] {
  return text.split("\n").flatMap((line, index) => (index === 0 ? [line] : [<br key={index} />, line]));
}
