import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { knex, openConnection, type Connection } from "@/db/connection";
import { checkOutingCover } from "@/lib/cover-board/check-outing-cover";
import { guideNeedOf, travelTools } from "@/lib/families/access-profile";
import { filePath } from "@/lib/files/file-store";
import { listChildren } from "@/lib/families/list-children";
import { listOutingHelpers } from "@/lib/helpers/list-outing-helpers";
import { outingStates } from "@/lib/outings/outing";
import { insertSite, listOutingsBetween } from "@/lib/outings/outing-store";
import { outingView, type OutingView } from "@/lib/outings/outing-view";
import { actorOf, findPersonByEmail } from "@/lib/people/person-store";
import { signIn } from "@/lib/people/sign-in";
import { listMoneyToReturn } from "@/lib/payments/list-money-to-return";
import { listMyRegistrations } from "@/lib/registrations/list-my-registrations";
import { listOutingPeople } from "@/lib/registrations/list-outing-people";
import { listPapers } from "@/lib/roster/list-papers";
import { checkNeverOnPaper } from "@/lib/roster/never-on-paper";
import { openPaper } from "@/lib/roster/open-paper";
import { printRoster } from "@/lib/roster/print-roster";
import { rosterSheet } from "@/lib/roster/roster-sheet";
import { roles, visitor, type SignedIn } from "@/lib/shared/actor";
import { sha256 } from "@/lib/shared/ids";
import { listTeachingModels } from "@/lib/teaching-models/list-teaching-models";
import { showTeachingModel } from "@/lib/teaching-models/show-teaching-model";
import { waiverBlocks } from "@/lib/waivers/waiver-text";
import { showWaiver } from "@/lib/waivers/show-waiver";
import { seedDemoWorld, type DemoAccount } from "@/seeds/demo/demo-world";
import { must } from "@/seeds/demo/story";
import { openTestDatabase } from "@/tests/support/database";
import { supportLevels } from "@/lib/cover/support-level";

const folder = mkdtempSync(path.join(tmpdir(), "dunlin-demo-world-"));
const filesDir = path.join(folder, "files");
const databaseFile = path.join(folder, "world.sqlite");
const now = new Date().toISOString();

let conn: Connection;
let accounts: DemoAccount[];

function run(script: string, file: string, settings: Record<string, string> = {}) {
  const { status, stdout, stderr } = spawnSync(process.execPath, ["--import", "tsx", ...script.split(" ")], {
    env: { ...process.env, DUNLIN_ENV: "demo", DATABASE_FILE: file, FILES_DIR: filesDir, DEMO_PASSWORD: "", ...settings },
    encoding: "utf8",
  });
  return { status, stdout, stderr };
}

function actorFor(role: DemoAccount["role"], on: Connection = conn): SignedIn {
  const account = accounts.find((one) => one.role === role);
  const person = account && findPersonByEmail(on, account.email);
  const actor = person && actorOf(on, person.id);
  if (!actor) throw new Error(`no account for ${role}`);
  return actor;
}

const asked = (role: DemoAccount["role"]) => ({ conn, actor: actorFor(role), now });

function allOutings(): OutingView[] {
  return listOutingsBetween(conn, "0000", "9999", outingStates, now).map((outing) => outingView(outing, now));
}

const heronSpit = { slug: "low-tide-at-heron-spit" };

beforeAll(() => {
  const migrated = run("scripts/migrate.ts", databaseFile);
  if (migrated.status !== 0) throw new Error(migrated.stderr);
  const { status, stdout, stderr } = run("scripts/seed.ts --accounts-json", databaseFile);
  if (status !== 0) throw new Error(stderr);
  accounts = stdout.trim().split("\n").map((line) => JSON.parse(line) as DemoAccount);
  conn = openConnection(databaseFile);
}, 60_000);

afterAll(() => {
  conn.close();
  rmSync(folder, { recursive: true });
});

describe("the accounts of the demo world", () => {
  it("are one a role, and each signs in with the password that was printed", async () => {
    expect(accounts.map((account) => account.role).toSorted()).toEqual([...roles].toSorted());
    for (const { role, email, password } of accounts) {
      const answer = must(await signIn({ conn, actor: visitor, now }, { email, password }));
      expect(answer, role).toMatchObject({ kind: "signed-in", personId: actorFor(role).personId });
      expect(actorFor(role).roles, role).toContain(role);
    }
  });

  it("have addresses and phones that can belong to nobody", () => {
    const people = conn.all(knex("people").select("email", "phone"));
    for (const { email } of people) expect(email).toMatch(/^[a-z.]+@saltgrass\.example$/);
    const answers = conn.all(knex("access_profiles").select("answers")).map((row) => row.answers).join();
    const phones = `${people.map((one) => one.phone).join()},${answers}`.match(/\d{3} \d{3} \d{4}/g) ?? [];
    expect(phones.length).toBeGreaterThan(20);
    // 555-0100 to 555-0199 are set aside for fiction (from memory)
    for (const phone of phones) expect(phone).toMatch(/^\d{3} 555 01\d{2}$/);
  });

  it("has a leader who reads contracted braille", () => {
    expect(findPersonByEmail(conn, actorFor("leader").email)?.readingFormat).toBe("contracted braille");
  });
});

