import { findHouseholdOf } from "@/lib/families/household-store";
import { setAnswer, insertAnswer } from "@/lib/helpers/helper-store";
import { attachSession, insertPayment, noteExtraPayment } from "@/lib/payments/payment-store";
import { makeMailLink } from "@/lib/people/mail-link-store";
import { setNameAndPassword } from "@/lib/people/person-store";
import { hashPassword } from "@/lib/people/passwords";
import { printRoster } from "@/lib/roster/print-roster";
import { chooseFee } from "@/lib/payments/choose-fee";
import { confirmNeeds } from "@/lib/registrations/confirm-needs";
import { registerChild } from "@/lib/registrations/register-child";
import { payments, theClock, visitor, type Actor, type SignedIn } from "@/lib/shared/actor";
import { minutesLater } from "@/lib/shared/dates";
import { insertModel } from "@/lib/teaching-models/teaching-model-store";
import { signWaiver } from "@/lib/waivers/sign-waiver";
import { knex, type Connection } from "@/db/connection";
import { makeAdmin, makeChaperone, makeCoordinator, makeGuardian, makeLeader, makePerson } from "../support/actors";
import { allowed, makeChild, makeOuting, makeWorld, typedProfile, writeProfileOf, type World } from "../support/world";

/** Everybody who could ask. "another" is somebody with the role and nothing to do with this family or this day. */
export const subjects = [
  "visitor", "guardian", "another guardian", "chaperone", "another chaperone", "leader", "another leader", "coordinator",
  "admin", "payments", "the clock",
] as const;
export type Subject = (typeof subjects)[number];

/** One family, one day, one of everything, for asking each use case as each subject. */
export async function makeDecidedWorld(conn: Connection) {
  const world = makeWorld(conn);
  const people = makePeople(world);
  const actors: Record<Subject, Actor> = { visitor, payments, "the clock": theClock, ...people };
  await givePassword(world, people.guardian, "salt and reeds and rain");
  const outing = makeOuting(world, { title: "Dawn chorus" });
  const draft = makeOuting(world, { title: "Not yet told", state: "draft" });
  const { childId, newcomerId, heldId, confirmedId } = await makeRegistrations(world, people.guardian, outing.slug);
  const paymentId = insertPayment(conn, world.now, { registrationId: heldId, amountCents: 1200, currency: "usd" });
  attachSession(conn, paymentId, "cs_decided", "http://127.0.0.1:1/pay");
  const returnableId = insertPayment(conn, world.now, { registrationId: confirmedId, amountCents: 700, currency: "usd" });
  noteExtraPayment(conn, world.now, returnableId, "pi_extra");
  const { answerId, answerSecret } = askHelpers(world, people, outing.id);
  const { paperId } = await allowed(world, people.coordinator, printRoster, { slug: outing.slug, form: "standard" });
  const link = (purpose: "sign-in" | "invitation", person: SignedIn) =>
    makeMailLink(conn, { purpose, personId: person.personId, madeAt: world.now, expiresAt: minutesLater(world.now, 600) });
  const secrets = { answer: answerSecret, signIn: link("sign-in", people.guardian), invitation: link("invitation", people.chaperone) };
  const modelSlug = makeModel(world);
  const noGuardian = makeOneOfTheHousehold(world, people.guardian);
  const ids = { childId, newcomerId, heldId, confirmedId, paymentId, returnableId, answerId, paperId };
  return { world, actors, people, noGuardian, outing, draft, ...ids, secrets, modelSlug };
}

export type DecidedWorld = Awaited<ReturnType<typeof makeDecidedWorld>>;

function makePeople(world: World) {
  return {
    guardian: makeGuardian(world, "Rosa Reyes"),
    "another guardian": makeGuardian(world, "Nils Holm"),
    chaperone: makeChaperone(world, "Marcus Hale"),
    "another chaperone": makeChaperone(world, "Pia Lindqvist"),
    leader: makeLeader(world, "Dee Okafor"),
    "another leader": makeLeader(world, "Hanne Strand"),
    coordinator: makeCoordinator(world),
    admin: makeAdmin(world),
  };
}

/** In the family's household, and without the role: the records are theirs to find and not theirs to touch. */
function makeOneOfTheHousehold(world: World, guardian: SignedIn): SignedIn {
  const person = makePerson(world, "Uncle Reyes", []);
  const householdId = findHouseholdOf(world.conn, guardian.personId) ?? "";
  world.conn.run(knex("household_guardians").insert({ household_id: householdId, person_id: person.personId }));
  return person;
}

async function givePassword(world: World, person: SignedIn, password: string): Promise<void> {
  setNameAndPassword(world.conn, person.personId, person.name, await hashPassword(password));
}

async function makeRegistrations(world: World, guardian: SignedIn, slug: string) {
  const childId = makeChild(world, guardian, { nameUsed: "Amaya" });
  const brotherId = makeChild(world, guardian, { nameUsed: "Tomás" });
  const newcomerId = makeChild(world, guardian, { nameUsed: "Noor" });
  writeProfileOf(world, guardian, childId);
  const held = await allowed(world, guardian, registerChild, { slug, participantId: childId });
  const { registrationId } = await allowed(world, guardian, registerChild, { slug, participantId: brotherId });
  await allowed(world, guardian, confirmNeeds, { ...typedProfile, registrationId, guardianStays: "drops off" });
  await allowed(world, guardian, chooseFee, { registrationId, choice: "no fee" });
  await allowed(world, guardian, signWaiver, signing(world, registrationId));
  return { childId, newcomerId, heldId: held.registrationId, confirmedId: registrationId };
}

export function signing(world: World, registrationId: string) {
  return { registrationId, textSha256: world.waiver.sha256, typedName: "Rosa Reyes", typedDate: "2027-01-04", agree: "yes" };
}

function askHelpers(world: World, people: ReturnType<typeof makePeople>, outingId: string) {
  const { conn, now } = world;
  const asked = insertAnswer(conn, now, { outingId, personId: people.chaperone.personId, task: "chaperone" });
  const leads = insertAnswer(conn, now, { outingId, personId: people.leader.personId, task: "leader" });
  setAnswer(conn, now, asked.id, "yes");
  setAnswer(conn, now, leads.id, "yes");
  const answerSecret = makeMailLink(conn, {
    purpose: "answer", personId: people.chaperone.personId, aboutId: asked.id, madeAt: now, expiresAt: minutesLater(now, 9000),
  });
  return { answerId: asked.id, answerSecret };
}

function makeModel(world: World): string {
  const hash = "a".repeat(64);
  world.conn.run(knex("files").insert({ sha256: hash, media_type: "image/png", bytes: 1, stored_at: world.now }));
  const facts = {
    forWhom: "anybody", level: "first", description: "A rise and a fall.", fingerTour: ["Start at the cut corner."], listenFor: ["the rise"],
    scale: {
      widthMm: 100, heightMm: 60, baseMm: 2, reliefMmMax: 4, secondsPerCm: 0.2, durationSeconds: 2, smallestGapSeconds: 0.05,
      lowestHz: 500, highestHz: 8000, axis: "log" as const,
    },
    copies: 1, making: { layerHeightMm: 0.2, material: "PLA", orientation: "flat", cutCorner: "upper right", notes: [] },
    safety: "No small parts.", audioInWords: "A whistle.", audioSeconds: 2, pictureAlt: "A ridge.", version: "1", status: "ready",
  };
  const files = { pictureSha256: hash, audioSha256: hash, printableSha256: hash };
  insertModel(world.conn, { slug: "a-rise", title: "A rise", concept: "pitch", facts, ...files, position: 1 });
  return "a-rise";
}
