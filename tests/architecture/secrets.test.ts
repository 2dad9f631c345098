import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { knex } from "@/db/connection";
import { openDatabaseCopy } from "../support/database";
import { askAndUndo, useCases } from "./collected-use-cases";
import { decisions } from "./decided-doors";
import { makeDecidedWorld, subjects, type DecidedWorld, type Subject } from "./decided-world";

let given: DecidedWorld;
let remove: () => void;
let secrets: string[];

beforeAll(async () => {
  const copy = openDatabaseCopy();
  remove = copy.remove;
  given = await makeDecidedWorld(copy.conn);
  const hashes = copy.conn.all(knex("people").whereNotNull("password_hash").select("password_hash")).map((row) => row.password_hash ?? "");
  const carried = copy.conn.all(knex("mail_links").whereNotNull("carries").select("carries"));
  for (const { carries } of carried) hashes.push((JSON.parse(carries ?? "{}") as { passwordHash: string }).passwordHash);
  const links = copy.conn.all(knex("mail_links").select("secret_hash")).map((row) => row.secret_hash);
  secrets = [...hashes, ...links, ...Object.values(given.secrets)];
});

afterAll(() => remove());

/** Everything a subject is told by everything it may ask, as JSON. */
async function toldTo(subject: Subject, names: readonly string[]): Promise<string> {
  const told: string[] = [];
  for (const name of names) {
    const useCase = useCases.get(name);
    const decision = decisions[name];
    if (!useCase || !decision) continue;
    const outcome = await askAndUndo(given, given.actors[subject], useCase, decision.input(given));
    told.push(JSON.stringify(outcome));
  }
  return told.join("\n");
}

const all = Object.keys(decisions);
const queries = () => all.filter((name) => useCases.get(name)?.kind === "query");

describe("what is told", () => {
  it("to nobody: a password, a link's secret, or the hash of either", async () => {
    expect(secrets.length).toBeGreaterThan(5);
    for (const subject of subjects) {
      const told = await toldTo(subject, all);
      expect(told.length).toBeGreaterThan(500);
      expect(secrets.filter((secret) => told.includes(secret)), subject).toEqual([]);
      expect(told).not.toMatch(/password_?hash|secret_?hash/i);
    }
  });

  it.each(["visitor", "another guardian", "another chaperone", "another leader"] as const)(
    "to %s: nothing of a family that is not theirs",
    async (subject) => {
      const told = await toldTo(subject, queries().filter((name) => name !== "showMailLink"));
      const facts = ["Amaya", "Tomás", "Reyes", "rosa.reyes", "360 555 0119", "2016-06-15", "says when she wants quiet"];
      expect(facts.filter((fact) => told.includes(fact))).toEqual([]);
    },
  );

  it("to a chaperone who comes: no family's address, phone, birth date or legal name", async () => {
    const told = await toldTo("chaperone", queries().filter((name) => name !== "showMailLink"));
    expect(["Reyes", "rosa.reyes", "360 555 0119", "2016-06-15"].filter((fact) => told.includes(fact))).toEqual([]);
  });

  it("to the leader: the names used on the day, and no legal name, birth date or family's phone", async () => {
    const told = await toldTo("leader", queries().filter((name) => name !== "showMailLink"));
    expect(told.includes("Tomás")).toBe(true);
    expect(["Tomás Reyes", "rosa.reyes", "360 555 0119", "2016-06-15"].filter((fact) => told.includes(fact))).toEqual([]);
  });

  it.each(["visitor", "guardian", "another guardian", "another chaperone"] as const)(
    "to %s: where to meet only after a confirmed seat or a yes",
    async (subject) => {
      const names = queries().filter((name) => !["showRequestByLink", "listMyRegistrations"].includes(name));
      expect((await toldTo(subject, names)).includes("Come to the bench under the bell")).toBe(false);
    },
  );
});
