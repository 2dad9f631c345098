import type { Connection } from "@/db/connection";
import { listAnswersOf } from "@/lib/helpers/helper-store";
import { findOuting } from "@/lib/outings/outing-store";
import { hasRole, isStaff, type Actor } from "@/lib/shared/actor";

/** Where a roster is asked for: staff, or a leader of this day until three days after it. */
export function findRosterOuting(conn: Connection, actor: Actor, slug: string, now: string) {
  const outing = findOuting(conn, { slug }, now);
  if (!outing) return null;
  const leaderIds = listAnswersOf(conn, outing.id).filter((one) => one.task === "leader" && one.state === "yes").map((one) => one.personId);
  const inScope = isStaff(actor) || (hasRole(actor, "leader") && leaderIds.includes(actor.personId));
  return inScope ? { outing, access: { leaderIds, endsAt: outing.endsAt, now } } : null;
}
