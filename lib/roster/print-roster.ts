import { z } from "zod";
import { maySeeRoster } from "@/lib/registrations/registration-policy";
import { isSignedIn } from "@/lib/shared/actor";
import { conflict, forbidden, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { gatherRoster } from "./gather-roster";
import { checkNeverOnPaper } from "./never-on-paper";
import { largeSizePt, largestSizePt, paperForms, standardSizePt } from "./paper";
import { insertPaper, noteReading, rosterHash, versionOf } from "./paper-store";
import { findRosterOuting } from "./roster-access";
import { rosterSheet } from "./roster-sheet";

const printRosterSchema = z
  .object({
    slug: z.string().min(1).max(80),
    form: z.enum(paperForms, "Choose standard or large print."),
    textSizePt: z.coerce.number("Enter a size in points.").int("Enter a whole number of points.").optional(),
  })
  .transform(({ textSizePt, ...rest }) => ({
    ...rest,
    textSizePt: rest.form === "standard" ? standardSizePt : Math.min(largestSizePt, Math.max(largeSizePt, textSizePt ?? largeSizePt)),
  }));

/**
 * Makes the roster as a paper with a version. Nothing changed since the last print: the same version again.
 * Refuses, naming the place, when something that must never be on paper has got into the facts.
 */
export const printRoster = defineCommand({
  input: printRosterSchema,
  load: (conn, actor, input, now) => findRosterOuting(conn, actor, input.slug, now),
  allow: (actor, { access }) => maySeeRoster(actor, access, access.now),
  run: ({ conn, now, actor, input, found: { outing } }) => {
    if (!isSignedIn(actor)) return forbidden();
    const gathered = gatherRoster(conn, outing, now);
    const facts = { ...gathered, version: versionOf(conn, outing.id, rosterHash(gathered)) };
    const [problem] = checkNeverOnPaper(rosterSheet(facts, "table"), knownTexts(facts));
    if (problem) return conflict("never-on-paper", problem.sentence);
    const paperId = insertPaper(conn, { outingId: outing.id, form: input.form, textSizePt: input.textSizePt, facts, printedBy: actor.personId });
    noteReading(conn, now, { personId: actor.personId, what: "printed the roster", aboutId: outing.id });
    return ok({ paperId, slug: outing.slug, version: facts.version });
  },
});

/** What may look like something that must never be on paper and is not: the programme's phone, place and title, and people's names. */
function knownTexts(facts: ReturnType<typeof gatherRoster>): string[] {
  const names = [...facts.people.map((person) => person.nameUsed), ...facts.adults.map((adult) => adult.name)];
  return [...names, facts.basePhone, facts.meetingPoint, facts.outingTitle, facts.siteName, facts.programme, facts.dateInWords, facts.printedAtInWords];
}
