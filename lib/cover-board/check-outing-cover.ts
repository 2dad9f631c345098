import { checkCover } from "@/lib/cover/check-cover";
import { abilitiesInWords } from "@/lib/helpers/helper";
import { slugSchema } from "@/lib/outings/outing-schema";
import { findOuting } from "@/lib/outings/outing-store";
import { isStaff } from "@/lib/shared/actor";
import { ok } from "@/lib/shared/outcome";
import { defineQuery } from "@/lib/shared/use-case";
import { gatherCover } from "./gather-cover";

/** The verdict on an outing's cover, and its adults with their people. */
export const checkOutingCover = defineQuery({
  input: slugSchema,
  load: (conn, _actor, { slug }, now) => {
    const outing = findOuting(conn, { slug }, now);
    return outing && gatherCover(conn, outing, now);
  },
  allow: (actor) => isStaff(actor),
  run: ({ found: { input, coming, answers } }) => {
    const verdict = checkCover(input);
    const people = coming.map(({ registration, profile }) => ({
      id: registration.id,
      number: registration.seatNumber,
      nameUsed: registration.participant.nameUsed,
      adultId: input.pairings.find((pair) => pair.personId === registration.id)?.adultId ?? null,
      support: profile.support,
      guideWhen: profile.guideWhen,
      guideSide: profile.guideSide,
      guide: input.people.find((person) => person.id === registration.id)?.guide ?? "not-needed",
      chair: profile.chair,
    }));
    const adults = input.adults
      .filter((adult) => adult.answer === "yes")
      .map((adult) => ({
        id: adult.id,
        name: adult.name,
        role: adult.role,
        abilities: abilitiesInWords(answers.find((answer) => answer.personId === adult.id)?.record ?? null),
        clearedUntil: adult.clearedUntil,
        counts: verdict.adults.some((one) => one.adultId === adult.id && one.standing !== "does-not-count"),
        standing: verdict.adults.find((one) => one.adultId === adult.id)?.sentence ?? "",
        share: shareOf(people.filter((person) => person.adultId === adult.id).map((person) => person.support), input.policy.supportRatios),
      }));
    return ok({ verdict, people, adults, policy: { name: input.policy.name, version: input.policy.version } });
  },
});

/** How much of one adult the people with them take, in per cent: for the picture, never for the verdict. */
function shareOf(levels: ("constant" | "close" | "occasional" | "minimal")[], ratios: Record<string, { participantsPerAdult: number }>): number[] {
  return levels.map((level) => Math.round(100 / (ratios[level]?.participantsPerAdult ?? 1)));
}
