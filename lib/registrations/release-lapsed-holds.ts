import { z } from "zod";
import { findOuting } from "@/lib/outings/outing-store";
import { isSystem } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { listOutingsToSettle } from "./seat-store";
import { settleSeats } from "./settle-seats";

/** The clock's round: holds that ran out are given up and free seats are offered on, even if nobody opens a page. */
export const releaseLapsedHolds = defineCommand({
  input: z.object({}),
  load: (conn, _actor, _input, now) => ({ outingIds: listOutingsToSettle(conn, now) }),
  allow: (actor) => isSystem(actor, "clock"),
  run: ({ conn, now, found: { outingIds } }) => {
    for (const id of outingIds) {
      const outing = findOuting(conn, { id }, now);
      if (outing) settleSeats(conn, now, outing);
    }
    return ok({ outings: outingIds.length });
  },
});
