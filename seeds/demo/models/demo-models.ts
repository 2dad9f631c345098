import type { SoundEvent } from "./model-events";
import type { ModelScale } from "./model-scale";
import { scaleFrom } from "./model-scale";

/** One sentence of a finger tour, and the place on the model where it takes the hand, if it names one. */
export type TourStep = {
  say: string;
  at?: {
    /** Name of the event in model.events. */
    event: string;
    edge: "start" | "crest" | "end";
    /** From the left edge. */
    xMm: number;
    /** From the lower edge. */
    yMm: number;
  };
};

export type DemoModel = {
  slug: string;
  title: string;
  concept: string;
  forWhom: string;
  level: "first model" | "second model" | "after two or three models";
  description: string;
  fingerTour: readonly TourStep[];
  listenFor: readonly string[];
  scale: ModelScale;
  events: readonly SoundEvent[];
  copies: number;
  making: {
    layerHeightMm: number;
    material: string;
    orientation: string;
    cutCorner: string;
    notes: readonly string[];
  };
  safety: string;
  audio: { durationSeconds: number; inWords: string };
  pictureAlt: string;
  version: string;
  status: "draft" | "in test" | "approved" | "withdrawn" | "superseded";
};

const MAKING: DemoModel["making"] = {
  layerHeightMm: 0.15,
  material: "Matt PLA in one light colour",
  orientation: "Print it lying on its back, relief upward, with no supports.",
  cutCorner:
    "The lower right corner is cut away, 12 millimetres along each edge; when the cut is by your right thumb, it is the right way up.",
  notes: [
    "Let the plate cool before you lift it, so that it stays flat.",
    "Rub the edges with fine sandpaper until nothing catches on a sleeve.",
    "Keep braille labels on a separate strip; letters in the print cannot be resized or translated.",
  ],
};

const SAFETY =
  "No loose parts and no sharp peaks. It softens in a hot car: carry it in its pouch, out of the sun. Wipe it with a damp cloth after each outing.";

const humAndHissScale = scaleFrom({
  widthMm: 200,
  heightMm: 120,
  baseMm: 2,
  reliefMmMax: 3,
  cutCornerMm: 12,
  durationSeconds: 8,
  lowestHz: 100,
  highestHz: 6400,
  axis: "log",
});

const hum = { kind: "tone", lowHz: 282.84, highHz: 282.84, loudness: 1, envelope: "steady" } as const;
const hiss = { kind: "noise", lowHz: 1600, highHz: 4525.5, loudness: 0.75, envelope: "steady" } as const;

