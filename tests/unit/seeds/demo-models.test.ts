import { createHash } from "node:crypto";
import sharp from "sharp";
import { describe, expect, it } from "vitest";
import type { DemoModel } from "@/seeds/demo/models/demo-models";
import { demoModels } from "@/seeds/demo/models/demo-models";
import type { SoundEvent } from "@/seeds/demo/models/model-events";
import { crestSeconds, endSeconds, pitchHzAt } from "@/seeds/demo/models/model-events";
import { FINGER_GAP_MM, mmAtHz, mmAtSeconds, secondsAtMm } from "@/seeds/demo/models/model-scale";
import { modelPicture, pictureSvg } from "@/seeds/demo/models/picture";
import { heightMmAt, modelRelief } from "@/seeds/demo/models/relief";
import { modelPrintable } from "@/seeds/demo/models/stl";
import { modelAudio } from "@/seeds/demo/models/wav";

const ROUNDING = 1e-6;

function modelNamed(slug: string): DemoModel {
  const model = demoModels.find((candidate) => candidate.slug === slug);
  if (!model) throw new Error(`No model ${slug}`);
  return model;
}

function eventNamed(model: DemoModel, name: string): SoundEvent {
  const event = model.events.find((candidate) => candidate.name === name);
  if (!event) throw new Error(`${model.slug} has no sound named ${name}`);
  return event;
}

function wordsIn(text: string): number {
  return text.split(/\s+/).length;
}

function hashOf(bytes: Uint8Array): string {
  return createHash("sha256").update(bytes).digest("hex");
}

function readWav(bytes: Uint8Array) {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const letters = (at: number, length = 4) => String.fromCharCode(...bytes.subarray(at, at + length));
  const sampleCount = view.getUint32(40, true) / 2;
  const samples = Int16Array.from({ length: sampleCount }, (_, index) => view.getInt16(44 + index * 2, true));
  return { view, letters, samples, rate: view.getUint32(24, true) };
}

function between(samples: Int16Array, rate: number, fromSeconds: number, toSeconds: number): Int16Array {
  return samples.subarray(Math.ceil(fromSeconds * rate), Math.floor(toSeconds * rate));
}

function peakOf(samples: Int16Array): number {
  return samples.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
}

function rmsOf(samples: Int16Array): number {
  return Math.sqrt(samples.reduce((sum, value) => sum + value * value, 0) / samples.length);
}

/** Pitch of a pure tone from its upward passages through zero. */
function pitchHeard(samples: Int16Array, rate: number): number {
  const upward: number[] = [];
  for (let index = 1; index < samples.length; index++) {
    const before = samples[index - 1] ?? 0;
    const here = samples[index] ?? 0;
    if (before < 0 && here >= 0) upward.push(index - here / (here - before));
  }
  const [first, last] = [upward[0] ?? 0, upward.at(-1) ?? 0];
  return ((upward.length - 1) * rate) / (last - first);
}

/** Stretches of time in which at least one sound is going. */
function soundingSpans(model: DemoModel): { from: number; to: number }[] {
  const spans: { from: number; to: number }[] = [];
  for (const event of [...model.events].sort((a, b) => a.onsetSeconds - b.onsetSeconds)) {
    const last = spans.at(-1);
    if (last && event.onsetSeconds <= last.to) last.to = Math.max(last.to, endSeconds(event));
    else spans.push({ from: event.onsetSeconds, to: endSeconds(event) });
  }
  return spans;
}

type Corner = [number, number, number];

function readStl(bytes: Uint8Array) {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const stated = view.getUint32(80, true);
  const triangles: { normal: Corner; corners: [Corner, Corner, Corner] }[] = [];
  const corner = (at: number): Corner => [
    view.getFloat32(at, true),
    view.getFloat32(at + 4, true),
    view.getFloat32(at + 8, true),
  ];
  for (let at = 84; at + 50 <= bytes.length; at += 50) {
    triangles.push({ normal: corner(at), corners: [corner(at + 12), corner(at + 24), corner(at + 36)] });
  }
  return { stated, triangles };
}

