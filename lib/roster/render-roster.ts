import { toPdf } from "@/lib/sheets/to-pdf";
import type { PaperForm } from "./paper";
import type { RosterFacts } from "./roster-facts";
import { rosterSheet } from "./roster-sheet";

/** A printed roster as a tagged PDF. The same paper gives the same bytes each time. */
export function renderRoster(paper: { form: PaperForm; textSizePt: number; facts: RosterFacts }): Promise<Uint8Array> {
  const sheet = rosterSheet(paper.facts, paper.form === "standard" ? "table" : "blocks");
  return toPdf(sheet, { paper: "letter", textSizePt: paper.textSizePt, printedAt: paper.facts.printedAt });
}
