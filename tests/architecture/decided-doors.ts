import { newId } from "@/lib/shared/ids";
import { typedProfile } from "../support/world";
import { signing, subjects, type DecidedWorld, type Subject } from "./decided-world";

/**
 * Who gets past `allow` of each use case, decided by hand. `input` is something valid to ask in the decided world.
 * `hidden`: to everybody else it is not there at all, so that nothing can be learnt by guessing ids.
 */
export type Decision = {
  to: readonly Subject[];
  input: (given: DecidedWorld) => unknown;
  hidden?: true;
};

const everybody = subjects;
const signedIn = subjects.filter((subject) => !["visitor", "payments", "the clock"].includes(subject));
const staff: Subject[] = ["coordinator", "admin"];
const guardians: Subject[] = ["guardian", "another guardian"];
const leaders: Subject[] = ["leader", "another leader"];
const helpers: Subject[] = ["chaperone", "another chaperone", ...leaders];
/** Of this family. */
export const family: Subject[] = ["guardian"];
/** Of this day. */
const rosterReaders: Subject[] = ["leader", ...staff];

const nothing = () => ({});
const open = ({ outing }: DecidedWorld) => ({ slug: outing.slug });
const draft = (given: DecidedWorld) => ({ slug: given.draft.slug });
const child = ({ childId }: DecidedWorld) => ({ participantId: childId });
const held = ({ heldId }: DecidedWorld) => ({ registrationId: heldId });
const needs = (given: DecidedWorld) => ({ ...typedProfile, ...held(given), guardianStays: "stays" });

const planned = ({ world }: DecidedWorld) => ({
  title: "Owls at Cinder Hill", theme: "Owls", summary: "We wait for owls.", siteId: world.siteId, day: "2027-02-13",
  startTime: "17:00", endTime: "19:00", seats: "6", youngestAge: "8", oldestAge: "14", suggestedFee: "12",
  policyId: world.policyId, meetingText: "At the gate.",
});