function cross(a: Corner, b: Corner, c: Corner): Corner {
  const [ux, uy, uz] = [b[0] - a[0], b[1] - a[1], b[2] - a[2]];
  const [vx, vy, vz] = [c[0] - a[0], c[1] - a[1], c[2] - a[2]];
  return [uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx];
}

describe("the demo catalogue", () => {
  it("holds five models, each under its own address", () => {
    expect(demoModels).toHaveLength(5);
    expect(new Set(demoModels.map((model) => model.slug)).size).toBe(5);
    for (const model of demoModels) expect(model.slug).toMatch(/^[a-z]+(-[a-z]+)*$/);
  });
});

describe.each(demoModels.map((model) => [model.title, model] as const))("%s in words", (_, model) => {
  it("is described at a length a listener can hold", () => {
    expect(wordsIn(model.description)).toBeGreaterThanOrEqual(80);
    expect(wordsIn(model.description)).toBeLessThanOrEqual(160);
    expect(wordsIn(model.pictureAlt)).toBeGreaterThanOrEqual(12);
  });

  it("teaches one concept, said in one sentence", () => {
    expect(model.concept.match(/[.!?](\s|$)/g)).toHaveLength(1);
  });

  it("is toured in short sentences, beginning with how to hold it and how big it is", () => {
    expect(model.fingerTour[0]?.say).toContain("cut corner by your right thumb");
    expect(model.fingerTour[1]?.say).toContain(`${model.scale.widthMm} millimetres wide`);
    expect(model.fingerTour[1]?.say).toContain(`${model.scale.heightMm} millimetres high`);
    for (const { say } of model.fingerTour) {
      expect(say.match(/[.!?](\s|$)/g), say).toHaveLength(1);
      expect(wordsIn(say), say).toBeLessThanOrEqual(24);
    }
  });

  it("tells the hand only places that are on the plate", () => {
    const { widthMm } = model.scale;
    for (const { say } of model.fingerTour) {
      for (const [, mm] of say.matchAll(/(\d+) millimetres/g)) expect(Number(mm), say).toBeLessThanOrEqual(widthMm);
    }
  });

  it("sends the finger exactly where each named sound begins, breaks or ends", () => {
    const stops = model.fingerTour.filter((step) => step.at);
    expect(stops.length).toBeGreaterThanOrEqual(6);
    for (const { say, at } of stops) {
      if (!at) continue;
      const event = eventNamed(model, at.event);
      const seconds = { start: event.onsetSeconds, crest: crestSeconds(event), end: endSeconds(event) }[at.edge];
      expect(at.xMm, say).toBeCloseTo((seconds / model.scale.secondsPerCm) * 10, 1);
      const [low, high] = [mmAtHz(model.scale, event.lowHz), mmAtHz(model.scale, event.highHz)];
      if (event.kind === "noise") {
        expect(at.yMm, say).toBeGreaterThanOrEqual(low - 0.05);
        expect(at.yMm, say).toBeLessThanOrEqual(high + 0.05);
      } else {
        expect(at.yMm, say).toBeCloseTo(mmAtHz(model.scale, pitchHzAt(event, seconds)), 1);
      }
      expect(say).toMatch(new RegExp(`\\b${at.xMm} millimetres`));
      expect(say).toMatch(new RegExp(`\\b${at.yMm} millimetres`));
    }
  });
});

