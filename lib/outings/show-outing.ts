import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { isPublic } from "./outing";
import { maySeeOuting } from "./outing-policy";
import { slugSchema } from "./outing-schema";
import { findOuting } from "./outing-store";
import { outingView } from "./outing-view";
import { isStaff } from "@/lib/shared/actor";

export const showOuting = defineQuery({
  input: slugSchema,
  load: (conn, actor, { slug }, now) => {
    const outing = findOuting(conn, { slug }, now);
    return outing && (isPublic(outing) || isStaff(actor)) ? outing : null;
  },
  allow: (actor, outing) => maySeeOuting(actor, outing),
  run: ({ found: outing, now }) => ok(outingView(outing, now)),
});