export const decisions: Readonly<Record<string, Decision>> = {
  // People
  signUp: { to: everybody, input: () => ({ name: "Ada Moss", email: "ada@example.org", password: "a long enough one" }) },
  signIn: { to: everybody, input: () => ({ email: "rosa.reyes@saltgrass.example", password: "salt and reeds and rain" }) },
  askForSignInLink: { to: everybody, input: () => ({ linkEmail: "rosa.reyes@saltgrass.example" }) },
  // A link's secret is the proof: whoever holds it is let in.
  showMailLink: { to: everybody, input: ({ secrets }) => ({ secret: secrets.signIn }) },
  followMailLink: { to: everybody, input: ({ secrets }) => ({ secret: secrets.signIn }) },
  acceptInvitation: {
    to: everybody,
    input: ({ secrets }) => ({ secret: secrets.invitation, name: "Marcus Hale", password: "a long enough one" }),
  },
  signOut: { to: everybody, input: nothing },
  showMe: { to: signedIn, input: nothing, hidden: true },
  changeReading: { to: signedIn, input: () => ({ readingFormat: "large print", textSizePt: "24" }), hidden: true },
  invite: { to: staff, input: () => ({ name: "Ada Moss", email: "ada@example.org", role: "chaperone" }) },
  takeRole: { to: ["admin"], input: ({ people }) => ({ personId: people.chaperone.personId, role: "chaperone" }) },
  becomeGuardian: { to: signedIn, input: nothing },
  listPeople: { to: staff, input: nothing },

  // Families
  addChild: {
    to: guardians,
    input: () => ({ nameUsed: "Bo", legalName: "Bo Reyes", birthDate: "2016-02-29", requestId: newId() }),
  },
  listChildren: { to: guardians, input: nothing },
  showChild: { to: family, input: child, hidden: true },
  writeProfile: { to: family, input: (given) => ({ ...typedProfile, ...child(given) }), hidden: true },

  // Outings
  listOutings: { to: everybody, input: () => ({ from: "2027-01-01", to: "2027-02-01" }) },
  showOuting: { to: staff, input: draft, hidden: true },
  showOutingCalendar: { to: everybody, input: open },
  listDesk: { to: staff, input: nothing },
  showOutingDesk: { to: staff, input: open },
  showOutingForm: { to: staff, input: draft },
  listAllSites: { to: staff, input: nothing },
  addSite: {
    to: staff,
    input: () => ({ name: "Cinder Hill", landManager: "Saltgrass County", zone: "America/Los_Angeles", ground: "Cinders.", meetingPoint: "The gate." }),
  },
  planOuting: { to: staff, input: (given) => ({ ...planned(given), requestId: newId() }) },
  changeOuting: { to: staff, input: (given) => ({ ...planned(given), ...open(given), edition: "1" }) },
  publishOuting: { to: staff, input: draft },
  closeOuting: { to: staff, input: open },
  callOffOuting: { to: staff, input: (given) => ({ ...open(given), because: "A storm is coming." }) },

  // Registrations, waiver and fee
  registerChild: {
    to: family,
    input: ({ outing, newcomerId }) => ({ slug: outing.slug, participantId: newcomerId }),
    hidden: true,
  },
  showRegistration: { to: family, input: held, hidden: true },
  listMyRegistrations: { to: guardians, input: nothing },
  confirmNeeds: { to: family, input: needs, hidden: true },
  withdraw: { to: family, input: (given) => ({ ...held(given), sure: "yes" }), hidden: true },
  listOutingPeople: { to: staff, input: open },
  releaseLapsedHolds: { to: ["the clock"], input: nothing },
  showWaiver: { to: everybody, input: nothing },
  signWaiver: { to: family, input: ({ world, heldId }) => signing(world, heldId), hidden: true },
  chooseFee: { to: family, input: (given) => ({ ...held(given), choice: "suggested" }), hidden: true },
  showCheckout: { to: family, input: held, hidden: true },
  attachCheckout: {
    to: ["payments"],
    input: ({ paymentId }) => ({ paymentId, sessionId: "cs_other", url: "http://127.0.0.1:1/other" }),
  },
  takeCheckoutEvent: {
    to: ["payments"],
    input: () => ({
      eventId: "evt_1", eventType: "checkout.session.completed", sessionId: "cs_decided", paymentIntentId: "pi_1", amountCents: 1200, currency: "usd",
    }),
  },
  listMoneyToReturn: { to: staff, input: nothing },

  returnPayment: { to: staff, input: ({ returnableId }) => ({ paymentId: returnableId }) },

  // Helpers
  askToHelp: {
    to: staff,
    input: (given) => ({ ...open(given), personIds: [given.people["another chaperone"].personId], task: "chaperone" }),
  },
  listOutingHelpers: { to: staff, input: open },
  sendMeetingPoint: { to: staff, input: open },
  changeClearance: { to: staff, input: ({ people }) => ({ personId: people.chaperone.personId, clearedUntil: "2028-01-31" }) },
  changeAbilities: { to: helpers, input: () => ({ isAdult: "yes", guidesLeft: "yes" }) },
  listMyRequests: { to: helpers, input: nothing },
  answerRequest: { to: ["chaperone"], input: ({ answerId }) => ({ answerId, answer: "maybe" }), hidden: true },
  answerByLink: { to: everybody, input: ({ secrets }) => ({ secret: secrets.answer, answer: "yes" }) },
  showRequestByLink: { to: everybody, input: ({ secrets }) => ({ secret: secrets.answer }) },

  // Cover and roster
  checkOutingCover: { to: staff, input: open },
  pairPeople: {
    to: staff,
    input: ({ outing, confirmedId, people }) => ({ slug: outing.slug, pair: { [confirmedId]: people.chaperone.personId } }),
  },
  listDays: { to: leaders, input: nothing },
  listPapers: { to: rosterReaders, input: open, hidden: true },
  printRoster: { to: rosterReaders, input: (given) => ({ ...open(given), form: "large print", textSizePt: "20" }), hidden: true },
  openContacts: { to: rosterReaders, input: open, hidden: true },
  openPaper: { to: rosterReaders, input: ({ paperId }) => ({ paperId }), hidden: true },

  // Mail, models and the site itself
  listDeliveries: { to: staff, input: nothing },
  retryDeliveries: { to: staff, input: nothing },
  chooseLook: { to: everybody, input: () => ({ theme: "dark", text: "125" }) },
  checkHealth: { to: everybody, input: nothing },
  listTeachingModels: { to: everybody, input: nothing },
  showTeachingModel: { to: everybody, input: ({ modelSlug }) => ({ slug: modelSlug }) },
  showModelFile: { to: everybody, input: ({ modelSlug }) => ({ slug: modelSlug, part: "audio" }) },
};