describe.each(demoModels.map((model) => [model.title, model] as const))("%s and its scale", (_, model) => {
  const { scale, events } = model;

  it("gives seconds per centimetre and the smallest gap that follow from its size", () => {
    expect(scale.secondsPerCm * (scale.widthMm / 10)).toBeCloseTo(scale.durationSeconds, 9);
    expect(scale.smallestGapSeconds).toBeCloseTo(0.5 * scale.secondsPerCm, 9);
    expect(model.audio.durationSeconds).toBe(scale.durationSeconds);
  });

  it("has every sound inside its time and its pitch range, under a name of its own", () => {
    expect(new Set(events.map((event) => event.name)).size).toBe(events.length);
    for (const event of events) {
      expect(event.onsetSeconds).toBeGreaterThan(0);
      expect(endSeconds(event)).toBeLessThan(scale.durationSeconds);
      expect(event.lowHz).toBeGreaterThanOrEqual(scale.lowestHz);
      expect(event.highHz).toBeLessThanOrEqual(scale.highestHz);
    }
  });

  it("leaves between one sound and the next a gap that a finger can separate", () => {
    const spans = soundingSpans(model);
    expect(spans.length).toBeGreaterThan(1);
    spans.slice(1).forEach((span, index) => {
      const gap = span.from - (spans[index]?.to ?? 0);
      expect(gap).toBeGreaterThanOrEqual(scale.smallestGapSeconds - ROUNDING);
    });
  });

  it("keeps sounds that go on together a finger's gap apart in pitch", () => {
    const together = events.flatMap((one, index) =>
      events
        .slice(index + 1)
        .filter((other) => other.onsetSeconds < endSeconds(one) && one.onsetSeconds < endSeconds(other))
        .map((other) => [one, other].sort((a, b) => a.lowHz - b.lowHz)),
    );
    for (const [lower, upper] of together) {
      if (!lower || !upper) continue;
      expect(mmAtHz(scale, upper.lowHz) - mmAtHz(scale, lower.highHz)).toBeGreaterThanOrEqual(FINGER_GAP_MM);
    }
  });
});

describe.each(demoModels.map((model) => [model.title, model] as const))("the sound of %s", (_, model) => {
  const bytes = modelAudio(model);
  const { view, letters, samples, rate } = readWav(bytes);

  it("is a WAV file any player opens: PCM, mono, 16 bit, 22.05 kHz", () => {
    expect([letters(0), letters(8), letters(12), letters(36)]).toEqual(["RIFF", "WAVE", "fmt ", "data"]);
    expect(view.getUint32(4, true)).toBe(bytes.length - 8);
    expect(view.getUint32(40, true)).toBe(bytes.length - 44);
    expect([view.getUint16(20, true), view.getUint16(22, true), rate]).toEqual([1, 1, 22050]);
    expect([view.getUint32(28, true), view.getUint16(32, true), view.getUint16(34, true)]).toEqual([44100, 2, 16]);
  });

  it("lasts as long as the model says, between 4 and 10 seconds", () => {
    expect(samples.length / rate).toBeCloseTo(model.audio.durationSeconds, 4);
    expect(model.audio.durationSeconds).toBeGreaterThanOrEqual(4);
    expect(model.audio.durationSeconds).toBeLessThanOrEqual(10);
  });

  it("peaks at -12 dBFS", () => {
    expect(20 * Math.log10(peakOf(samples) / 32767)).toBeCloseTo(-12, 1);
  });

  it("sounds where the relief is raised and is silent where the plate is flat", () => {
    const spans = soundingSpans(model);
    for (const { from, to } of spans) expect(rmsOf(between(samples, rate, from, to))).toBeGreaterThan(200);
    const edges = [0, ...spans.flatMap(({ from, to }) => [from, to]), model.scale.durationSeconds];
    for (let index = 0; index < edges.length; index += 2) {
      expect(peakOf(between(samples, rate, edges[index] ?? 0, edges[index + 1] ?? 0))).toBe(0);
    }
  });

  it("begins and ends each sound without a click", () => {
    // 1 ms at either edge stays more than 20 dB under the peak of the recording.
    for (const event of model.events) {
      const { onsetSeconds } = event;
      const edges = [
        between(samples, rate, onsetSeconds, onsetSeconds + 0.001),
        between(samples, rate, endSeconds(event) - 0.001, endSeconds(event)),
      ];
      for (const edge of edges) expect(peakOf(edge), event.name).toBeLessThan(peakOf(samples) / 10);
    }
  });

  it("comes out the same every time", () => {
    expect(hashOf(modelAudio(model))).toBe(hashOf(bytes));
  });
});

