import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { openDatabaseCopy } from "../support/database";
import { askAndUndo, exportedUseCases, useCases } from "./collected-use-cases";
import { decisions, family } from "./decided-doors";
import { makeDecidedWorld, subjects, type DecidedWorld } from "./decided-world";

let given: DecidedWorld;
let remove: () => void;

beforeAll(async () => {
  const copy = openDatabaseCopy();
  remove = copy.remove;
  given = await makeDecidedWorld(copy.conn);
});

afterAll(() => remove());

describe("who may do what", () => {
  it("somebody has decided about every command and query", () => {
    const undecided = [...useCases.keys()].filter((name) => !(name in decisions));
    const advice = "Add a row for it to tests/architecture/decided-doors.ts: who gets past its allow, and something valid to ask.";
    expect(undecided, `Nobody has decided who may use ${undecided.join(", ")}. ${advice}`).toEqual([]);
  });

  it("nothing is decided about a use case that is gone, and no two share a name", () => {
    expect(Object.keys(decisions).filter((name) => !useCases.has(name))).toEqual([]);
    expect(exportedUseCases).toHaveLength(useCases.size);
  });

  const rows = [...useCases].flatMap(([name, useCase]) => {
    const decision = decisions[name];
    return decision ? [[name, useCase, decision] as const] : [];
  });

  it.each(rows)("%s opens to those decided on and to nobody else", async (_name, useCase, decision) => {
    const input = decision.input(given);
    expect(useCase.input.safeParse(input).error?.issues ?? []).toEqual([]);
    const answers = new Map<string, string>();
    for (const subject of subjects) {
      const outcome = await askAndUndo(given, given.actors[subject], useCase, input);
      answers.set(subject, outcome.ok ? "ok" : outcome.refusal.kind);
    }
    const wanted = new Map(subjects.map((subject) => [subject, decision.to.includes(subject) ? "ok" : decision.hidden ? "not-found" : "forbidden"]));
    expect(Object.fromEntries(answers)).toEqual(Object.fromEntries(wanted));
  });

  it.each(rows.filter(([, , { to }]) => to === family))("%s is refused to one of the household who is not a guardian", async (_name, useCase, decision) => {
    const outcome = await askAndUndo(given, given.noGuardian, useCase, decision.input(given));
    expect(outcome).toMatchObject({ ok: false, refusal: { kind: "forbidden" } });
  });
});
