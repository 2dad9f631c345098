import type { Connection } from "@/db/connection";
import { builtInPolicy } from "@/lib/cover/cover-policy";
import { insertPolicy } from "@/lib/outings/outing-store";
import { hashPassword } from "@/lib/people/passwords";
import type { Role, SignedIn } from "@/lib/shared/actor";
import { dayOf } from "@/lib/shared/dates";
import { insertWaiverText } from "@/lib/waivers/waiver-store";
import { seedHelpers, seedStaff } from "./adults";
import { demoOutings } from "./outings";
import { seedFamilies } from "./seed-families";
import { seedModels } from "./seed-models";
import { seedSites } from "./sites";
import { beginStory } from "./story";
import { tellOuting, type World } from "./tell-outing";
import { demoWaiver } from "./waiver";

export type DemoAccount = { role: Role; name: string; email: string; password: string };

type Given = { conn: Connection; filesDir: string; now: string; password: string };

/**
 * Fills an empty, migrated database with the Saltgrass Listening Club, an invented nonprofit: a season past and a
 * season to come, counted from `now`. Everything goes the way its users go, at the moment it happens in the story.
 * Answers one account a role. Whole or not at all; throws when a step of the story is refused.
 */
export async function seedDemoWorld(given: Given): Promise<DemoAccount[]> {
  const { raw } = given.conn;
  // One transaction over many awaits, which the program itself never has: here nobody else is on the handle.
  raw.exec("begin immediate");
  try {
    const accounts = await tellAll(given);
    raw.exec("commit");
    return accounts;
  } catch (error) {
    raw.exec("rollback");
    throw error;
  }
}

async function tellAll({ conn, filesDir, now, password }: Given): Promise<DemoAccount[]> {
  const story = beginStory(conn, now);
  const passwordHash = await hashPassword(password);
  const staff = await seedStaff(story, passwordHash);
  const policyId = insertPolicy(conn, story.daysAgo(118, "10:00"), builtInPolicy);
  insertWaiverText(conn, { ...demoWaiver, inForceFrom: dayOf(story.daysAgo(117, "12:00"), story.zone) });
  const world: World = {
    coordinator: staff.coordinator,
    policyId,
    sites: seedSites(story),
    models: await seedModels(story, filesDir),
    helpers: await seedHelpers(story, staff.coordinator, passwordHash),
    children: await seedFamilies(story, passwordHash),
  };
  for (const outing of demoOutings) await tellOuting(story, world, outing);
  return accountsOf(world, staff.admin, password);
}

function accountsOf(world: World, admin: SignedIn, password: string): DemoAccount[] {
  const account = (role: Role, person: SignedIn | undefined): DemoAccount[] =>
    person ? [{ role, name: person.name, email: person.email, password }] : [];
  return [
    ...account("guardian", world.children.get("Ada")?.guardian),
    ...account("chaperone", world.helpers.get("Ines Carrow")),
    ...account("leader", world.helpers.get("Tove Lindqvist")),
    ...account("coordinator", world.coordinator),
    ...account("admin", admin),
  ];
}
