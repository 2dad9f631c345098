import { slugSchema } from "@/lib/outings/outing-schema";
import { outingView } from "@/lib/outings/outing-view";
import { maySeeRoster } from "@/lib/registrations/registration-policy";
import { findPerson } from "@/lib/people/person-store";
import { momentInWords } from "@/lib/shared/dates";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { gatherRoster } from "./gather-roster";
import { listPapersOf, rosterHash } from "./paper-store";
import { findRosterOuting } from "./roster-access";

/** The papers of an outing, newest first, and whether the newest still says what is true. */
export const listPapers = defineQuery({
  input: slugSchema,
  load: (conn, actor, { slug }, now) => {
    const scope = findRosterOuting(conn, actor, slug, now);
    if (!scope) return null;
    const papers = listPapersOf(conn, scope.outing.id).map((paper) => ({ paper, by: findPerson(conn, paper.printedBy)?.name ?? "somebody" }));
    return { ...scope, papers, facts: gatherRoster(conn, scope.outing, now) };
  },
  allow: (actor, { access }) => maySeeRoster(actor, access, access.now),
  run: ({ found: { outing, papers, facts }, now }) =>
    ok({
      outing: outingView(outing, now),
      facts,
      isCurrent: papers[0]?.paper.factsSha256 === rosterHash(facts),
      papers: papers.map(({ paper, by }) => ({
        id: paper.id,
        form: paper.form,
        textSizePt: paper.textSizePt,
        version: paper.version,
        printedAt: momentInWords(paper.printedAt, outing.site.zone),
        by,
      })),
    }),
});
