import { randomBytes } from "node:crypto";
import type { AccessProfile } from "@/lib/families/access-profile";
import { addChild } from "@/lib/families/add-child";
import { answerRequest } from "@/lib/helpers/answer-request";
import { askToHelp } from "@/lib/helpers/ask-to-help";
import { changeAbilities } from "@/lib/helpers/change-abilities";
import { changeClearance } from "@/lib/helpers/change-clearance";
import { listAnswersBy } from "@/lib/helpers/helper-store";
import { planOuting } from "@/lib/outings/plan-outing";
import { publishOuting } from "@/lib/outings/publish-outing";
import { showOutingForm } from "@/lib/outings/show-outing-form";
import { chooseFee } from "@/lib/payments/choose-fee";
import { confirmNeeds } from "@/lib/registrations/confirm-needs";
import { registerChild } from "@/lib/registrations/register-child";
import type { SignedIn } from "@/lib/shared/actor";
import { dayOf } from "@/lib/shared/dates";
import type { Outcome } from "@/lib/shared/outcome";
import { showWaiver } from "@/lib/waivers/show-waiver";
import { signWaiver } from "@/lib/waivers/sign-waiver";
import { contextOf, demoPerson, somebody } from "./people";
import { place, type Ground } from "./place";

/** What a test needs to be there before it begins, made by the commands its people would use. */

export const zone = "America/Los_Angeles";

/** The day so many days from today at the site, as people type it. */
export function dayAhead(days: number): string {
  return dayOf(new Date(Date.now() + days * 86_400_000).toISOString(), zone);
}

/** A date of birth that makes somebody this old, today and for half a year. */
export function bornYearsAgo(age: number): string {
  const [year = "", ...rest] = dayAhead(-1).split("-");
  return [Number(year) - age, ...rest].join("-").replace("-02-29", "-02-28");
}

export type OutingMade = { slug: string; title: string; day: string };

type OutingChanges = { title?: string; seats?: number; day?: string; suggestedFee?: string; isDraft?: boolean; meetingText?: string };

export async function plannedOuting(changes: OutingChanges = {}, ground: Ground = place()): Promise<OutingMade> {
  const as = contextOf(demoPerson("coordinator", ground), ground);
  const { sites, policies } = must(await showOutingForm(as, {}));
  const title = `${changes.title ?? "Waves at Heron Spit"} ${randomBytes(3).toString("hex")}`;
  const day = changes.day ?? dayAhead(60);
  const { slug } = must(
    await planOuting(as, {
      title,
      theme: "Waves that build and break",
      summary: "A slow morning by the water.",
      siteId: sites.find((site) => site.name === "Heron Spit")?.id ?? "",
      day,
      startTime: "09:00",
      endTime: "12:00",
      seats: String(changes.seats ?? 6),
      youngestAge: "8",
      oldestAge: "14",
      suggestedFee: changes.suggestedFee ?? "12",
      policyId: policies[0]?.id ?? "",
      meetingText: changes.meetingText ?? "1. Face the pump house. 2. Follow the rail for 40 steps to the bench.",
      requestId: randomBytes(9).toString("hex"),
    }),
  );
  if (!changes.isDraft) must(await publishOuting(as, { slug }));
  return { slug, title, day };
}

export type FamilyMade = { guardian: SignedIn; participantId: string; nameUsed: string };

export async function family(child: { nameUsed?: string; legalName?: string; age?: number } = {}, ground: Ground = place()): Promise<FamilyMade> {
  const guardian = somebody("Runa Aske", "guardian", ground);
  return { guardian, ...(await childOf(guardian, child, ground)) };
}

export async function childOf(guardian: SignedIn, { nameUsed = "Sol", legalName = "Solveig Aske", age = 11 } = {}, ground: Ground = place()) {
  const requestId = randomBytes(9).toString("hex");
  const { participantId } = must(await addChild(contextOf(guardian, ground), { nameUsed, legalName, birthDate: bornYearsAgo(age), requestId }));
  return { participantId, nameUsed };
}

export const profile: AccessProfile = {
  travel: ["long cane"],
  chair: null,
  transfer: null,
  restAfter: "40",
  guideWhen: ["uneven ground"],
  guideSide: "left",
  guideHold: "above the elbow",
  support: "occasional",
  reading: "large print",
  leaderNote: "shade every 20 minutes",
  photo: "yes",
  voice: "yes",
  contacts: [{ name: "Runa Aske", relationship: "mother", phone: "360 555 0177" }],
  pickUp: [{ name: "Runa Aske", relationship: "mother" }],
};

type Until = "held" | "needs told" | "signed" | "confirmed";

/** A registration as far as a test wants it; "confirmed" takes a no-fee place. */
export async function registered(given: FamilyMade, { slug }: OutingMade, until: Until, ground: Ground = place()): Promise<string> {
  const as = () => contextOf(given.guardian, ground);
  const { registrationId } = must(await registerChild(as(), { slug, participantId: given.participantId }));
  if (until === "held") return registrationId;
  must(await confirmNeeds(as(), { registrationId, guardianStays: "drops off", ...profile }));
  if (until === "needs told") return registrationId;
  const text = must(await showWaiver(as(), {}));
  must(await signWaiver(as(), { registrationId, textSha256: text.sha256, typedName: given.guardian.name, typedDate: dayAhead(0), agree: "yes" }));
  if (until === "signed") return registrationId;
  must(await chooseFee(as(), { registrationId, choice: "no fee" }));
  return registrationId;
}

type HelperChanges = { task?: "chaperone" | "leader"; answer?: "yes" | "maybe" | "no"; name?: string };

/** A cleared adult who guides on either side and knows first aid, asked to an outing. */
export async function helper({ slug }: OutingMade, { task = "chaperone", answer, name = "Tor Haugen" }: HelperChanges = {}): Promise<SignedIn> {
  const who = somebody(name, task);
  const staff = contextOf(demoPerson("coordinator"));
  must(await changeAbilities(contextOf(who), { isAdult: "yes", guidesLeft: "yes", guidesRight: "yes", firstAid: "yes" }));
  must(await changeClearance(staff, { personId: who.personId, clearedUntil: dayAhead(300) }));
  must(await askToHelp(staff, { slug, personIds: [who.personId], task }));
  const [request] = listAnswersBy(staff.conn, who.personId);
  if (answer) must(await answerRequest(contextOf(who), { answerId: request?.id ?? "", answer }));
  return who;
}

export function must<Value>(outcome: Outcome<Value>): Value {
  if (outcome.ok) return outcome.value;
  throw new Error(`refused while preparing: ${JSON.stringify(outcome.refusal)}`);
}
