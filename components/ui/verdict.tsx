import type { ReactNode } from "react";
import { StateMark, type StateKind } from "./state-mark";

/** The answer in a sentence, before the details. */
export function Verdict({ kind, sentence, children, level = 2 }: { kind: StateKind; sentence: string; children?: ReactNode; level?: 2 | 3 }) {
  const Heading = level === 2 ? "h2" : "h3";
  const bar = kind === "good" ? "good" : kind === "stop" ? "stop" : "you";
  return (
    <div className={`slab ${bar} my-6`}>
      <div className="flex items-start gap-3">
        <span className="mt-0.5">
          <StateMark kind={kind} />
        </span>
        <Heading className="text-[1.35rem]">{sentence}</Heading>
      </div>
      {children && <div className="mt-2 space-y-3">{children}</div>}
    </div>
  );
}