describe("what the ear hears", () => {
  it("is, in Step and leap, each note at the pitch where its ridge lies", () => {
    const model = modelNamed("step-and-leap");
    const { samples, rate } = readWav(modelAudio(model));
    for (const event of model.events) {
      const heard = pitchHeard(between(samples, rate, event.onsetSeconds + 0.1, endSeconds(event) - 0.1), rate);
      expect(mmAtHz(model.scale, heard), event.name).toBeCloseTo(mmAtHz(model.scale, event.lowHz), 1);
    }
  });

  it("is, in Question and answer, a rise in each question and a fall in each answer", () => {
    const model = modelNamed("question-and-answer");
    const { samples, rate } = readWav(modelAudio(model));
    for (const event of model.events) {
      const third = event.durationSeconds / 3;
      const early = pitchHeard(between(samples, rate, event.onsetSeconds + 0.02, event.onsetSeconds + third), rate);
      const late = pitchHeard(between(samples, rate, endSeconds(event) - third, endSeconds(event) - 0.02), rate);
      expect(late > early, event.name).toBe(event.name.includes("question"));
    }
  });

  it("is, in Gallop, the third knock of each group louder by far", () => {
    const model = modelNamed("gallop");
    const { samples, rate } = readWav(modelAudio(model));
    const levels = model.events.map((event) => rmsOf(between(samples, rate, event.onsetSeconds, endSeconds(event))));
    for (let group = 0; group < 9; group += 3) {
      const [light, lightAgain, heavy] = levels.slice(group, group + 3);
      expect(heavy).toBeGreaterThan(1.8 * Math.max(light ?? Infinity, lightAgain ?? Infinity));
    }
  });
});

describe.each(demoModels.map((model) => [model.title, model] as const))("the relief of %s", (_, model) => {
  const { scale } = model;
  const field = modelRelief(model);
  const nodes = Array.from(field.heightsMm, (height, index) => ({
    height,
    x: (index % field.columns) * field.cellMm,
    y: Math.floor(index / field.columns) * field.cellMm,
  }));

  it("rises to exactly its stated height, from a base thick enough to print", () => {
    expect(Math.max(...nodes.map((node) => node.height))).toBe(scale.reliefMmMax);
    expect(scale.reliefMmMax).toBeGreaterThanOrEqual(1);
    expect(scale.reliefMmMax).toBeLessThanOrEqual(4);
    // Base of at least 1.5 mm: Round Table, https://printdisability.org/about-us/accessible-graphics/3d-printing/design
    expect(scale.baseMm).toBeGreaterThanOrEqual(1.5);
  });

  it("raises every sound by the millimetre that a finger is sure of", () => {
    for (const event of model.events) {
      const under = nodes.filter(
        ({ x, y }) =>
          secondsAtMm(scale, x) > event.onsetSeconds &&
          secondsAtMm(scale, x) < endSeconds(event) &&
          y >= mmAtHz(scale, event.lowHz) - 1 &&
          y <= mmAtHz(scale, event.highHz) + 1,
      );
      expect(Math.max(...under.map((node) => node.height)), event.name).toBeGreaterThanOrEqual(1);
    }
  });

  it("is flat where nothing sounds, at the edge, and at the cut corner", () => {
    // A slanting ridge is as wide as any other, so its foot leans a little past its own second.
    const leanMm = model.events.some((event) => event.kind === "glide") ? 3.2 : 0;
    const spans = soundingSpans(model).map(({ from, to }) => ({
      from: mmAtSeconds(scale, from) - leanMm,
      to: mmAtSeconds(scale, to) + leanMm,
    }));
    const silent = nodes.filter(({ x }) => spans.every(({ from, to }) => x <= from || x >= to));
    expect(silent.length).toBeGreaterThan(0);
    expect(silent.filter((node) => node.height > 0)).toEqual([]);
    const rim = nodes.filter(({ x, y }) => x === 0 || y === 0 || x === scale.widthMm || y === scale.heightMm);
    const corner = nodes.filter(({ x, y }) => scale.widthMm - x + y <= scale.cutCornerMm);
    expect([...rim, ...corner].filter((node) => node.height > 0)).toEqual([]);
  });

  it("makes each ridge wide enough to follow, at 1 mm height and above", () => {
    // Lines of 1.1 mm and wider, 1 mm high: https://tactiles.eu/guideline/4-1-line-symbols/
    for (const event of model.events.filter((candidate) => candidate.kind !== "noise")) {
      const column = Math.round(mmAtSeconds(scale, event.onsetSeconds + event.durationSeconds / 2) / field.cellMm);
      const middle = Math.round(mmAtHz(scale, pitchHzAt(event, event.onsetSeconds + event.durationSeconds / 2)));
      const rows = Array.from({ length: 13 }, (_, index) => middle - 6 + index);
      const high = rows.filter((row) => heightMmAt(field, column, row) >= 1);
      expect((high.length - 1) * field.cellMm, event.name).toBeGreaterThanOrEqual(1.1);
    }
  });
});

