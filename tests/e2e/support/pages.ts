import type { Page } from "@playwright/test";
import type { Role, SignedIn } from "@/lib/shared/actor";
import { makeMailLink } from "@/lib/people/mail-link-store";
import { listAnswersBy } from "@/lib/helpers/helper-store";
import { databaseOf, demoPerson, somebody } from "./people";
import { dayAhead, family, helper, plannedOuting, registered } from "./prepare";

/** A page of the program in one of the states people meet it in. */
export type Visit = { name: string; path: () => Promise<string> | string; as?: Role | (() => SignedIn); act?: (page: Page) => Promise<void> };

const spit = "low-tide-at-heron-spit";
const fixed = (path: string) => () => path;

const publicPages: Visit[] = [
  { name: "the first page", path: fixed("/") },
  { name: "the outings", path: fixed("/outings") },
  { name: "the outings with the month grid", path: fixed("/outings"), act: showGrid },
  { name: "an outing with places left", path: fixed(`/outings/${spit}`) },
  { name: "an outing that is full", path: fixed("/outings/frogs-at-alder-bog") },
  { name: "an outing that is called off", path: fixed("/outings/wind-in-the-wires-at-cinder-hill") },
  { name: "the models", path: fixed("/models") },
  { name: "a model", path: fixed("/models/gallop") },
  { name: "the waiver", path: fixed("/waiver") },
  { name: "signing in", path: fixed("/sign-in") },
  { name: "signing in with an error", path: fixed("/sign-in"), act: press("Sign in") },
  { name: "signing up", path: fixed("/sign-up") },
  { name: "signing up with errors", path: fixed("/sign-up"), act: press("Make the account") },
  { name: "the look", path: fixed("/look") },
  { name: "a page that is not there", path: fixed("/nowhere") },
  { name: "a link that confirms an address", path: () => linkFor("confirm-email") },
  { name: "an invitation", path: () => linkFor("invitation") },
  { name: "a link that is too old", path: () => linkFor("sign-in", -1) },
  { name: "a request answered by its link", path: answerLink },
];

let guardian: SignedIn | undefined;
const ourGuardian = () => (guardian ??= somebody("Runa Aske", "guardian"));

const familyPages: Visit[] = [
  { name: "an account", path: fixed("/account"), as: "guardian" },
  { name: "a family", path: fixed("/family"), as: "guardian" },
  { name: "a family with nobody in it", path: fixed("/family"), as: ourGuardian },
  { name: "adding a child", path: fixed("/family/children/new"), as: "guardian" },
  { name: "adding a child with errors", path: fixed("/family/children/new"), as: "guardian", act: press("Add") },
  { name: "registering a child", path: fixed("/outings/ropes-and-hulls-at-old-ferry-landing/register"), as: "guardian" },
];

const helperPages: Visit[] = [
  { name: "helping", path: fixed("/helping"), as: "chaperone" },
  { name: "the days of a leader", path: fixed("/field"), as: "leader" },
  { name: "whom a leader calls", path: fixed(`/field/${spit}/contacts`), as: "leader" },
  { name: "a day of a leader", path: fixed(`/field/${spit}`), as: "leader" },
];

const deskPages: Visit[] = [
  { name: "the desk", path: fixed("/desk"), as: "coordinator" },
  { name: "planning an outing", path: fixed("/desk/outings/new"), as: "coordinator" },
  { name: "planning an outing with errors", path: fixed("/desk/outings/new"), as: "coordinator", act: press("Save as a draft") },
  { name: "an outing at the desk", path: fixed(`/desk/outings/${spit}`), as: "coordinator" },
  { name: "the adults of an outing", path: fixed(`/desk/outings/${spit}/helpers`), as: "coordinator" },
  { name: "the cover of an outing", path: fixed(`/desk/outings/${spit}/cover`), as: "coordinator" },
  { name: "the papers of an outing", path: fixed(`/desk/outings/${spit}/papers`), as: "coordinator" },
  { name: "whom to call, at the desk", path: fixed(`/desk/outings/${spit}/contacts`), as: "coordinator" },
  { name: "changing an outing", path: fixed(`/desk/outings/${spit}/edit`), as: "coordinator" },
  { name: "the mails", path: fixed("/desk/messages"), as: "coordinator" },
  { name: "the sites", path: fixed("/desk/sites"), as: "coordinator" },
  { name: "the people", path: fixed("/desk/people"), as: "admin" },
];

export const visits: readonly Visit[] = [...publicPages, ...familyPages, ...helperPages, ...deskPages];

/** The rooms of one registration, each in the state in which it asks the most. */
export const registrationVisits = [
  { name: "a registration with a seat held", until: "held", room: "" },
  { name: "what the child needs", until: "held", room: "/needs" },
  { name: "what the child needs, with errors", until: "held", room: "/needs", act: press("Send this") },
  { name: "signing the waiver", until: "needs told", room: "/waiver" },
  { name: "the fee", until: "signed", room: "/fee" },
  { name: "back from the payment page", until: "signed", room: "/fee/thank-you" },
  { name: "a registration that is confirmed", until: "confirmed", room: "" },
] as const;

/** A family's registration as far as `until`, and the guardian who may open it. */
export async function registrationFor(until: "held" | "needs told" | "signed" | "confirmed"): Promise<{ path: string; guardian: SignedIn; participantId: string }> {
  const ours = await family();
  const id = await registered(ours, await plannedOuting(), until);
  return { path: `/family/registrations/${id}`, guardian: ours.guardian, participantId: ours.participantId };
}

export function personFor({ as }: Visit): SignedIn | null {
  if (as === undefined) return null;
  return typeof as === "string" ? demoPerson(as) : as();
}

function press(name: string) {
  return async (page: Page) => {
    await page.getByRole("button", { name, exact: true }).click();
    await page.getByRole("group", { name: "There is a problem" }).waitFor();
  };
}

async function showGrid(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Show as a month grid" }).click();
  await page.getByRole("grid").waitFor();
  await page.getByRole("status").filter({ hasText: "this month" }).waitFor();
}

function linkFor(purpose: "confirm-email" | "invitation" | "sign-in", days = 1): string {
  const { personId } = somebody("Eva Linde", purpose === "invitation" ? "chaperone" : "guardian");
  const at = (offset: number) => new Date(Date.now() + offset * 86_400_000).toISOString();
  return `/link/${makeMailLink(databaseOf(), { purpose, personId, madeAt: at(-2), expiresAt: at(days) })}`;
}

async function answerLink(): Promise<string> {
  const { personId } = await helper(await plannedOuting());
  const conn = databaseOf();
  const [request] = listAnswersBy(conn, personId);
  const at = new Date().toISOString();
  const link = { purpose: "answer", personId, aboutId: request?.id ?? "", madeAt: at, expiresAt: `${dayAhead(60)}T23:00:00.000Z` } as const;
  return `/link/${makeMailLink(conn, link)}`;
}
