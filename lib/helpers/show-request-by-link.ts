import { findOuting } from "@/lib/outings/outing-store";
import { outingView } from "@/lib/outings/outing-view";
import { findMailLink } from "@/lib/people/mail-link-store";
import { secretSchema } from "@/lib/people/person-schema";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { findAnswer } from "./helper-store";

export const showRequestByLink = defineQuery({
  input: secretSchema,
  load: (conn, _actor, input, now) => {
    const link = findMailLink(conn, input.secret, now);
    const asked = link?.purpose === "answer" && link.aboutId ? findAnswer(conn, link.aboutId) : null;
    const outing = asked && findOuting(conn, { id: asked.outingId }, now);
    return link && asked && outing ? { link, asked, outing } : null;
  },
  allow: (_actor, { link, asked }) => link.personId === asked.personId,
  run: ({ found: { asked, outing, link }, now }) =>
    ok({ name: asked.name, task: asked.task, state: asked.state, late: link.state === "late", outing: outingView(outing, now) }),
});
