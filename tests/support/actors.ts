import { insertHousehold } from "@/lib/families/household-store";
import { insertHelperRecord, setAbilities, setClearance } from "@/lib/helpers/helper-store";
import type { HelperRecord } from "@/lib/helpers/helper";
import { actorOf, confirmEmail, giveRole, insertPerson } from "@/lib/people/person-store";
import type { Role, SignedIn } from "@/lib/shared/actor";
import type { World } from "./world";

/** Somebody with an account, a confirmed address and these roles. */
export function makePerson(world: World, name: string, roles: readonly Role[]): SignedIn {
  const { conn, now } = world;
  const email = `${name.normalize("NFKD").replace(/[^a-zA-Z0-9]+/g, ".").toLowerCase()}@saltgrass.example`;
  const id = insertPerson(conn, now, { email, name });
  confirmEmail(conn, id, now);
  for (const role of roles) giveRole(conn, id, role);
  if (roles.includes("guardian")) insertHousehold(conn, now, id);
  if (roles.includes("chaperone") || roles.includes("leader")) insertHelperRecord(conn, now, id);
  const actor = actorOf(conn, id);
  if (!actor) throw new Error(`${name} was not kept`);
  return actor;
}

export function makeGuardian(world: World, name = "Rosa Reyes"): SignedIn {
  return makePerson(world, name, ["guardian"]);
}

export function makeCoordinator(world: World, name = "Ines Amari"): SignedIn {
  return makePerson(world, name, ["coordinator"]);
}

export function makeAdmin(world: World, name = "Odd Berg"): SignedIn {
  return makePerson(world, name, ["admin"]);
}

const ableTo: Omit<HelperRecord, "personId" | "clearedUntil"> = {
  isAdult: true,
  guidesLeft: true,
  guidesRight: true,
  pushesChair: false,
  firstAid: true,
  drives: false,
};

/** An adult who guides on both sides, knows first aid and is cleared through 2027, unless told otherwise. */
export function makeChaperone(
  world: World,
  name = "Marcus Hale",
  changes: Partial<Omit<HelperRecord, "personId">> = {},
): SignedIn {
  return makeHelper(world, makePerson(world, name, ["chaperone"]), changes);
}

export function makeLeader(world: World, name = "Dee Okafor"): SignedIn {
  return makeHelper(world, makePerson(world, name, ["leader"]), {});
}

function makeHelper(world: World, actor: SignedIn, changes: Partial<Omit<HelperRecord, "personId">>): SignedIn {
  const { clearedUntil = "2027-12-31", ...abilities } = changes;
  setAbilities(world.conn, world.now, actor.personId, { ...ableTo, ...abilities });
  setClearance(world.conn, world.now, actor.personId, clearedUntil);
  return actor;
}
