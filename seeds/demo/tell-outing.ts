import { pairPeople } from "@/lib/cover-board/pair-people";
import { answerRequest } from "@/lib/helpers/answer-request";
import { askToHelp } from "@/lib/helpers/ask-to-help";
import { listAnswersOf } from "@/lib/helpers/helper-store";
import { sendMeetingPoint } from "@/lib/helpers/send-meeting-point";
import { closeOuting } from "@/lib/outings/close-outing";
import { findOuting, setOutingState } from "@/lib/outings/outing-store";
import { planOuting } from "@/lib/outings/plan-outing";
import { publishOuting } from "@/lib/outings/publish-outing";
import { findPersonByEmail } from "@/lib/people/person-store";
import { callOffOuting } from "@/lib/registrations/call-off-outing";
import { printRoster } from "@/lib/roster/print-roster";
import type { SignedIn } from "@/lib/shared/actor";
import { dayOf, instantAt, minutesLater, plainDayInWords } from "@/lib/shared/dates";
import { env } from "@/lib/shared/env";
import { demoEmail, type HelperName } from "./adults";
import { meetingText, type MeetingDay } from "./meeting-texts";
import type { DemoOuting } from "./outings";
import { giveSeatBack, joinWaitingList, registerWholly } from "./register";
import type { SeededChild } from "./seed-families";
import type { SiteSlug } from "./sites";
import { daysLater, must, sendPost, type Story } from "./story";

/** All that is there before the first outing is planned. */
export type World = {
  coordinator: SignedIn;
  policyId: string;
  sites: Record<SiteSlug, string>;
  models: ReadonlyMap<string, string>;
  helpers: ReadonlyMap<HelperName, SignedIn>;
  children: ReadonlyMap<string, SeededChild>;
};

/** One outing from its first plan to where it stands on the day of seeding. */
export async function tellOuting(story: Story, world: World, outing: DemoOuting): Promise<void> {
  const slug = await plan(story, world, outing);
  if (outing.ending.kind === "draft") return;
  const now = story.daysAgo(outing.plannedDaysAgo, "16:40");
  must(await publishOuting({ conn: story.conn, actor: world.coordinator, now }, { slug }));
  const registrations = await register(story, world, { slug, outing });
  await askHelpers(story, world, { slug, outing });
  await pair(story, world, { slug, outing, registrations });
  await end(story, world, { slug, outing });
}

async function plan(story: Story, world: World, outing: DemoOuting): Promise<string> {
  const { title, theme, summary, site, startTime, endTime, seats, youngestAge, oldestAge, suggestedFee } = outing;
  const now = story.daysAgo(outing.plannedDaysAgo, "15:05");
  const day = story.saturday(outing.weeks);
  const { slug } = must(
    await planOuting(
      { conn: story.conn, actor: world.coordinator, now },
      {
        title, theme, summary, day, startTime, endTime, seats, youngestAge, oldestAge, suggestedFee,
        siteId: world.sites[site],
        policyId: world.policyId,
        meetingText: meetingText(site, meetingDayOf(story, outing)),
        modelIds: outing.models.map((model) => known(world.models, model)),
        requestId: `demo-outing-${outing.weeks}`,
      },
    ),
  );
  return slug;
}

function meetingDayOf(story: Story, outing: DemoOuting): MeetingDay {
  const { title, startTime, endTime, greeter, atTheStop, plannedDaysAgo } = outing;
  return {
    title, startTime, endTime, greeter, atTheStop,
    day: story.saturday(outing.weeks),
    zone: story.zone,
    phone: env().PROGRAMME_PHONE,
    checkedOnInWords: plainDayInWords(dayOf(story.daysAgo(plannedDaysAgo + 1, "12:00"), story.zone)),
  };
}

type Told = { slug: string; outing: DemoOuting };

/** The registrations by child. Those on one day come an hour apart, so that the order is the story's. */
async function register(story: Story, world: World, { slug, outing }: Told): Promise<ReadonlyMap<string, string>> {
  const registrations = new Map<string, string>();
  for (const [index, told] of outing.registrations.entries()) {
    const at = minutesLater(story.daysAgo(told.daysAgo, "17:30"), 60 * (index % 4));
    const going = { slug, child: known(world.children, told.child), at };
    registrations.set(told.child, await registerWholly(story, going, told));
  }
  for (const { child, withdrawnDaysAgo } of outing.registrations) {
    if (withdrawnDaysAgo === undefined) continue;
    const leaving = { registrationId: known(registrations, child), child: known(world.children, child) };
    await giveSeatBack(story, { ...leaving, at: story.daysAgo(withdrawnDaysAgo, "08:10") });
  }
  for (const told of outing.waiting) {
    const at = story.daysAgo(told.daysAgo, "20:15");
    await joinWaitingList(story, { slug, child: known(world.children, told.child), at });
  }
  return registrations;
}