const humAndHiss: DemoModel = {
  slug: "hum-and-hiss",
  title: "Hum and hiss",
  concept: "A hum has one pitch and feels like a smooth line; a hiss has many at once and feels like rough ground.",
  forWhom: "Ages 6 and up, alone or in pairs",
  level: "first model",
  description:
    "A thin plate, 200 millimetres wide and 120 high, about as wide as two hands side by side, with its lower right corner cut away. " +
    "There are four raised shapes on it. At the left, low down, lies one smooth straight ridge as thick as a pencil. " +
    "In the middle, near the top, is a broad patch covered in small round bumps, like a gravel path. " +
    "At the right both come back, one above the other: the rough patch at the top, the smooth ridge below it. " +
    "Flat, empty plate lies between them and all around. " +
    "The ridge is a hum, and it is low on the plate because it is a low sound. " +
    "The patch is a hiss, and it is high on the plate because it is a high one.",
  fingerTour: [
    { say: "Hold the plate with the cut corner by your right thumb." },
    { say: "It is 200 millimetres wide, about two hands, and 120 millimetres high." },
    { say: "The left edge is the start of the sound, and the right edge is its end, 8 seconds later." },
    { say: "Rest both hands flat and feel how much is empty." },
    {
      say: "Start at the left edge: 10 millimetres in and 30 millimetres up, a smooth ridge begins.",
      at: { event: "hum alone", edge: "start", xMm: 10, yMm: 30 },
    },
    { say: "Slide along it: it stays level, because the hum stays on one note." },
    {
      say: "It stops 60 millimetres from the left, still 30 millimetres up.",
      at: { event: "hum alone", edge: "end", xMm: 60, yMm: 30 },
    },
    {
      say: "Move up and right, to 75 millimetres from the left and 95 millimetres up, and the ground turns rough.",
      at: { event: "hiss alone", edge: "start", xMm: 75, yMm: 95 },
    },
    { say: "Spread your fingers on it: no single line, but bumps everywhere, as a hiss has no single note." },
    {
      say: "The patch ends 125 millimetres from the left, 95 millimetres up.",
      at: { event: "hiss alone", edge: "end", xMm: 125, yMm: 95 },
    },
    { say: "Stop here and make both sounds yourself, first the hum, then the hiss." },
    {
      say: "Now put one hand on the smooth ridge that begins 140 millimetres from the left, 30 millimetres up.",
      at: { event: "hum with hiss", edge: "start", xMm: 140, yMm: 30 },
    },
    {
      say: "Put the other hand on the patch above it, from 140 millimetres across and 95 millimetres up.",
      at: { event: "hiss with hum", edge: "start", xMm: 140, yMm: 95 },
    },
    { say: "One is right above the other: they sound at the same time." },
    {
      say: "Both end together, 190 millimetres from the left, the ridge still 30 millimetres up.",
      at: { event: "hum with hiss", edge: "end", xMm: 190, yMm: 30 },
    },
  ],
  listenFor: [
    "Can you sing it back? Then it hums.",
    "At Heron Spit, find one hum (a boat, a bee) and one hiss (foam, dry grass).",
    "Find a moment when both sound at once.",
  ],
  scale: humAndHissScale,
  events: [
    { ...hum, name: "hum alone", onsetSeconds: 0.4, durationSeconds: 2 },
    { ...hiss, name: "hiss alone", onsetSeconds: 3, durationSeconds: 2 },
    { ...hum, name: "hum with hiss", onsetSeconds: 5.6, durationSeconds: 2 },
    { ...hiss, name: "hiss with hum", onsetSeconds: 5.6, durationSeconds: 2 },
  ],
  copies: 8,
  making: MAKING,
  safety: SAFETY,
  audio: {
    durationSeconds: 8,
    inWords:
      "A low, steady hum for two seconds. A short silence. A high hiss, like air from a tyre, for two seconds. A short silence. Then the hum and the hiss together for two seconds.",
  },
  pictureAlt:
    "The plate from above: a straight ridge low at the left, a patch of pebbles high in the middle, and at the right the patch above the ridge.",
  version: "1.2",
  status: "approved",
};

const gallopScale = scaleFrom({
  widthMm: 200,
  heightMm: 80,
  baseMm: 2,
  reliefMmMax: 3,
  cutCornerMm: 12,
  durationSeconds: 5,
  lowestHz: 100,
  highestHz: 1600,
  axis: "log",
});

function knock(name: string, onsetSeconds: number, loudness: number): SoundEvent {
  return { name, onsetSeconds, durationSeconds: 0.15, kind: "noise", lowHz: 200, highHz: 800, loudness, envelope: "strike" };
}

const LIGHT_KNOCK = 0.6;
const HEAVY_KNOCK = 1;

