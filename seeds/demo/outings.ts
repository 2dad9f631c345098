import type { HelperName } from "./adults";
import type { SiteSlug } from "./sites";

export type DemoRegistration = {
  child: string;
  daysAgo: number;
  fee?: "no fee" | `${number}`;
  guardianStays?: "stays" | "helps";
  thisTime?: string;
  withdrawnDaysAgo?: number;
};

export type DemoRequest = { who: HelperName; answer: "yes" | "maybe" | "no" | null };

export type DemoOuting = {
  title: string;
  theme: string;
  summary: string;
  site: SiteSlug;
  /** Weeks from the first Saturday that has not passed. */
  weeks: number;
  startTime: string;
  endTime: string;
  seats: number;
  youngestAge: number;
  oldestAge: number;
  suggestedFee: string;
  models: readonly string[];
  /** Who calls from the meeting point, and who waits at the stop: two of those who come. */
  greeter: string;
  atTheStop: string;
  plannedDaysAgo: number;
  /** In the order they came: the first has count-off number 1. */
  registrations: readonly DemoRegistration[];
  waiting: readonly { child: string; daysAgo: number }[];
  askedDaysAgo: number;
  helpers: readonly DemoRequest[];
  pairs: Readonly<Record<string, string>>;
  ending:
    | { kind: "draft" }
    | { kind: "open" }
    | { kind: "closed"; daysAgo: number }
    | { kind: "called off"; daysAgo: number; because: string }
    | { kind: "done" };
};

const firstSounds: DemoOuting = {
  title: "First sounds at Old Ferry Landing",
  theme: "Hums and hisses",
  summary:
    "The first outing of the season. We sat under the roof of the ferry house and sorted what we heard into hums and " +
    "hisses: engines, gulls, wind in the ropes. Each of us recorded one of both.",
  site: "old-ferry-landing",
  weeks: -9,
  startTime: "10:00",
  endTime: "12:00",
  seats: 8,
  youngestAge: 6,
  oldestAge: 18,
  suggestedFee: "12",
  models: ["hum-and-hiss"],
  greeter: "Ines",
  atTheStop: "Hollis",
  plannedDaysAgo: 94,
  registrations: [
    { child: "José", daysAgo: 90 },
    { child: "Ada", daysAgo: 90 },
    { child: "Łucja", daysAgo: 88, fee: "no fee" },
    { child: "Chidi", daysAgo: 84 },
    { child: "Uğur", daysAgo: 80, fee: "20" },
    { child: "Zoë", daysAgo: 71 },
  ],
  waiting: [],
  askedDaysAgo: 86,
  helpers: [
    { who: "Tove Lindqvist", answer: "yes" },
    { who: "Ines Carrow", answer: "yes" },
    { who: "Jonah Pell", answer: "no" },
    { who: "Hollis Grady", answer: "yes" },
  ],
  pairs: {
    José: "Tove Lindqvist",
    Ada: "Ines Carrow",
    Łucja: "Tove Lindqvist",
    Chidi: "Hollis Grady",
    Uğur: "Tove Lindqvist",
    Zoë: "Hollis Grady",
  },
  ending: { kind: "done" },
};

const gullsAndEngines: DemoOuting = {
  title: "Gulls and engines at Heron Spit",
  theme: "Sounds that grow and fade",
  summary:
    "A morning by the water about sounds that come, swell and go: boats that pass, gulls that rise, waves that break. " +
    "We held the model of a breaking wave while we listened to the real ones.",
  site: "heron-spit",
  weeks: -5,
  startTime: "09:30",
  endTime: "12:00",
  seats: 8,
  youngestAge: 6,
  oldestAge: 16,
  suggestedFee: "12",
  models: ["build-and-break", "gallop"],
  greeter: "Bea",
  atTheStop: "Ines",
  plannedDaysAgo: 66,
  registrations: [
    { child: "Wren", daysAgo: 62, fee: "no fee" },
    { child: "Nguyễn Ánh", daysAgo: 60 },
    { child: "Bảo", daysAgo: 60 },
    { child: "Ada", daysAgo: 55 },
    { child: "Keʻala", daysAgo: 48 },
  ],
  waiting: [],
  askedDaysAgo: 58,
  helpers: [
    { who: "Tove Lindqvist", answer: "yes" },
    { who: "Ines Carrow", answer: "yes" },
    { who: "Jonah Pell", answer: "yes" },
    { who: "Bea Castellano", answer: "yes" },
    { who: "Priya Raman", answer: "no" },
  ],
  pairs: {
    Wren: "Jonah Pell",
    "Nguyễn Ánh": "Ines Carrow",
    Bảo: "Bea Castellano",
    Ada: "Tove Lindqvist",
    Keʻala: "Tove Lindqvist",
  },
  ending: { kind: "done" },
};