async function askHelpers(story: Story, world: World, { slug, outing }: Told): Promise<void> {
  const { conn } = story;
  const now = story.daysAgo(outing.askedDaysAgo, "09:10");
  for (const { who } of outing.helpers) {
    const { personId, roles } = known(world.helpers, who);
    const task = roles.includes("leader") ? "leader" : "chaperone";
    must(await askToHelp({ conn, actor: world.coordinator, now }, { slug, personIds: [personId], task }));
  }
  await sendPost(story, now);
  const requests = listAnswersOf(conn, outingIdOf(story, slug, now));
  for (const [index, { who, answer }] of outing.helpers.entries()) {
    const actor = known(world.helpers, who);
    const request = requests.find((one) => one.personId === actor.personId);
    if (!request || answer === null) continue;
    must(await answerRequest({ conn, actor, now: minutesLater(now, 95 * (index + 1)) }, { answerId: request.id, answer }));
  }
}

type Registered = Told & { registrations: ReadonlyMap<string, string> };

async function pair(story: Story, world: World, { slug, outing, registrations }: Registered): Promise<void> {
  const ids = Object.entries(outing.pairs).map(([child, adult]) => {
    return [known(registrations, child), personIdOf(story, adult)];
  });
  if (ids.length === 0) return;
  const last = Math.min(outing.askedDaysAgo, ...outing.registrations.map((one) => one.daysAgo));
  const now = story.daysAgo(last - 1, "14:30");
  must(await pairPeople({ conn: story.conn, actor: world.coordinator, now }, { slug, pair: Object.fromEntries(ids) }));
}

async function end(story: Story, world: World, { slug, outing }: Told): Promise<void> {
  const { conn } = story;
  const actor = world.coordinator;
  const { ending } = outing;
  if (ending.kind === "closed") {
    must(await closeOuting({ conn, actor, now: story.daysAgo(ending.daysAgo, "12:00") }, { slug }));
  }
  if (ending.kind === "called off") {
    const now = story.daysAgo(ending.daysAgo, "12:20");
    must(await callOffOuting({ conn, actor, now }, { slug, because: ending.because }));
    await sendPost(story, now);
  }
  if (ending.kind === "done") await runTheDay(story, world, { slug, outing });
}

/** The last days before an outing that is over now: where to meet, the roster on paper, and the day itself. */
async function runTheDay(story: Story, world: World, { slug, outing }: Told): Promise<void> {
  const { conn } = story;
  const day = story.saturday(outing.weeks);
  const threeDaysBefore = instantAt(daysLater(day, -3), "10:00", story.zone);
  must(await sendMeetingPoint({ conn, actor: world.coordinator, now: threeDaysBefore }, { slug }));
  await sendPost(story, threeDaysBefore);
  const eve = instantAt(daysLater(day, -1), "18:00", story.zone);
  const leader = known(world.helpers, "Tove Lindqvist");
  must(await printRoster({ conn, actor: leader, now: eve }, { slug, form: "standard" }));
  const dayAfter = instantAt(daysLater(day, 1), "11:00", story.zone);
  setOutingState(conn, dayAfter, outingIdOf(story, slug, dayAfter), "done");
}

function outingIdOf(story: Story, slug: string, now: string): string {
  const outing = findOuting(story.conn, { slug }, now);
  if (!outing) throw new Error(`There is no outing ${slug}.`);
  return outing.id;
}

function personIdOf(story: Story, name: string): string {
  const person = findPersonByEmail(story.conn, demoEmail(name));
  if (!person) throw new Error(`Nobody in the demo world is called ${name}.`);
  return person.id;
}

function known<Key, Value>(map: ReadonlyMap<Key, Value>, key: Key): Value {
  const value = map.get(key);
  if (value === undefined) throw new Error(`The demo world has no ${String(key)}.`);
  return value;
}
