import type { Connection } from "@/db/connection";
import { gatherCover, type Coming } from "@/lib/cover-board/gather-cover";
import { checkCover } from "@/lib/cover/check-cover";
import type { CoverAdult } from "@/lib/cover/cover";
import { guideNeedOf } from "@/lib/families/access-profile";
import type { Outing } from "@/lib/outings/outing";
import { dayInWords, hoursInWords, momentInWords } from "@/lib/shared/dates";
import { env } from "@/lib/shared/env";
import { mayBeOnPaper } from "./never-on-paper";
import type { RosterAdult, RosterFacts, RosterPerson, TravelCode } from "./roster-facts";

const countPoints = ["Arrive", "Leave", "Midway", "Back"];

/** The roster of an outing as it stands now: the same facts for every form. The version is set by who prints it. */
export function gatherRoster(conn: Connection, outing: Outing, now: string): RosterFacts {
  const { input, coming } = gatherCover(conn, outing, now);
  const zone = outing.site.zone;
  const standings = checkCover(input).adults;
  // Who does not count for anything, such as somebody whose clearance lapsed, is not named as anybody's adult.
  const mayBeWithPeople = (id: string) => standings.some((one) => one.adultId === id && one.standing !== "does-not-count");
  return {
    programme: env().PROGRAMME_NAME,
    outingTitle: outing.title,
    siteName: outing.site.name,
    dateInWords: dayInWords(outing.startsAt, zone),
    timesInWords: hoursInWords(outing.startsAt, outing.endsAt, zone),
    meetingPoint: outing.site.meetingPoint,
    version: 0,
    printedAtInWords: momentInWords(now, zone),
    printedAt: now,
    basePhone: env().PROGRAMME_PHONE,
    people: coming.map((one) => personFrom(one, input.pairings.find((pair) => pair.personId === one.registration.id)?.adultId ?? null)),
    adults: input.adults.filter((adult) => mayBeWithPeople(adult.id)).map(adultFrom),
    countPoints,
  };
}

function personFrom({ registration, profile }: Coming, adultId: string | null): RosterPerson {
  if (registration.seatNumber === null) throw new Error(`registration ${registration.id} is confirmed without a seat`);
  const travel: TravelCode[] = [];
  const guide = guideNeedOf(profile);
  if (guide !== "not-needed") travel.push("guide");
  if (profile.travel.includes("long cane")) travel.push("cane");
  if (profile.travel.includes("dog guide")) travel.push("dog");
  if (profile.chair !== null) travel.push("wheels");
  const notes: string[] = [];
  if (guide !== "not-needed") notes.push(guideNote(guide, profile));
  if (profile.chair === "pushed") notes.push("push the chair");
  if (profile.restAfter !== "not sure" && profile.restAfter !== "60") notes.push(`sit down every ${profile.restAfter} min`);
  if (profile.travel.includes("walker")) notes.push("uses a walker");
  if (profile.leaderNote !== "") notes.push(noteForPaper(profile.leaderNote));
  return {
    number: registration.seatNumber,
    nameUsed: registration.participant.nameUsed,
    adultId,
    travel,
    supportLevel: profile.support,
    actionNotes: notes,
    cardNumber: null,
    photo: profile.photo === "yes" ? "ok" : "no",
    voice: profile.voice === "yes" ? "ok" : "no",
    // Everybody is handed over against the list; the mark is for a hand-over that needs the base first.
    checkIdList: false,
  };
}

/** One family's wording never holds up everybody's roster: what may not be printed is asked about instead. */
function noteForPaper(note: string): string {
  return mayBeOnPaper(note) ? note.replace(/[.;]+$/, "") : "ask the coordinator";
}

/** Short, for a narrow column: when, the guide's arm, and the hold where it is not the common one above the elbow. */
function guideNote(guide: "throughout" | "at-times", profile: Coming["profile"]): string {
  if (profile.guideHold === "spoken directions only") return "spoken directions only";
  const times = profile.guideWhen.filter((one) => one !== "not needed" && one !== "not sure");
  const when = guide === "throughout" ? "guide all the time" : times.length === 0 ? "ask about a guide" : `guide: ${times.join(", ")}`;
  const arm = profile.guideSide === "either" ? "either arm" : `${profile.guideSide} arm`;
  return profile.guideHold === "above the elbow" ? `${when}, ${arm}` : `${when}, ${arm}, ${profile.guideHold}`;
}

function adultFrom(adult: CoverAdult): RosterAdult {
  const can: string[] = [];
  const { guideSides, firstAid, pushChair } = adult.capabilities;
  if (guideSides.length === 2) can.push("guides either side");
  else if (guideSides[0]) can.push(`guides, ${guideSides[0]} arm`);
  if (pushChair) can.push("pushes a chair");
  if (firstAid) can.push("first aid");
  return { id: adult.id, name: adult.name, role: adult.role, can };
}
