import { chanceFrom } from "./chance";
import type { DemoModel } from "./demo-models";
import type { SoundEvent } from "./model-events";
import { bandTopHzAt, endSeconds, loudnessAt, pitchHzAt, smoothStep } from "./model-events";
import type { ModelScale } from "./model-scale";
import { mmAtHz, mmAtSeconds, secondsAtMm } from "./model-scale";

/** Heights above the base in millimetres, row by row from the lower left, one for each crossing of a grid. */
export type ReliefField = {
  columns: number;
  rows: number;
  cellMm: number;
  heightsMm: Float64Array;
};

const CELL_MM = 1;
/** A ridge is flat on top and slopes to the base, so that its edge is clear and not sharp. */
const RIDGE_TOP_HALF_MM = 1.6;
const RIDGE_FOOT_HALF_MM = 3.8;
/** Noise is a field of pebbles: this far apart, each this wide, the hollows this share lower. */
const PEBBLE_PITCH_MM = 5;
const PEBBLE_RADIUS_MM = 2.7;
const HOLLOW_SHARE = 0.42;
const BAND_EDGE_MM = 2.5;

/**
 * The relief of a model: left to right is time, bottom to top is pitch, height is loudness.
 * A tone is a smooth ridge, a glide a slanting ridge, a noise a rough field. The loudest moment stands at exactly
 * scale.reliefMmMax; the outermost ring of the grid is always flat.
 * @returns heights in millimetres above the base on a 1 mm grid
 */
export function modelRelief(model: DemoModel): ReliefField {
  const { scale } = model;
  const columns = Math.round(scale.widthMm / CELL_MM) + 1;
  const rows = Math.round(scale.heightMm / CELL_MM) + 1;
  const heightsMm = new Float64Array(columns * rows);
  for (const event of model.events) raise(heightsMm, columns, rows, scale, event);
  stretchTo(heightsMm, scale.reliefMmMax);
  return { columns, rows, cellMm: CELL_MM, heightsMm };
}

/** Height of one crossing of the grid, 0 outside it. */
export function heightMmAt(field: ReliefField, column: number, row: number): number {
  if (column < 0 || row < 0 || column >= field.columns || row >= field.rows) return 0;
  return field.heightsMm[row * field.columns + column] ?? 0;
}

function raise(heights: Float64Array, columns: number, rows: number, scale: ModelScale, event: SoundEvent): void {
  const heightAt = event.kind === "noise" ? roughField(scale, event) : ridge(scale, event);
  for (let row = 1; row < rows - 1; row++) {
    for (let column = 1; column < columns - 1; column++) {
      const index = row * columns + column;
      const height = heightAt(column * CELL_MM, row * CELL_MM);
      // Where sounds overlap, the finger meets the louder one, as the ear mostly does.
      if (height > (heights[index] ?? 0)) heights[index] = height;
    }
  }
}

/** Height, 0 to 1, at a place in millimetres. */
type HeightAt = (x: number, y: number) => number;

function ridge(scale: ModelScale, event: SoundEvent): HeightAt {
  const startX = mmAtSeconds(scale, event.onsetSeconds);
  const startY = mmAtHz(scale, pitchHzAt(event, event.onsetSeconds));
  const alongX = mmAtSeconds(scale, event.durationSeconds);
  const alongY = mmAtHz(scale, pitchHzAt(event, endSeconds(event))) - startY;
  const length = Math.hypot(alongX, alongY);
  return (x, y) => {
    // Distance square to the ridge's own direction keeps a slanting ridge as wide as a level one.
    const away = Math.abs((x - startX) * alongY - (y - startY) * alongX) / length;
    if (away >= RIDGE_FOOT_HALF_MM) return 0;
    const share = ((x - startX) * alongX + (y - startY) * alongY) / length ** 2;
    const loudness = loudnessAt(event, event.onsetSeconds + share * event.durationSeconds);
    return loudness * smoothStep((RIDGE_FOOT_HALF_MM - away) / (RIDGE_FOOT_HALF_MM - RIDGE_TOP_HALF_MM));
  };
}

function roughField(scale: ModelScale, event: SoundEvent): HeightAt {
  const bottomMm = mmAtHz(scale, event.lowHz);
  const pebbles = pebbleField(scale);
  return (x, y) => {
    const seconds = secondsAtMm(scale, x);
    const loudness = loudnessAt(event, seconds);
    if (loudness === 0) return 0;
    const topMm = mmAtHz(scale, bandTopHzAt(event, seconds));
    const inside = Math.min(y - bottomMm, topMm - y);
    return loudness * smoothStep(inside / BAND_EDGE_MM) * (1 - HOLLOW_SHARE * (1 - pebbles(x, y)));
  };
}

/** Round bumps on a brick pattern, each moved a little: even enough to print, uneven enough to feel like noise. */
function pebbleField(scale: ModelScale): HeightAt {
  const chance = chanceFrom("pebbles");
  const across = Math.ceil(scale.widthMm / PEBBLE_PITCH_MM) + 3;
  const up = Math.ceil(scale.heightMm / PEBBLE_PITCH_MM) + 3;
  const centres = Array.from({ length: up }, (_, row) =>
    Array.from({ length: across }, (_, column) => ({
      x: (column - 1 + (row % 2) / 2 + (chance() - 0.5) * 0.3) * PEBBLE_PITCH_MM,
      y: (row - 1 + (chance() - 0.5) * 0.3) * PEBBLE_PITCH_MM,
    })),
  );
  return (x, y) => {
    const nearRow = Math.round(y / PEBBLE_PITCH_MM) + 1;
    const nearColumn = Math.round(x / PEBBLE_PITCH_MM) + 1;
    let nearest = Infinity;
    for (let row = nearRow - 1; row <= nearRow + 1; row++) {
      for (let column = nearColumn - 2; column <= nearColumn + 1; column++) {
        const centre = centres[row]?.[column];
        if (centre) nearest = Math.min(nearest, Math.hypot(x - centre.x, y - centre.y));
      }
    }
    return smoothStep(1 - nearest / PEBBLE_RADIUS_MM);
  };
}

/** Whole micrometres: finer than any printer, and what is nearly flat is flat. */
function stretchTo(heights: Float64Array, topMm: number): void {
  const highest = heights.reduce((most, height) => Math.max(most, height), 0);
  if (highest === 0) return;
  heights.forEach((height, index) => {
    heights[index] = Math.round((height / highest) * topMm * 1000) / 1000;
  });
}