const gallop: DemoModel = {
  slug: "gallop",
  title: "Gallop",
  concept: "A rhythm is a pattern of sounds and rests that comes back: two light knocks, a heavy one, then a rest.",
  forWhom: "Ages 6 and up, good for drumming along in a group",
  level: "first model",
  description:
    "A long, narrow plate, 200 millimetres wide and 80 high, with its lower right corner cut away. " +
    "Nine upright bars stand side by side across its middle, like fence posts, each as wide as a pencil and about as long as half a finger. " +
    "They come in three groups of three. Within a group the bars stand close together, with just room for a fingertip to dip between them. " +
    "The first two bars of each group are low; the third stands much higher. " +
    "Between the groups lies a wide flat gap, two fingers across. " +
    "Each bar is one knock of a hoof, the higher bar is the louder knock, and each wide gap is a rest. " +
    "The three groups are alike, because the pattern comes three times.",
  fingerTour: [
    { say: "Hold the plate with the cut corner by your right thumb." },
    { say: "It is 200 millimetres wide and 80 millimetres high, like a long envelope." },
    { say: "From the left edge to the right edge is 5 seconds." },
    { say: "Sweep one hand slowly across the middle and count the groups: there are three." },
    {
      say: "Go back to the left: the first low bar begins 20 millimetres in, and its middle is 40 millimetres up.",
      at: { event: "first light knock", edge: "start", xMm: 20, yMm: 40 },
    },
    {
      say: "A second bar just like it begins at 32 millimetres, again 40 millimetres up.",
      at: { event: "second light knock", edge: "start", xMm: 32, yMm: 40 },
    },
    {
      say: "The third, at 44 millimetres across and 40 millimetres up, stands higher: that knock is louder.",
      at: { event: "first heavy knock", edge: "start", xMm: 44, yMm: 40 },
    },
    {
      say: "It ends at 50 millimetres, 40 millimetres up, and your finger drops onto the rest.",
      at: { event: "first heavy knock", edge: "end", xMm: 50, yMm: 40 },
    },
    { say: "The rest is 30 millimetres of nothing, and it belongs to the rhythm too." },
    {
      say: "The pattern starts again 80 millimetres from the left, 40 millimetres up.",
      at: { event: "third light knock", edge: "start", xMm: 80, yMm: 40 },
    },
    {
      say: "It starts for the last time at 140 millimetres, 40 millimetres up.",
      at: { event: "fifth light knock", edge: "start", xMm: 140, yMm: 40 },
    },
    { say: "Pause, then walk a finger across and say it aloud: light, light, heavy, rest." },
    {
      say: "The last heavy bar ends 170 millimetres from the left, 40 millimetres up.",
      at: { event: "third heavy knock", edge: "end", xMm: 170, yMm: 40 },
    },
  ],
  listenFor: [
    "Where would you breathe, if you had to say it?",
    "Which knock is the strong one: first, second or third?",
    "On the boardwalk, find a pattern in the footsteps.",
  ],
  scale: gallopScale,
  events: [
    knock("first light knock", 0.5, LIGHT_KNOCK),
    knock("second light knock", 0.8, LIGHT_KNOCK),
    knock("first heavy knock", 1.1, HEAVY_KNOCK),
    knock("third light knock", 2, LIGHT_KNOCK),
    knock("fourth light knock", 2.3, LIGHT_KNOCK),
    knock("second heavy knock", 2.6, HEAVY_KNOCK),
    knock("fifth light knock", 3.5, LIGHT_KNOCK),
    knock("sixth light knock", 3.8, LIGHT_KNOCK),
    knock("third heavy knock", 4.1, HEAVY_KNOCK),
  ],
  copies: 8,
  making: MAKING,
  safety: SAFETY,
  audio: {
    durationSeconds: 5,
    inWords: "Three times the same pattern of dull knocks, like hooves on packed earth: two light, one heavy, and a rest.",
  },
  pictureAlt:
    "A long plate from above with nine upright bars in three groups of three; the third bar of each group is the highest.",
  version: "1.1",
  status: "approved",
};

const stepAndLeapScale = scaleFrom({
  widthMm: 200,
  heightMm: 120,
  baseMm: 2,
  reliefMmMax: 2.5,
  cutCornerMm: 12,
  durationSeconds: 8,
  lowestHz: 200,
  highestHz: 800,
  axis: "log",
});

function note(name: string, onsetSeconds: number, hz: number, durationSeconds = 0.6): SoundEvent {
  return { name, onsetSeconds, durationSeconds, kind: "tone", lowHz: hz, highHz: hz, loudness: 1, envelope: "steady" };
}

// Whole tones of equal temperament: six to the octave, so 10 mm each where an octave is 60 mm.
const HOME_HZ = 200 * 2 ** (3 / 6);
const ONE_STEP_UP_HZ = 200 * 2 ** (4 / 6);
const TWO_STEPS_UP_HZ = 200 * 2 ** (5 / 6);
const HIGH_HOME_HZ = 200 * 2 ** (9 / 6);

