import { z } from "zod";
import { isStaff } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { listMoneyToReturn as listRows } from "./payment-store";

export const listMoneyToReturn = defineQuery({
  input: z.object({}),
  load: (conn) => ({ rows: listRows(conn) }),
  allow: (actor) => isStaff(actor),
  run: ({ found: { rows } }) => ok(rows),
});