describe.each(demoModels.map((model) => [model.title, model] as const))("the printable file of %s", (_, model) => {
  const { scale } = model;
  const bytes = modelPrintable(model);
  const { stated, triangles } = readStl(bytes);
  const corners = triangles.flatMap((triangle) => triangle.corners);

  it("holds as many triangles as its header says, in at most 4 MB", () => {
    expect(bytes.length).toBe(84 + 50 * stated);
    expect(triangles).toHaveLength(stated);
    expect(bytes.length).toBeLessThanOrEqual(4 * 1024 * 1024);
    expect(String.fromCharCode(...bytes.subarray(0, 5)).toLowerCase()).not.toBe("solid");
  });

  it("is one closed surface: every edge is shared by two triangles that run along it in opposite ways", () => {
    const numbers = new Map<string, number>();
    const numberOf = (corner: Corner) => {
      const place = corner.join(" ");
      const number = numbers.get(place) ?? numbers.size;
      numbers.set(place, number);
      return number;
    };
    // Each directed edge as one number; a surface is closed when each has exactly its reverse.
    const runs = new Set<number>();
    let twice = 0;
    for (const { corners: three } of triangles) {
      const ends = three.map(numberOf);
      ends.forEach((from, index) => {
        const run = from * 1e6 + (ends[(index + 1) % 3] ?? from);
        if (runs.has(run)) twice += 1;
        runs.add(run);
      });
    }
    const open = [...runs].filter((run) => !runs.has((run % 1e6) * 1e6 + Math.floor(run / 1e6)));
    expect(twice).toBe(0);
    expect(open).toEqual([]);
    // A body without holes: corners - edges + faces = 2 (Euler).
    expect(numbers.size - runs.size / 2 + triangles.length).toBe(2);
  });

  it("is as large as the model says, in millimetres, standing on zero", () => {
    const reach = [0, 1, 2].map((axis) => {
      const along = corners.map((corner) => corner[axis] ?? Number.NaN);
      return [along.reduce((a, b) => Math.min(a, b)), along.reduce((a, b) => Math.max(a, b))];
    });
    expect(reach).toEqual([
      [0, scale.widthMm],
      [0, scale.heightMm],
      [0, scale.baseMm + scale.reliefMmMax],
    ]);
  });

  it("has the volume of its base and relief, less the cut corner, turned right side out", () => {
    const volume = triangles.reduce((sum, { corners: [a, b, c] }) => {
      const [x, y, z] = cross([0, 0, 0], b, c);
      return sum + (a[0] * x + a[1] * y + a[2] * z) / 6;
    }, 0);
    const field = modelRelief(model);
    const raised = field.heightsMm.reduce((sum, height) => sum + height, 0) * field.cellMm ** 2;
    const plate = scale.baseMm * (scale.widthMm * scale.heightMm - scale.cutCornerMm ** 2 / 2);
    expect(volume).toBeGreaterThan(0);
    expect(Math.abs(volume - plate - raised) / (plate + raised)).toBeLessThan(1e-4);
  });

  it("points every normal outward, at length one, and has no triangle without area", () => {
    const wrong = triangles.filter(({ normal, corners: [a, b, c] }) => {
      const outward = cross(a, b, c);
      const area = Math.hypot(...outward);
      const along = (outward[0] * normal[0] + outward[1] * normal[1] + outward[2] * normal[2]) / area;
      return area < 0.01 || Math.abs(along - 1) > 1e-4 || Math.abs(Math.hypot(...normal) - 1) > 1e-4;
    });
    expect(wrong).toEqual([]);
  });

  it("has its lower right corner, and no other, cut away", () => {
    const has = (x: number, y: number) => corners.some((corner) => corner[0] === x && corner[1] === y);
    expect(has(scale.widthMm, 0)).toBe(false);
    expect(has(scale.widthMm - scale.cutCornerMm, 0) && has(scale.widthMm, scale.cutCornerMm)).toBe(true);
    expect(has(0, 0) && has(0, scale.heightMm) && has(scale.widthMm, scale.heightMm)).toBe(true);
  });

  it("comes out the same every time", () => {
    expect(hashOf(modelPrintable(model))).toBe(hashOf(bytes));
  });
});

