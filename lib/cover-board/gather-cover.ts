import type { Connection } from "@/db/connection";
import type { CoverAdult, CoverInput, CoverPerson } from "@/lib/cover/cover";
import { coverPolicySchema, type CoverPolicy } from "@/lib/cover/cover-policy";
import { guideNeedOf, type AccessProfile } from "@/lib/families/access-profile";
import { findHouseholdOf } from "@/lib/families/household-store";
import { findProfile } from "@/lib/families/participant-store";
import { isClearedOn, type HelperAnswer, type HelperRecord } from "@/lib/helpers/helper";
import { findHelperRecord, listAnswersOf } from "@/lib/helpers/helper-store";
import { outingDay, type Outing } from "@/lib/outings/outing";
import { findPolicy } from "@/lib/outings/outing-store";
import { findPerson } from "@/lib/people/person-store";
import { listRegistrationsOf, type Registration } from "@/lib/registrations/registration-store";
import { ageOn } from "@/lib/shared/dates";
import { listPairings } from "./pairing-store";

export type Coming = { registration: Registration; profile: AccessProfile };
export type GatheredCover = { input: CoverInput; coming: Coming[]; answers: HelperAnswer[] };

/** Everything the cover engine asks for, from what families, helpers and the policy say. */
export function gatherCover(conn: Connection, outing: Outing, now: string): GatheredCover {
  const coming = listRegistrationsOf(conn, outing.id, ["confirmed"], now).flatMap((registration) => {
    const profile = registration.profileId ? findProfile(conn, registration.profileId) : null;
    return profile ? [{ registration, profile }] : [];
  });
  const answers = listAnswersOf(conn, outing.id);
  const input: CoverInput = {
    date: outingDay(outing),
    people: coming.map((one) => personFrom(one, outing)),
    adults: [...answers.map((one) => helperFrom(conn, one, coming)), ...stayingGuardians(conn, coming, answers, outing)],
    pairings: listPairings(conn, outing.id).map((pair) => ({ personId: pair.registration_id, adultId: pair.person_id })),
    policy: policyOf(conn, outing),
  };
  return { input, coming, answers };
}

function policyOf(conn: Connection, outing: Outing): CoverPolicy {
  const stored = findPolicy(conn, outing.policyId);
  if (!stored) throw new Error(`outing ${outing.id} has no policy`);
  return coverPolicySchema.parse(JSON.parse(stored.body));
}

function personFrom({ registration, profile }: Coming, outing: Outing): CoverPerson {
  return {
    id: registration.id,
    name: registration.participant.nameUsed,
    ageYears: ageOn(registration.participant.birthDate, outingDay(outing)),
    supportLevel: profile.support,
    guide: guideNeedOf(profile),
    guideSide: profile.guideSide,
    wheels: profile.chair === null ? "none" : profile.chair === "by hand, alone" ? "self" : profile.chair,
    guardianStaysId: registration.guardianStays === "drops off" ? null : registration.registeredBy,
  };
}

function helperFrom(conn: Connection, answer: HelperAnswer, coming: Coming[]): CoverAdult {
  return {
    id: answer.personId,
    name: answer.name,
    isAdult: answer.record?.isAdult ?? false,
    answer: answer.state,
    clearedUntil: answer.record?.clearedUntil ?? null,
    familyId: findHouseholdOf(conn, answer.personId),
    guardianOf: childrenOf(answer.personId, coming),
    role: answer.task,
    capabilities: capabilitiesOf(answer.record),
  };
}

/** Guardians who stay come along too; uncleared they count for their own child only. */
function stayingGuardians(conn: Connection, coming: Coming[], answers: HelperAnswer[], outing: Outing): CoverAdult[] {
  const staying = coming.filter((one) => one.registration.guardianStays !== "drops off").map((one) => one.registration.registeredBy);
  const notHelpers = [...new Set(staying)].filter((id) => !answers.some((answer) => answer.personId === id));
  return notHelpers.flatMap((personId) => {
    const person = findPerson(conn, personId);
    if (!person) return [];
    const record = findHelperRecord(conn, personId);
    const isCleared = isClearedOn(record, outingDay(outing));
    return [{
      id: personId,
      name: person.name,
      // Whoever signs for a child as the legal guardian is taken to be of age; a clearance is another matter.
      isAdult: true,
      answer: "yes" as const,
      clearedUntil: isCleared ? (record?.clearedUntil ?? null) : null,
      familyId: findHouseholdOf(conn, personId),
      guardianOf: childrenOf(personId, coming),
      role: "guardian" as const,
      capabilities: capabilitiesOf(record),
    }];
  });
}

function childrenOf(personId: string, coming: Coming[]): string[] {
  return coming.filter((one) => one.registration.participant.guardianIds.includes(personId)).map((one) => one.registration.id);
}

function capabilitiesOf(record: HelperRecord | null): CoverAdult["capabilities"] {
  const guideSides: ("left" | "right")[] = [];
  if (record?.guidesLeft) guideSides.push("left");
  if (record?.guidesRight) guideSides.push("right");
  return {
    guideSides,
    pushChair: record?.pushesChair ?? false,
    firstAid: record?.firstAid ?? false,
    drive: record?.drives ?? false,
  };
}