const stepAndLeap: DemoModel = {
  slug: "step-and-leap",
  title: "Step and leap",
  concept: "A tune moves by steps, to the note next door, or by leaps, over the heads of several notes.",
  forWhom: "Ages 8 and up, and anyone who sings",
  level: "second model",
  description:
    "A thin plate, 200 millimetres wide and 120 high, with its lower right corner cut away. " +
    "Seven short, smooth ridges lie on it, all level, all equally high, each about as long as a thumbnail; the last is a little longer. " +
    "From the left, the first three climb like low stairs: each begins a little higher on the plate than the one before. " +
    "The fourth is alone near the top, far above its neighbours. " +
    "Then the line comes back the way it went: down to the third stair, the second, the first. " +
    "The whole shape is a small hill with a tower in its middle. " +
    "Each ridge is one sung note. Moving a little way up is a step; the jump to the tower, and the jump back, are leaps.",
  fingerTour: [
    { say: "Hold the plate with the cut corner by your right thumb." },
    { say: "It is 200 millimetres wide and 120 millimetres high, and lasts 8 seconds from left to right." },
    { say: "Bottom is low sound, top is high sound." },
    { say: "Sweep both hands across once: seven short ridges, and one of them is far above the rest." },
    {
      say: "The first note begins 15 millimetres from the left and 30 millimetres up: call it home.",
      at: { event: "home", edge: "start", xMm: 15, yMm: 30 },
    },
    {
      say: "The second begins at 40 millimetres across and 40 millimetres up, one step higher.",
      at: { event: "first step up", edge: "start", xMm: 40, yMm: 40 },
    },
    {
      say: "The third begins at 65 millimetres across and 50 millimetres up, one more step.",
      at: { event: "second step up", edge: "start", xMm: 65, yMm: 50 },
    },
    { say: "Each step up is 10 millimetres, about one fingertip." },
    {
      say: "Now leap: the fourth note begins 90 millimetres across and 90 millimetres up.",
      at: { event: "leap up", edge: "start", xMm: 90, yMm: 90 },
    },
    { say: "That leap is 40 millimetres, as far as four steps at once." },
    { say: "Pause here, and sing the three steps and the leap if you like." },
    {
      say: "Leap back down, to 115 millimetres across and 50 millimetres up.",
      at: { event: "leap down", edge: "start", xMm: 115, yMm: 50 },
    },
    {
      say: "Step down, to 140 millimetres across and 40 millimetres up.",
      at: { event: "first step down", edge: "start", xMm: 140, yMm: 40 },
    },
    {
      say: "Step down once more, to 165 millimetres across and 30 millimetres up: home again.",
      at: { event: "home again", edge: "start", xMm: 165, yMm: 30 },
    },
    {
      say: "This last note is held longer and ends at 185 millimetres, 30 millimetres up.",
      at: { event: "home again", edge: "end", xMm: 185, yMm: 30 },
    },
  ],
  listenFor: [
    "Raise a hand at the leap.",
    "Does the tune come home to where it began?",
    "Find a bird that steps and a bird that leaps.",
  ],
  scale: stepAndLeapScale,
  events: [
    note("home", 0.6, HOME_HZ),
    note("first step up", 1.6, ONE_STEP_UP_HZ),
    note("second step up", 2.6, TWO_STEPS_UP_HZ),
    note("leap up", 3.6, HIGH_HOME_HZ),
    note("leap down", 4.6, TWO_STEPS_UP_HZ),
    note("first step down", 5.6, ONE_STEP_UP_HZ),
    note("home again", 6.6, HOME_HZ, 0.8),
  ],
  copies: 6,
  making: { ...MAKING, layerHeightMm: 0.1 },
  safety: SAFETY,
  audio: {
    durationSeconds: 8,
    inWords:
      "Seven plain notes, one a second: three climb by steps, the fourth leaps up high, then a leap back down and two steps down to the first note, held a little longer.",
  },
  pictureAlt:
    "The plate from above: seven short level ridges, three rising like stairs, one far above them, three going down again.",
  version: "1.0",
  status: "approved",
};

const buildAndBreakScale = scaleFrom({
  widthMm: 200,
  heightMm: 120,
  baseMm: 2,
  reliefMmMax: 4,
  cutCornerMm: 12,
  durationSeconds: 10,
  lowestHz: 100,
  highestHz: 6400,
  axis: "log",
});

// The band begins 10 mm up the plate and reaches, at the crest, 70 mm in the first wave and 100 mm in the second.
const WAVE_FLOOR_HZ = 100 * 2 ** 0.5;
const SMALL_CREST_HZ = 100 * 2 ** 3.5;
const TALL_CREST_HZ = 100 * 2 ** 5;

function wave(name: string, onsetSeconds: number, highHz: number, loudness: number): SoundEvent {
  const sound = { kind: "noise", brightens: true, lowHz: WAVE_FLOOR_HZ, highHz, envelope: "wave" } as const;
  return { name, onsetSeconds, durationSeconds: 4, loudness, ...sound };
}

