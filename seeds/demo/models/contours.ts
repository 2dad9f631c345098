import type { ReliefField } from "./relief";
import { heightMmAt } from "./relief";

export type Crossing = { xMm: number; yMm: number };

/**
 * Outlines of everything higher than a level, by marching squares: closed rings in millimetres from the lower left.
 * Needs a field whose outer ring is lower than the level, as modelRelief gives, so that every ring closes.
 */
export function contoursAt(field: ReliefField, levelMm: number): Crossing[][] {
  const crossings = new Map<number, Crossing>();
  const next = new Map<number, number>();
  for (let row = 0; row < field.rows - 1; row++) {
    for (let column = 0; column < field.columns - 1; column++) {
      for (const [from, to] of segmentsIn(field, levelMm, column, row)) {
        next.set(edgeKey(field, from), edgeKey(field, to));
        crossings.set(edgeKey(field, from), crossingOn(field, levelMm, from));
      }
    }
  }
  return ringsFrom(next, crossings);
}

type Side = "bottom" | "right" | "top" | "left";
type Edge = { column: number; row: number; upright: boolean };

/** For each pattern of corners above the level (1 a, 2 b, 4 c, 8 d, anticlockwise): from side, to side, high on the left. */
const SEGMENTS: readonly (readonly (readonly [Side, Side])[])[] = [
  [],
  [["bottom", "left"]],
  [["right", "bottom"]],
  [["right", "left"]],
  [["top", "right"]],
  [["bottom", "left"], ["top", "right"]],
  [["top", "bottom"]],
  [["top", "left"]],
  [["left", "top"]],
  [["bottom", "top"]],
  [["right", "bottom"], ["left", "top"]],
  [["right", "top"]],
  [["left", "right"]],
  [["bottom", "right"]],
  [["left", "bottom"]],
  [],
];

function segmentsIn(field: ReliefField, level: number, column: number, row: number): [Edge, Edge][] {
  const above = (c: number, r: number) => (heightMmAt(field, c, r) > level ? 1 : 0);
  const pattern =
    above(column, row) +
    2 * above(column + 1, row) +
    4 * above(column + 1, row + 1) +
    8 * above(column, row + 1);
  const edges: Record<Side, Edge> = {
    bottom: { column, row, upright: false },
    right: { column: column + 1, row, upright: true },
    top: { column, row: row + 1, upright: false },
    left: { column, row, upright: true },
  };
  return (SEGMENTS[pattern] ?? []).map(([from, to]) => [edges[from], edges[to]]);
}

function edgeKey(field: ReliefField, { column, row, upright }: Edge): number {
  return 2 * (row * field.columns + column) + (upright ? 1 : 0);
}

function crossingOn(field: ReliefField, level: number, { column, row, upright }: Edge): Crossing {
  const here = heightMmAt(field, column, row);
  const there = upright ? heightMmAt(field, column, row + 1) : heightMmAt(field, column + 1, row);
  const share = (level - here) / (there - here);
  return {
    xMm: (column + (upright ? 0 : share)) * field.cellMm,
    yMm: (row + (upright ? share : 0)) * field.cellMm,
  };
}

function ringsFrom(next: Map<number, number>, crossings: Map<number, Crossing>): Crossing[][] {
  const rings: Crossing[][] = [];
  const unused = new Set(next.keys());
  for (const start of next.keys()) {
    const ring: Crossing[] = [];
    let key: number | undefined = start;
    while (key !== undefined && unused.delete(key)) {
      const crossing = crossings.get(key);
      if (crossing) ring.push(crossing);
      key = next.get(key);
    }
    if (ring.length > 2) rings.push(ring);
  }
  return rings;
}
