import { changeAbilities } from "@/lib/helpers/change-abilities";
import { changeClearance } from "@/lib/helpers/change-clearance";
import { changeReading } from "@/lib/people/change-reading";
import { invite } from "@/lib/people/invite";
import {
  actorOf,
  confirmEmail,
  findPersonByEmail,
  giveRole,
  insertPerson,
  setNameAndPassword,
} from "@/lib/people/person-store";
import type { Role, SignedIn } from "@/lib/shared/actor";
import { daysLater, must, sendPost, type Story } from "./story";

type Ability = "isAdult" | "guidesLeft" | "guidesRight" | "pushesChair" | "firstAid" | "drives";

type DemoHelper = {
  name: string;
  role: "chaperone" | "leader";
  can: readonly Ability[];
  /** The last day of the clearance, counted from the day of the next outing. */
  clearedDaysAfterNext: number;
  reading?: { readingFormat: string; textSizePt: number };
};

const helpers = [
  {
    name: "Tove Lindqvist",
    role: "leader",
    can: ["isAdult"],
    clearedDaysAfterNext: 400,
    reading: { readingFormat: "contracted braille", textSizePt: 18 },
  },
  {
    name: "Ines Carrow",
    role: "chaperone",
    can: ["isAdult", "guidesLeft", "guidesRight", "firstAid"],
    clearedDaysAfterNext: 160,
  },
  { name: "Jonah Pell", role: "chaperone", can: ["isAdult", "pushesChair", "drives"], clearedDaysAfterNext: 70 },
  {
    name: "Marguerite Oyelaran",
    role: "chaperone",
    can: ["isAdult", "guidesLeft"],
    clearedDaysAfterNext: 300,
    reading: { readingFormat: "large print", textSizePt: 22 },
  },
  { name: "Bea Castellano", role: "chaperone", can: ["isAdult", "firstAid"], clearedDaysAfterNext: 500 },
  { name: "Des Whitaker", role: "chaperone", can: ["isAdult", "pushesChair", "drives"], clearedDaysAfterNext: 220 },
  // Said yes to the next outing, and the clearance runs out nine days before it.
  { name: "Hollis Grady", role: "chaperone", can: ["isAdult", "guidesLeft", "guidesRight"], clearedDaysAfterNext: -9 },
  { name: "Priya Raman", role: "chaperone", can: ["isAdult", "guidesRight"], clearedDaysAfterNext: 250 },
  {
    name: "Noor Haddad",
    role: "chaperone",
    can: ["isAdult", "guidesLeft", "guidesRight", "pushesChair"],
    clearedDaysAfterNext: 180,
  },
  // Seventeen, so never counted as an adult.
  { name: "Kit Sørensen", role: "chaperone", can: ["guidesLeft", "guidesRight"], clearedDaysAfterNext: 200 },
] as const satisfies readonly DemoHelper[];

export type HelperName = (typeof helpers)[number]["name"];

export type Staff = { admin: SignedIn; coordinator: SignedIn };

/** "Kit Sørensen" to "kit.sorensen@saltgrass.example". The domain is reserved: RFC 2606. */
export function demoEmail(name: string): string {
  const letters = name.normalize("NFKD").replaceAll(/\p{M}/gu, "").replaceAll("ø", "o").replaceAll("ı", "i");
  return `${letters.toLowerCase().replaceAll(/[^a-z]+/g, ".")}@saltgrass.example`;
}

/** The first admin has nobody to invite them; everybody else comes by invitation. */
export async function seedStaff(story: Story, passwordHash: string): Promise<Staff> {
  const at = story.daysAgo(120, "09:30");
  const name = "Sunniva Berg";
  const adminId = insertPerson(story.conn, at, { name, email: demoEmail(name), phone: "360 555 0143", passwordHash });
  giveRole(story.conn, adminId, "admin");
  confirmEmail(story.conn, adminId, at);
  const admin = signedIn(story, adminId);
  const robin = { name: "Robin Alder", role: "coordinator", by: admin, at: story.daysAgo(119, "10:00") } as const;
  return { admin, coordinator: await invited(story, { ...robin, passwordHash }) };
}

/** Chaperones and the leader, with what they can do and until when they are cleared, by name. */
export async function seedHelpers(
  story: Story,
  by: SignedIn,
  passwordHash: string,
): Promise<ReadonlyMap<HelperName, SignedIn>> {
  const all = new Map<HelperName, SignedIn>();
  for (const [index, helper] of helpers.entries()) {
    const at = story.daysAgo(112 - index, "11:15");
    const actor = await invited(story, { ...helper, by, at, passwordHash });
    await tellAbilities(story, helper, { actor, by, at });
    all.set(helper.name, actor);
  }
  return all;
}

type Telling = { actor: SignedIn; by: SignedIn; at: string };

async function tellAbilities(story: Story, helper: DemoHelper, { actor, by, at: now }: Telling): Promise<void> {
  const { conn } = story;
  must(await changeAbilities({ conn, actor, now }, Object.fromEntries(helper.can.map((ability) => [ability, "yes"]))));
  const clearedUntil = daysLater(story.saturday(5), helper.clearedDaysAfterNext);
  must(await changeClearance({ conn, actor: by, now }, { personId: actor.personId, clearedUntil }));
  if (helper.reading) must(await changeReading({ conn, actor, now }, helper.reading));
}

type Invitation = { name: string; role: Role; by: SignedIn; at: string; passwordHash: string };

/** Invites somebody and lets them accept. The password is hashed once for all, so accepting goes through the store. */
async function invited(story: Story, { name, role, by, at, passwordHash }: Invitation): Promise<SignedIn> {
  const { conn } = story;
  const email = demoEmail(name);
  must(await invite({ conn, actor: by, now: at }, { name, email, role }));
  await sendPost(story, at);
  const person = findPersonByEmail(conn, email);
  if (!person) throw new Error(`${name} was invited and is not there.`);
  setNameAndPassword(conn, person.id, name, passwordHash);
  confirmEmail(conn, person.id, at);
  return signedIn(story, person.id);
}

export function signedIn(story: Story, personId: string): SignedIn {
  const actor = actorOf(story.conn, personId);
  if (!actor) throw new Error(`Nobody has the id ${personId}.`);
  return actor;
}
