import { newId } from "@/lib/shared/ids";
import type { Connection } from "@/db/connection";
import { builtInPolicy } from "@/lib/cover/cover-policy";
import type { AccessProfile } from "@/lib/families/access-profile";
import { findHouseholdOf } from "@/lib/families/household-store";
import { insertParticipant, insertProfile } from "@/lib/families/participant-store";
import type { OutingState } from "@/lib/outings/outing";
import { insertOuting, insertPolicy, insertSite } from "@/lib/outings/outing-store";
import type { Actor, SignedIn } from "@/lib/shared/actor";
import { instantAt, minutesLater } from "@/lib/shared/dates";
import type { Outcome, Refusal } from "@/lib/shared/outcome";
import type { UseCase } from "@/lib/shared/use-case";
import { findWaiverInForce, insertWaiverText } from "@/lib/waivers/waiver-store";
import type { WaiverText } from "@/lib/waivers/waiver-text";
import type { z } from "zod";
import { openTestDatabase } from "./database";

/** Monday 4 January 2027, 10 a.m. at Heron Spit. */
export const monday = "2027-01-04T18:00:00.000Z";
export const zone = "America/Los_Angeles";

/** A small club on its own database, with a clock that only the test moves. */
export type World = {
  conn: Connection;
  now: string;
  siteId: string;
  policyId: string;
  waiver: WaiverText;
};

export function makeWorld(conn: Connection = openTestDatabase()): World {
  const siteId = insertSite(conn, {
    slug: "heron-spit",
    name: "Heron Spit",
    landManager: "Saltgrass County Parks",
    zone,
    ground: "Firm sand below the tide line, loose above it.",
    meetingPoint: "the bench under the bell at the east gate",
  });
  const policyId = insertPolicy(conn, monday, builtInPolicy);
  insertWaiverText(conn, {
    version: 1,
    title: "Release for a day outdoors",
    body: "# What this is\n\nYou let your child come along.\n\n# What may happen\n\nWet feet, and worse.",
    inForceFrom: "2026-01-01",
  });
  const waiver = findWaiverInForce(conn, "2027-01-04");
  if (!waiver) throw new Error("the waiver just written is not in force");
  return { conn, now: monday, siteId, policyId, waiver };
}

/** Moves the world's clock on. */
export function wait(world: World, minutes: number): void {
  world.now = minutesLater(world.now, minutes);
}

export function ask<Schema extends z.ZodType, Value>(
  world: World,
  actor: Actor,
  useCase: UseCase<Schema, Value>,
  input: unknown,
): Promise<Outcome<Value>> {
  return useCase({ conn: world.conn, actor, now: world.now }, input);
}

/** The value of a use case that has to work here; a refusal fails the test with its sentence. */
export async function allowed<Schema extends z.ZodType, Value>(
  world: World,
  actor: Actor,
  useCase: UseCase<Schema, Value>,
  input: unknown,
): Promise<Value> {
  const outcome = await ask(world, actor, useCase, input);
  if (outcome.ok) return outcome.value;
  throw new Error(`refused: ${JSON.stringify(outcome.refusal)}`);
}

/** The refusal of a use case that has to refuse here. */
export async function refused<Schema extends z.ZodType, Value>(
  world: World,
  actor: Actor,
  useCase: UseCase<Schema, Value>,
  input: unknown,
): Promise<Refusal> {
  const outcome = await ask(world, actor, useCase, input);
  if (!outcome.ok) return outcome.refusal;
  throw new Error(`not refused, but answered: ${JSON.stringify(outcome.value)}`);
}

type OutingChanges = {
  title?: string;
  seats?: number;
  state?: OutingState;
  day?: string;
  from?: string;
  to?: string;
  youngestAge?: number;
  oldestAge?: number;
  feeCents?: number;
  meetingText?: string;
};

/** An open outing: Saturday 9 January 2027, 9 a.m. to noon, ages 8 to 14, 12 dollars. */
export function makeOuting(world: World, changes: OutingChanges = {}): { id: string; slug: string } {
  const day = changes.day ?? "2027-01-09";
  return insertOuting(world.conn, world.now, {
    title: changes.title ?? "Low tide at Heron Spit",
    theme: "Dunlin and turnstones",
    summary: "We listen to a flock turn.",
    siteId: world.siteId,
    startsAt: instantAt(day, changes.from ?? "09:00", zone),
    endsAt: instantAt(day, changes.to ?? "12:00", zone),
    youngestAge: changes.youngestAge ?? 8,
    oldestAge: changes.oldestAge ?? 14,
    suggestedFeeCents: changes.feeCents ?? 1200,
    policyId: world.policyId,
    meetingText: changes.meetingText ?? "Come to the bench under the bell.\nThe gate is on your left.",
    seats: changes.seats ?? 5,
    requestId: newId(),
    modelIds: [],
    state: changes.state ?? "open",
  });
}

/** A child of a guardian's household, ten years old on most days here. */
export function makeChild(world: World, guardian: SignedIn, facts: { nameUsed?: string; birthDate?: string } = {}): string {
  const householdId = findHouseholdOf(world.conn, guardian.personId);
  if (householdId === null) throw new Error(`${guardian.name} has no household`);
  const nameUsed = facts.nameUsed ?? "Amaya";
  return insertParticipant(world.conn, world.now, {
    householdId,
    nameUsed,
    legalName: `${nameUsed} Reyes`,
    birthDate: facts.birthDate ?? "2016-06-15",
    requestId: newId(),
  });
}

/** What a family says on the form, as the form sends it. */
export const typedProfile = {
  travel: "long cane",
  chair: "",
  transfer: "",
  restAfter: "40",
  guideWhen: ["uneven ground", "roads"],
  guideSide: "left",
  guideHold: "above the elbow",
  support: "occasional",
  reading: "contracted braille",
  leaderNote: "says when she wants quiet",
  photo: "no",
  voice: "yes",
  contacts: { 0: { name: "Rosa Reyes", relationship: "mother", phone: "360 555 0119" } },
  pickUp: { 0: { name: "Rosa Reyes", relationship: "mother" } },
};

export const profile: AccessProfile = {
  travel: ["long cane"],
  chair: null,
  transfer: null,
  restAfter: "40",
  guideWhen: ["uneven ground", "roads"],
  guideSide: "left",
  guideHold: "above the elbow",
  support: "occasional",
  reading: "contracted braille",
  leaderNote: "says when she wants quiet",
  photo: "no",
  voice: "yes",
  contacts: [{ name: "Rosa Reyes", relationship: "mother", phone: "360 555 0119" }],
  pickUp: [{ name: "Rosa Reyes", relationship: "mother" }],
};

export function writeProfileOf(world: World, guardian: SignedIn, participantId: string, changes: Partial<AccessProfile> = {}): string {
  const answers = { ...profile, ...changes };
  return insertProfile(world.conn, world.now, { participantId, answers, writtenBy: guardian.personId }).id;
}