/** Short by one guide: three need an arm all the time, two who may guide are coming. */
const lowTide: DemoOuting = {
  title: "Low tide at Heron Spit",
  theme: "What the shore says when the water is out",
  summary:
    "We move along the spit while the water is out and listen to what is left behind: shells that click, sand that sighs, " +
    "birds that feed. You may dig, touch and record. We stop often, and there is a bench half way. Bring a hat, boots that " +
    "may get wet, and something to drink.",
  site: "heron-spit",
  weeks: 5,
  startTime: "09:00",
  endTime: "12:00",
  seats: 12,
  youngestAge: 8,
  oldestAge: 14,
  suggestedFee: "12",
  models: ["hum-and-hiss", "gallop"],
  greeter: "Ines",
  atTheStop: "Bea",
  plannedDaysAgo: 28,
  registrations: [
    { child: "Ada", daysAgo: 26 },
    { child: "Uğur", daysAgo: 26, fee: "20" },
    { child: "Bram", daysAgo: 25 },
    { child: "Łucja", daysAgo: 23, fee: "no fee" },
    { child: "Wren", daysAgo: 22, fee: "no fee" },
    { child: "Nguyễn Ánh", daysAgo: 20 },
    { child: "Amaya", daysAgo: 18 },
    { child: "Keʻala", daysAgo: 16, thisTime: "Moss has a new harness. Keʻala would like to go ahead for a while." },
    { child: "Bảo", daysAgo: 15 },
    { child: "Леся", daysAgo: 11, guardianStays: "stays", thisTime: "We may have to leave at eleven." },
    { child: "Ελένη", daysAgo: 7, fee: "5" },
  ],
  waiting: [],
  askedDaysAgo: 21,
  helpers: [
    { who: "Tove Lindqvist", answer: "yes" },
    { who: "Ines Carrow", answer: "yes" },
    { who: "Jonah Pell", answer: "yes" },
    { who: "Marguerite Oyelaran", answer: "yes" },
    { who: "Bea Castellano", answer: "yes" },
    { who: "Hollis Grady", answer: "yes" },
    { who: "Kit Sørensen", answer: "yes" },
    { who: "Priya Raman", answer: "maybe" },
    { who: "Noor Haddad", answer: null },
    { who: "Des Whitaker", answer: "no" },
  ],
  pairs: {
    Ada: "Bea Castellano",
    Uğur: "Tove Lindqvist",
    Bram: "Ines Carrow",
    Łucja: "Tove Lindqvist",
    Wren: "Jonah Pell",
    "Nguyễn Ánh": "Marguerite Oyelaran",
    Keʻala: "Tove Lindqvist",
    Bảo: "Bea Castellano",
    Леся: "Nadia Bondar",
    Ελένη: "Tove Lindqvist",
  },
  ending: { kind: "open" },
};

const windInTheWires: DemoOuting = {
  title: "Wind in the wires at Cinder Hill",
  theme: "Sounds that build and break",
  summary:
    "On the hill the wind plays the old tram wires. We listen to how a gust builds, holds and breaks, and make the same " +
    "shape with our voices. The path is one long gentle slope with many benches.",
  site: "cinder-hill",
  weeks: 6,
  startTime: "13:00",
  endTime: "15:30",
  seats: 8,
  youngestAge: 8,
  oldestAge: 18,
  suggestedFee: "10",
  models: ["build-and-break"],
  greeter: "Jonah",
  atTheStop: "Tove",
  plannedDaysAgo: 27,
  registrations: [
    { child: "Łucja", daysAgo: 21, fee: "no fee" },
    { child: "Staś", daysAgo: 21, fee: "no fee" },
    { child: "Uğur", daysAgo: 12, fee: "no fee" },
  ],
  waiting: [],
  askedDaysAgo: 19,
  helpers: [
    { who: "Tove Lindqvist", answer: "yes" },
    { who: "Jonah Pell", answer: "yes" },
    { who: "Bea Castellano", answer: "maybe" },
  ],
  pairs: {},
  ending: {
    kind: "called off",
    daysAgo: 2,
    because: "A landslip has closed Quarry Road, and the forest reserve does not expect to open it before our date.",
  },
};

