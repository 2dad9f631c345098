import { z } from "zod";
import { personIdOf } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { mayKeepFamily } from "./family-policy";
import { listOwnParticipants } from "./participant-store";

export const listChildren = defineQuery({
  input: z.object({}),
  load: (conn, actor) => ({ children: listOwnParticipants(conn, personIdOf(actor) ?? "") }),
  allow: (actor) => mayKeepFamily(actor),
  run: ({ found: { children } }) =>
    ok(children.map(({ id, nameUsed, birthDate, profile }) => ({ id, nameUsed, birthDate, hasProfile: profile !== null }))),
});
