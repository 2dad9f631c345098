import { z } from "zod";
import { isStaff } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { countUnsent, listDeliveries as listRows } from "./message-store";

export const listDeliveries = defineQuery({
  input: z.object({ outingId: z.string().optional(), unsentOnly: z.boolean().optional() }),
  load: (conn, _actor, input) => ({
    deliveries: listRows(conn, {
      ...(input.outingId === undefined ? {} : { outingId: input.outingId }),
      unsentOnly: input.unsentOnly ?? false,
    }),
    unsent: countUnsent(conn),
  }),
  allow: (actor) => isStaff(actor),
  run: ({ found }) => ok(found),
});
