import { z } from "zod";
import { findOuting } from "@/lib/outings/outing-store";
import { maySeeRoster } from "@/lib/registrations/registration-policy";
import { isSignedIn } from "@/lib/shared/actor";
import { forbidden, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { findPaper, noteReading } from "./paper-store";
import { findRosterOuting } from "./roster-access";

/** Opens a printed paper. Every reading is noted, so this changes something and is a command. */
export const openPaper = defineCommand({
  input: z.object({ paperId: z.string().min(1).max(60) }),
  load: (conn, actor, { paperId }, now) => {
    const paper = findPaper(conn, paperId);
    const outing = paper && findOuting(conn, { id: paper.outingId }, now);
    const scope = outing && findRosterOuting(conn, actor, outing.slug, now);
    return paper && scope ? { paper, ...scope } : null;
  },
  allow: (actor, { access }) => maySeeRoster(actor, access, access.now),
  run: ({ conn, now, actor, found: { paper, outing } }) => {
    if (!isSignedIn(actor)) return forbidden();
    noteReading(conn, now, { personId: actor.personId, what: `opened roster version ${paper.version}`, aboutId: outing.id });
    return ok({ slug: outing.slug, form: paper.form, textSizePt: paper.textSizePt, facts: paper.facts });
  },
});
