import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { findMailLink } from "./mail-link-store";
import { secretSchema } from "./person-schema";
import { findPerson } from "./person-store";

/** What a link in a mail is for, before anything is done with it: reading it spends nothing. */
export const showMailLink = defineQuery({
  input: secretSchema,
  load: (conn, _actor, input, now) => {
    const link = findMailLink(conn, input.secret, now);
    const person = link && findPerson(conn, link.personId);
    return link && person ? { link, person } : null;
  },
  allow: () => true,
  run: ({ found: { link, person } }) =>
    ok({ purpose: link.purpose, state: link.state, name: person.name, email: person.email, hasPassword: person.hasPassword }),
});
