import { addChild } from "@/lib/families/add-child";
import type { AccessProfile } from "@/lib/families/access-profile";
import { insertHousehold } from "@/lib/families/household-store";
import { writeProfile } from "@/lib/registrations/write-profile";
import { mailConfirmation } from "@/lib/people/mail-links";
import { confirmEmail, giveRole, insertPerson } from "@/lib/people/person-store";
import type { SignedIn } from "@/lib/shared/actor";
import { minutesLater } from "@/lib/shared/dates";
import { demoEmail, signedIn } from "./adults";
import { demoFamilies, type DemoChild, type DemoFamily } from "./families";
import { bornFor, must, sendPost, type Story } from "./story";

export type SeededChild = { participantId: string; guardian: SignedIn; profile: AccessProfile };

/** Every family with its children and their profiles; the children by the name the group uses. */
export async function seedFamilies(story: Story, passwordHash: string): Promise<ReadonlyMap<string, SeededChild>> {
  const children = new Map<string, SeededChild>();
  for (const [index, family] of demoFamilies.entries()) {
    const at = story.daysAgo(105 - index, "19:20");
    const guardian = await signUpFamily(story, family, at, passwordHash);
    for (const [place, child] of family.children.entries()) {
      const seeded = await seedChild(story, { family, child, guardian, at: minutesLater(at, 10 + 15 * place) });
      children.set(child.nameUsed, seeded);
    }
  }
  return children;
}

/** As the sign-up form does it, but with the password that was hashed once for all. */
async function signUpFamily(story: Story, family: DemoFamily, at: string, passwordHash: string): Promise<SignedIn> {
  const { conn } = story;
  const person = { name: family.guardian, email: demoEmail(family.guardian) };
  const id = insertPerson(conn, at, { ...person, phone: family.phone, passwordHash });
  giveRole(conn, id, "guardian");
  insertHousehold(conn, at, id);
  mailConfirmation(conn, at, { id, email: person.email }, { name: person.name, passwordHash, back: "" });
  await sendPost(story, at);
  confirmEmail(conn, id, minutesLater(at, 3));
  return signedIn(story, id);
}

type Given = { family: DemoFamily; child: DemoChild; guardian: SignedIn; at: string };

async function seedChild(story: Story, { family, child, guardian, at: now }: Given): Promise<SeededChild> {
  const asked = { conn: story.conn, actor: guardian, now };
  const { participantId } = must(
    await addChild(asked, {
      nameUsed: child.nameUsed,
      legalName: child.legalName,
      birthDate: bornFor(story.saturday(5), child.age, child.daysSinceBirthday),
      requestId: `demo-child-${child.nameUsed}`,
    }),
  );
  const profile = { ...child.needs, ...peopleToCall(family) };
  must(await writeProfile(asked, { participantId, ...profile }));
  return { participantId, guardian, profile };
}

function peopleToCall({ guardian, relationship, phone, other }: DemoFamily): Pick<AccessProfile, "contacts" | "pickUp"> {
  return {
    contacts: [{ name: guardian, relationship, phone }, other],
    pickUp: [{ name: guardian, relationship }, { name: other.name, relationship: other.relationship }],
  };
}