describe("the outings of the demo world", () => {
  it("are in every state, full among them, and begin on Saturdays", () => {
    const outings = allOutings();
    expect(new Set(outings.map((one) => one.state))).toEqual(new Set(["draft", "open", "closed", "called off", "done"]));
    const rooms = outings.map((one) => one.room);
    expect(rooms).toEqual(expect.arrayContaining(["places left", "full", "closed", "called off", "done"]));
    for (const outing of outings) {
      expect(outing.dayInWords).toMatch(/^Saturday /);
      expect(outing.modelIds.length).toBeGreaterThan(0);
      expect(outing.state === "done").toBe(outing.endsAt < now);
    }
  });

  it("never have more people than seats, nor a number twice", async () => {
    for (const { slug, seats, seatsFree } of allOutings()) {
      const people = must(await listOutingPeople(asked("coordinator"), { slug }));
      const coming = people.filter((one) => one.state === "confirmed");
      expect(coming.length, slug).toBe(seats - seatsFree);
      expect(new Set(coming.map((one) => one.number)).size, slug).toBe(coming.length);
      for (const one of coming) expect(one.missing, one.nameUsed).toEqual([]);
      expect(people.filter((one) => one.state === "waiting").length === 0 || seatsFree === 0, slug).toBe(true);
    }
  });

  it("keep the frogs full with two who wait, and room for a newcomer at the ferry landing", () => {
    const outings = allOutings();
    const frogs = outings.find((one) => one.slug === "frogs-at-alder-bog");
    expect(frogs).toMatchObject({ room: "full", waiting: 2, seatsFree: 0 });
    const landing = outings.find((one) => one.slug === "ropes-and-hulls-at-old-ferry-landing");
    expect(landing).toMatchObject({ room: "places left", seats: 12, seatsFree: 9, youngestAge: 5, oldestAge: 18 });
  });

  it("tell where to meet in numbered legs, with the outing's own day and hours", () => {
    for (const { meeting_text: text, title, slug } of conn.all(knex("outings").select("meeting_text", "title", "slug"))) {
      const outing = allOutings().find((one) => one.slug === slug);
      expect(text).toContain(`${title}, ${outing?.dayInWords ?? "no day"}.`);
      const [start = "", end = ""] = outing?.hours.split(" to ") ?? [];
      expect(text, slug).toMatch(new RegExp(`set out at ${start} and finish at [a-z ]+ again at ${end}`));
      const steps = text.split("\n").filter((line) => /^\d\. /.test(line));
      expect(steps.length, slug).toBeGreaterThanOrEqual(3);
      expect(steps.join(" "), slug).toMatch(/facing/i);
      expect(steps.join(" "), slug).toMatch(/\d+ feet/);
      expect(steps.join(" "), slug).toMatch(/too far|have passed/);
      expect(text).not.toMatch(/undefined|\.\.|over there|you'll see|follow the signs|\bnearby\b/);
    }
  });
});

describe("the cover of the demo world", () => {
  it("is short by exactly one guide at Heron Spit, and names who could be asked", async () => {
    const { verdict, people } = must(await checkOutingCover(asked("coordinator"), heronSpit));
    expect(people).toHaveLength(11);
    expect(verdict.sentence).toBe("Short by one guide.");
    expect(verdict.shortage.guides).toBe(1);
    expect(Object.values(verdict.shortage).reduce((sum, short) => sum + short, 0)).toBe(1);
    const stopping = verdict.findings.filter((finding) => finding.severity === "stops").map((finding) => finding.rule);
    expect(stopping.toSorted()).toEqual(["guide-for-each", "ratio-by-support"]);
    expect(people.filter((person) => person.adultId === null).map((person) => person.nameUsed)).toEqual(["Amaya"]);
  });

  it("holds for the other outings that are still to come and open or closed", async () => {
    const toCome = allOutings().filter((one) => ["places left", "full", "closed"].includes(one.room) && one.state !== "draft");
    const slugs = toCome.map((one) => one.slug).filter((slug) => slug !== heronSpit.slug);
    expect(slugs).toHaveLength(3);
    for (const slug of slugs) {
      const { verdict } = must(await checkOutingCover(asked("coordinator"), { slug }));
      expect(verdict.sentence, slug).toMatch(/^Covered/);
    }
  });

  it("shows helpers of every kind: yes, maybe, not answered, lapsed before the day, and under age", async () => {
    const { answers } = must(await listOutingHelpers(asked("coordinator"), heronSpit));
    expect(new Set(answers.map((one) => one.state))).toEqual(new Set(["yes", "maybe", "no", "asked"]));
    const lapsed = answers.filter((one) => one.state === "yes" && !one.clearedThatDay);
    expect(lapsed.map((one) => one.name)).toEqual(["Hollis Grady"]);
    const { verdict } = must(await checkOutingCover(asked("coordinator"), heronSpit));
    const underAge = verdict.adults.filter((one) => one.reasons.some((reason) => reason.code === "under-age"));
    expect(underAge.map((one) => one.name)).toEqual(["Kit Sørensen"]);
  });
});

describe("the families of the demo world", () => {
  it("have many kinds of names and needs", async () => {
    const names = conn.all(knex("participants").select("name_used")).map((row) => row.name_used);
    expect(names.length).toBeGreaterThanOrEqual(14);
    expect(names).toEqual(expect.arrayContaining(["Zoë", "Nguyễn Ánh", "Łucja", "José", "Ελένη", "Леся", "Keʻala"]));
    const people = must(await listOutingPeople(asked("coordinator"), heronSpit));
    const profiles = people.flatMap((one) => one.profile ?? []);
    expect(new Set(profiles.flatMap((one) => one.travel))).toEqual(new Set(travelTools));
    expect(new Set(profiles.map((one) => one.support))).toEqual(new Set(supportLevels));
    expect(new Set(profiles.map(guideNeedOf))).toEqual(new Set(["throughout", "at-times", "not-needed"]));
    expect(new Set(profiles.map((one) => one.chair))).toEqual(new Set([null, "pushed", "power"]));
  });

  it("leave the guardian a child to register for the ferry landing", async () => {
    expect(must(await listChildren(asked("guardian"), {}))).toHaveLength(2);
    const registrations = must(await listMyRegistrations(asked("guardian"), {}));
    const of = (slug: string) => registrations.filter((one) => one.outing.slug === slug).map((one) => one.child.nameUsed);
    expect(of("low-tide-at-heron-spit")).toEqual(["Ada"]);
    expect(of("ropes-and-hulls-at-old-ferry-landing")).toEqual([]);
  });

  it("have signed a waiver that says it is to be reviewed by counsel", async () => {
    const text = must(await showWaiver({ conn, actor: visitor, now }, {}));
    expect(text.version).toBe(1);
    expect(text.body).toContain("This text is to be reviewed by counsel in the programme's state before it is used.");
    const words = waiverBlocks(text.body).flatMap((block) => block.text.split(/\s+/));
    expect(words.length).toBeGreaterThanOrEqual(350);
    expect(words.length).toBeLessThanOrEqual(500);
    const signed = knex("signatures").select("registration_id");
    const unsigned = knex("registrations").where({ state: "confirmed" }).whereNotIn("id", signed);
    expect(conn.all(unsigned.select("id"))).toEqual([]);
  });

  it("paid once each, and one who withdrew has money to come back", async () => {
    const owed = must(await listMoneyToReturn(asked("coordinator"), {}));
    expect(owed).toMatchObject([{ nameUsed: "Amaya", amountCents: 1200, why: "withdrawn" }]);
  });
});

describe("the mail of the demo world", () => {
  it("is all sent, at the moment it was written, so that starting the demo mails none of it", () => {
    const messages = conn.all(knex("messages").select("state", "created_at", "sent_at", "text_body"));
    expect(messages.length).toBeGreaterThan(50);
    for (const { state, created_at: created, sent_at: sent } of messages) {
      expect(state).toBe("sent");
      expect(Date.parse(sent ?? "") - Date.parse(created)).toBeLessThanOrEqual(60 * 60_000);
    }
    expect(messages.filter((one) => /\/link\/(?!\(kept out\))/.test(one.text_body ?? ""))).toEqual([]);
  });
});

describe("the papers of the demo world", () => {
  it("has a roster for each day, in both forms, with nothing that must never be on paper", async () => {
    for (const { slug, state } of allOutings()) {
      if (state === "draft") continue;
      for (const form of ["standard", "large print"] as const) {
        const { paperId } = must(await printRoster(asked("coordinator"), { slug, form }));
        const { facts } = must(await openPaper(asked("coordinator"), { paperId }));
        const known = [facts.basePhone, facts.dateInWords, facts.printedAtInWords];
        expect(checkNeverOnPaper(rosterSheet(facts, form === "standard" ? "table" : "blocks"), known), slug).toEqual([]);
      }
    }
  });

  it("were printed for the days that are over, on the eve of each", async () => {
    const over = allOutings().filter((one) => one.state === "done");
    expect(over).toHaveLength(2);
    for (const { slug } of over) {
      const { papers } = must(await listPapers(asked("coordinator"), { slug }));
      expect(papers.at(-1)).toMatchObject({ by: "Tove Lindqvist", version: 1 });
      expect(papers.at(-1)?.printedAt).toMatch(/^Friday .*, 6 p\.m\.$/);
    }
  });
});

describe("the models of the demo world", () => {
  it("are five, with files on disk whose bytes are what their hashes say", async () => {
    const models = must(await listTeachingModels({ conn, actor: visitor, now }, {}));
    expect(models).toHaveLength(5);
    for (const { slug } of models) {
      const { picture, audio, printable } = must(await showTeachingModel({ conn, actor: visitor, now }, { slug }));
      for (const file of [picture, audio, printable]) {
        const bytes = readFileSync(filePath(filesDir, file.sha256));
        expect(sha256(bytes), slug).toBe(file.sha256);
        expect(bytes.length, slug).toBe(file.bytes);
      }
    }
  });
});

describe("seeding", () => {
  it("refuses, in words and with exit code 1, a database that has people, and leaves it as it was", () => {
    const before = conn.first(knex("people").count({ n: "*" }));
    const { status, stdout, stderr } = run("scripts/seed.ts --accounts-json", databaseFile);
    expect([status, stdout]).toEqual([1, ""]);
    expect(stderr).toMatch(/has 22 people in it already\..*nothing was changed/s);
    expect(conn.first(knex("people").count({ n: "*" }))).toEqual(before);
  });

  it("refuses a database without tables, and production", () => {
    expect(run("scripts/seed.ts", path.join(folder, "empty.sqlite"))).toMatchObject({
      status: 1,
      stderr: expect.stringContaining("Run scripts/migrate.ts"),
    });
    const real = {
      DUNLIN_ENV: "production",
      STRIPE_SECRET_KEY: "sk_live_of_nobody",
      STRIPE_WEBHOOK_SECRET: "whsec_of_nobody",
      SMTP_URL: "smtp://mail.saltgrass.example:25",
      PUBLIC_URL: "https://outings.saltgrass.example",
      MAIL_FROM: "outings@saltgrass.example",
      PROGRAMME_NAME: "Saltgrass Listening Club",
      PROGRAMME_PHONE: "360 555 0142",
    };
    expect(run("scripts/seed.ts", databaseFile, real)).toMatchObject({
      status: 1,
      stderr: expect.stringContaining("never put into production"),
    });
  });

  it("prints the accounts for people when no JSON is asked for, with the password it was given", () => {
    const { status, stdout } = run("scripts/seed.ts", openTestDatabase().raw.name, { DEMO_PASSWORD: "another long shore" });
    expect(status).toBe(0);
    expect(stdout).toContain("Tove Lindqvist, leader\n  tove.lindqvist@saltgrass.example\n  password: another long shore");
  }, 60_000);

  it.each([
    ["a Saturday, a minute before midnight at the club", "2027-07-04T06:59:00.000Z"],
    ["the night summer time begins", "2027-03-14T10:30:00.000Z"],
    ["29 February", "2028-02-29T18:00:00.000Z"],
  ])("works on any day: %s", async (_name, day) => {
    const other = openTestDatabase();
    await seedDemoWorld({ conn: other, filesDir, now: day, password: "saltgrass shore" });
    const actor = actorFor("coordinator", other);
    const { verdict } = must(await checkOutingCover({ conn: other, actor, now: day }, heronSpit));
    const moments = other.all(knex("messages").where("created_at", ">=", day).select("id"));
    expect(verdict.sentence).toBe("Short by one guide.");
    expect(moments).toEqual([]);
  }, 60_000);

  it("leaves nothing behind when a step of the story is refused", async () => {
    const half = openTestDatabase();
    // A site of that name is there already, so the story cannot add it.
    const words = { name: "Heron Spit", landManager: "Nobody", ground: "Sand.", meetingPoint: "The gate." };
    insertSite(half, { ...words, slug: "heron-spit", zone: "America/Los_Angeles" });
    await expect(seedDemoWorld({ conn: half, filesDir, now, password: "saltgrass shore" })).rejects.toThrow(/UNIQUE/);
    expect(half.all(knex("people").select("id"))).toEqual([]);
  });
});
