import { z } from "zod";
import { checkCover } from "@/lib/cover/check-cover";
import { findOuting } from "@/lib/outings/outing-store";
import { isStaff } from "@/lib/shared/actor";
import { invalid, ok } from "@/lib/shared/outcome";
import { defineCommand } from "@/lib/shared/use-case";
import { gatherCover } from "./gather-cover";
import { setPairing } from "./pairing-store";

const pairSchema = z.object({
  slug: z.string().min(1).max(80),
  /** One entry a person: the adult's id, or "" for nobody yet. */
  pair: z.record(z.string(), z.string()).default({}),
});

/** Keeps who goes with whom, and answers with the verdict on it. */
export const pairPeople = defineCommand({
  input: pairSchema,
  load: (conn, _actor, input, now) => {
    const outing = findOuting(conn, { slug: input.slug }, now);
    return outing && { outing, gathered: gatherCover(conn, outing, now) };
  },
  allow: (actor) => isStaff(actor),
  run: ({ conn, now, input, found: { outing, gathered } }) => {
    const coming = new Set(gathered.input.adults.filter((adult) => adult.answer === "yes").map((adult) => adult.id));
    for (const person of gathered.input.people) {
      const adultId = input.pair[person.id];
      if (adultId === undefined) continue;
      if (adultId !== "" && !coming.has(adultId)) {
        return invalid({ [`pair.${person.id}`]: `The adult chosen for ${person.name} is not coming any more. Choose another.` });
      }
      setPairing(conn, person.id, adultId === "" ? null : adultId);
    }
    return ok({ sentence: checkCover(gatherCover(conn, outing, now).input).sentence });
  },
});