const frogs: DemoOuting = {
  title: "Frogs at Alder Bog",
  theme: "Calls and answers at dusk",
  summary:
    "Toward evening the bog begins to talk. We sit on the boardwalk and work out who calls and who answers, near and " +
    "far. The boardwalk is level, with a rail on the right all the way. Dress warmly: we sit still for a long time.",
  site: "alder-bog-boardwalk",
  weeks: 7,
  startTime: "15:00",
  endTime: "18:00",
  seats: 5,
  youngestAge: 8,
  oldestAge: 16,
  suggestedFee: "12",
  models: ["question-and-answer", "build-and-break"],
  greeter: "Bea",
  atTheStop: "Marguerite",
  plannedDaysAgo: 26,
  registrations: [
    { child: "Zoë", daysAgo: 24 },
    { child: "Bram", daysAgo: 24 },
    { child: "Chidi", daysAgo: 23, fee: "15" },
    { child: "Łucja", daysAgo: 20, fee: "no fee" },
    { child: "Nguyễn Ánh", daysAgo: 19 },
  ],
  waiting: [
    { child: "Siân", daysAgo: 14 },
    { child: "José", daysAgo: 9 },
  ],
  askedDaysAgo: 17,
  helpers: [
    { who: "Tove Lindqvist", answer: "yes" },
    { who: "Ines Carrow", answer: "yes" },
    { who: "Marguerite Oyelaran", answer: "yes" },
    { who: "Bea Castellano", answer: "yes" },
    { who: "Noor Haddad", answer: null },
  ],
  pairs: {
    Zoë: "Bea Castellano",
    Bram: "Ines Carrow",
    Chidi: "Tove Lindqvist",
    Łucja: "Tove Lindqvist",
    "Nguyễn Ánh": "Marguerite Oyelaran",
  },
  ending: { kind: "open" },
};

const echoes: DemoOuting = {
  title: "Echoes under the pier at Old Ferry Landing",
  theme: "Near, far and around the corner",
  summary:
    "Under the old pier every clap comes back. We find out by ear how far the wall is, and what a corner does to a voice. " +
    "The heritage board needs our names long before the day, so registration closed early.",
  site: "old-ferry-landing",
  weeks: 8,
  startTime: "10:00",
  endTime: "12:00",
  seats: 6,
  youngestAge: 10,
  oldestAge: 18,
  suggestedFee: "8",
  models: ["gallop", "question-and-answer"],
  greeter: "Tove",
  atTheStop: "Ines",
  plannedDaysAgo: 25,
  registrations: [
    { child: "Ελένη", daysAgo: 22 },
    { child: "Keʻala", daysAgo: 17, fee: "no fee" },
    { child: "Chidi", daysAgo: 13 },
    { child: "Bảo", daysAgo: 10 },
  ],
  waiting: [],
  askedDaysAgo: 15,
  helpers: [
    { who: "Tove Lindqvist", answer: "yes" },
    { who: "Ines Carrow", answer: "yes" },
    { who: "Des Whitaker", answer: null },
  ],
  pairs: { Ελένη: "Tove Lindqvist", Keʻala: "Tove Lindqvist", Chidi: "Tove Lindqvist", Bảo: "Ines Carrow" },
  ending: { kind: "closed", daysAgo: 3 },
};

const ropesAndHulls: DemoOuting = {
  title: "Ropes and hulls at Old Ferry Landing",
  theme: "High, low and the steps between",
  summary:
    "Ropes creak high, hulls knock low. We climb from one to the other by ear and by hand, and build a tune from what the " +
    "harbor gives us. Everything is paved and under a roof, so this is a good first outing for any age.",
  site: "old-ferry-landing",
  weeks: 10,
  startTime: "10:00",
  endTime: "13:00",
  seats: 12,
  youngestAge: 5,
  oldestAge: 18,
  suggestedFee: "12",
  models: ["step-and-leap"],
  greeter: "Bea",
  atTheStop: "Jonah",
  plannedDaysAgo: 20,
  registrations: [
    { child: "Siân", daysAgo: 13 },
    { child: "Amaya", daysAgo: 12, withdrawnDaysAgo: 5 },
    { child: "Uğur", daysAgo: 8 },
    { child: "Wren", daysAgo: 6, fee: "no fee" },
  ],
  waiting: [],
  askedDaysAgo: 10,
  helpers: [
    { who: "Tove Lindqvist", answer: "yes" },
    { who: "Jonah Pell", answer: "yes" },
    { who: "Bea Castellano", answer: "yes" },
    { who: "Ines Carrow", answer: null },
    { who: "Priya Raman", answer: null },
  ],
  pairs: { Siân: "Bea Castellano", Uğur: "Tove Lindqvist", Wren: "Jonah Pell" },
  ending: { kind: "open" },
};

const hillDraft: DemoOuting = {
  title: "Owls and answers at Cinder Hill",
  theme: "Who asks, who answers",
  summary:
    "Still being planned: an evening on the hill, if Quarry Road is open again and the reserve lets us stay until dark.",
  site: "cinder-hill",
  weeks: 14,
  startTime: "16:00",
  endTime: "18:30",
  seats: 8,
  youngestAge: 10,
  oldestAge: 18,
  suggestedFee: "12",
  models: ["question-and-answer"],
  greeter: "Ines",
  atTheStop: "Bea",
  plannedDaysAgo: 3,
  registrations: [],
  waiting: [],
  askedDaysAgo: 0,
  helpers: [],
  pairs: {},
  ending: { kind: "draft" },
};

export const demoOutings: readonly DemoOuting[] = [
  firstSounds,
  gullsAndEngines,
  lowTide,
  windInTheWires,
  frogs,
  echoes,
  ropesAndHulls,
  hillDraft,
];