const buildAndBreak: DemoModel = {
  slug: "build-and-break",
  title: "Build and break",
  concept: "A sound can grow slowly and end fast: a wave gathers, breaks, and runs out.",
  forWhom: "Ages 6 and up, before the first outing to the shore",
  level: "first model",
  description:
    "A thin plate, 200 millimetres wide and 120 high, with its lower right corner cut away. " +
    "Two rough mounds lie on it, one in the left half, one in the right, with a flat strip a finger wide between them. " +
    "Each begins at its left as a low, narrow tail near the bottom, only just raised. " +
    "It climbs slowly for about three fingers' width, grainy all the way, like a heap of wet sand, and spreads upward as it climbs. " +
    "Then comes the crest, the highest place of the mound, and behind it the ground falls away fast to nothing. " +
    "The right mound is much higher than the left and reaches further up the plate. " +
    "Each mound is one wave on a beach. The slope is the wave gathering, the crest is the wave breaking, and the flat strip is the quiet before the next.",
  fingerTour: [
    { say: "Hold the plate with the cut corner by your right thumb." },
    { say: "It is 200 millimetres wide and 120 millimetres high." },
    { say: "From the left edge to the right edge is 10 seconds, time for two waves." },
    { say: "Rest both hands flat: a rough swell lies under each palm." },
    {
      say: "With one finger, begin 10 millimetres from the left and 10 millimetres up, on a low grainy tail.",
      at: { event: "first wave", edge: "start", xMm: 10, yMm: 10 },
    },
    { say: "Slide right slowly and feel it climb and spread: the wave is gathering." },
    {
      say: "The crest is 70 millimetres across, and it reaches from the bottom to 70 millimetres up: the wave breaks.",
      at: { event: "first wave", edge: "crest", xMm: 70, yMm: 70 },
    },
    {
      say: "It runs out fast and is gone 90 millimetres from the left, 10 millimetres up.",
      at: { event: "first wave", edge: "end", xMm: 90, yMm: 10 },
    },
    { say: "Rest your finger on the flat strip: this is the quiet between waves." },
    {
      say: "The second wave begins 110 millimetres from the left, 10 millimetres up.",
      at: { event: "second wave", edge: "start", xMm: 110, yMm: 10 },
    },
    {
      say: "Its crest, 170 millimetres across, reaches 100 millimetres up and is the highest place on the plate.",
      at: { event: "second wave", edge: "crest", xMm: 170, yMm: 100 },
    },
    { say: "Higher under the finger means louder in the ear." },
    { say: "Further up the plate means brighter: a breaking wave hisses, a gathering one only rumbles." },
    {
      say: "It is gone 190 millimetres from the left, 10 millimetres up, a little finger's width before the edge.",
      at: { event: "second wave", edge: "end", xMm: 190, yMm: 10 },
    },
  ],
  listenFor: [
    "Say \"now\" when you think the wave will break.",
    "Which takes longer, the building or the breaking?",
    "At Heron Spit, count slowly from one crest to the next.",
  ],
  scale: buildAndBreakScale,
  events: [
    wave("first wave", 0.5, SMALL_CREST_HZ, 0.6),
    wave("second wave", 5.5, TALL_CREST_HZ, 1),
  ],
  copies: 6,
  making: {
    ...MAKING,
    notes: [...MAKING.notes, "Four millimetres of relief makes this the heaviest of the five and the longest to print."],
  },
  safety: SAFETY,
  audio: {
    durationSeconds: 10,
    inWords:
      "A soft rush of water grows for about three seconds, breaks, and runs out. A short quiet. Then the same again, much louder.",
  },
  pictureAlt:
    "The plate from above: two rough mounds side by side, each with a low tail at its left that climbs and spreads to a crest near its right end; the right one is much larger.",
  version: "2.0",
  status: "approved",
};

const questionAndAnswerScale = scaleFrom({
  widthMm: 200,
  heightMm: 120,
  baseMm: 2,
  reliefMmMax: 2.5,
  cutCornerMm: 12,
  durationSeconds: 10,
  lowestHz: 100,
  highestHz: 1600,
  axis: "log",
});

// The question climbs an octave from 75 to 105 mm up the plate, the answer falls one from 45 to 15 mm.
const ASKING = { lowHz: 100 * 2 ** 2.5, highHz: 100 * 2 ** 3.5, direction: "up", durationSeconds: 1 } as const;
const ANSWERING = { lowHz: 100 * 2 ** 0.5, highHz: 100 * 2 ** 1.5, direction: "down", durationSeconds: 1.2 } as const;