describe.each(demoModels.map((model) => [model.title, model] as const))("the picture of %s", (_, model) => {
  it("is a PNG of 1200 by 800 that comes out the same every time", async () => {
    const bytes = await modelPicture(model);
    const { format, width, height } = await sharp(bytes).metadata();
    expect([format, width, height]).toEqual(["png", 1200, 800]);
    expect(hashOf(await modelPicture(model))).toBe(hashOf(bytes));
  });

  it("has no words in it", () => {
    expect(pictureSvg(model)).not.toMatch(/<text|font/);
  });

  it("shows the relief against the plate at 3:1 or better", async () => {
    const image = await sharp(Buffer.from(pictureSvg(model))).removeAlpha().raw().toBuffer();
    const field = modelRelief(model);
    const PX_PER_MM = 5.2;
    // The middle value of a 2 mm square, so that a thin shadow between two layers does not decide.
    const lightness = (xMm: number, yMm: number) => {
      const left = Math.round(600 + (xMm - model.scale.widthMm / 2) * PX_PER_MM);
      const top = Math.round(400 - (yMm - model.scale.heightMm / 2) * PX_PER_MM);
      const square = Array.from({ length: 121 }, (_, index) => {
        const at = ((top - 5 + Math.floor(index / 11)) * 1200 + left - 5 + (index % 11)) * 3;
        return luminance([...image.subarray(at, at + 3)]);
      });
      return square.sort((a, b) => a - b)[60] ?? 0;
    };
    const plate = lightness(3, 3);
    for (const { at } of model.fingerTour) {
      if (!at) continue;
      const event = eventNamed(model, at.event);
      const seconds = event.kind === "noise" && event.brightens ? crestSeconds(event) : middleSeconds(event);
      const [x, y] = [mmAtSeconds(model.scale, seconds), mmAtHz(model.scale, pitchHzAt(event, seconds))];
      expect(heightMmAt(field, Math.round(x), Math.round(y))).toBeGreaterThan(0.5);
      expect((lightness(x, y) + 0.05) / (plate + 0.05), at.event).toBeGreaterThanOrEqual(3);
    }
  });
});

function middleSeconds(event: SoundEvent): number {
  return event.onsetSeconds + event.durationSeconds / 2;
}

/** Relative luminance: WCAG 2.2, https://www.w3.org/TR/WCAG22/#dfn-relative-luminance */
function luminance(channels: number[]): number {
  const [red, green, blue] = channels.map((value) => {
    const share = value / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * (red ?? 0) + 0.7152 * (green ?? 0) + 0.0722 * (blue ?? 0);
}