function call(name: string, onsetSeconds: number, voice: typeof ASKING | typeof ANSWERING): SoundEvent {
  return { name, onsetSeconds, kind: "glide", ...voice, loudness: voice === ASKING ? 0.85 : 1, envelope: "swell" };
}

const questionAndAnswer: DemoModel = {
  slug: "question-and-answer",
  title: "Question and answer",
  concept: "Two voices can take turns, and a silence can be the place where an answer is missing.",
  forWhom: "Ages 8 and up, in pairs: one asks, one answers",
  level: "second model",
  description:
    "A thin plate, 200 millimetres wide and 120 high, with its lower right corner cut away. " +
    "Five smooth slanting ridges lie on it, each about as long as half a finger. " +
    "Three are near the top and slope up to the right, like a path going uphill. " +
    "Two are near the bottom and slope down to the right. " +
    "They take turns: up at the top, down at the bottom, up, down, and a last time up. " +
    "After that last one the plate is flat and empty all the way to the right edge, below it too, where a third downward ridge would have been. " +
    "The upper ridges are a high voice that asks, rising. The lower ones are a deep voice that answers, falling. " +
    "The third question gets no answer.",
  fingerTour: [
    { say: "Hold the plate with the cut corner by your right thumb." },
    { say: "It is 200 millimetres wide and 120 millimetres high, and lasts 10 seconds from left to right." },
    { say: "The upper half is the high voice, and the lower half is the deep voice." },
    { say: "Lay the left hand on the left half and the right hand on the right: five slanting ridges." },
    {
      say: "The first begins 10 millimetres from the left and 75 millimetres up.",
      at: { event: "first question", edge: "start", xMm: 10, yMm: 75 },
    },
    {
      say: "It climbs to 30 millimetres across and 105 millimetres up: a voice asks.",
      at: { event: "first question", edge: "end", xMm: 30, yMm: 105 },
    },
    {
      say: "Drop down to 40 millimetres across and 45 millimetres up, where the deep voice begins.",
      at: { event: "first answer", edge: "start", xMm: 40, yMm: 45 },
    },
    {
      say: "It falls to 64 millimetres across and 15 millimetres up: a voice answers.",
      at: { event: "first answer", edge: "end", xMm: 64, yMm: 15 },
    },
    { say: "The gap between them is 10 millimetres, half a second, as between people who know each other." },
    {
      say: "The second question begins 80 millimetres across and 75 millimetres up.",
      at: { event: "second question", edge: "start", xMm: 80, yMm: 75 },
    },
    {
      say: "Its answer begins 110 millimetres across and 45 millimetres up.",
      at: { event: "second answer", edge: "start", xMm: 110, yMm: 45 },
    },
    {
      say: "The third question begins 150 millimetres across and 75 millimetres up.",
      at: { event: "third question", edge: "start", xMm: 150, yMm: 75 },
    },
    {
      say: "It ends 170 millimetres across and 105 millimetres up.",
      at: { event: "third question", edge: "end", xMm: 170, yMm: 105 },
    },
    { say: "Drop down and look for the answer." },
    { say: "There is none, only flat plate to the right edge: that silence is part of the story." },
  ],
  listenFor: [
    "Which voice goes up, and which goes down?",
    "How many questions, and how many answers?",
    "At Alder Bog, wait after a call: does anybody answer?",
  ],
  scale: questionAndAnswerScale,
  events: [
    call("first question", 0.5, ASKING),
    call("first answer", 2, ANSWERING),
    call("second question", 4, ASKING),
    call("second answer", 5.5, ANSWERING),
    call("third question", 7.5, ASKING),
  ],
  copies: 4,
  making: { ...MAKING, layerHeightMm: 0.1 },
  safety: SAFETY,
  audio: {
    durationSeconds: 10,
    inWords:
      "A high voice slides up, a deep voice slides down. Again up, again down. A third time up, and then silence to the end.",
  },
  pictureAlt:
    "The plate from above: three ridges rising to the right in the upper half, two falling to the right in the lower half, and an empty place at the lower right.",
  version: "0.9",
  status: "in test",
};

/** The five teaching models of the demo catalogue, in the order in which a newcomer would meet them. */
export const demoModels: readonly DemoModel[] = [humAndHiss, gallop, buildAndBreak, stepAndLeap, questionAndAnswer];
