import type { DemoModel } from "./demo-models";
import type { ReliefField } from "./relief";
import { heightMmAt, modelRelief } from "./relief";

type Point = readonly [x: number, y: number, z: number];
type Triangle = readonly [Point, Point, Point];

const HEADER_BYTES = 80;
const TRIANGLE_BYTES = 50;

/**
 * The model as a printable file: binary STL, millimetres, lying on its back with its face up. One closed surface:
 * a flat back at z = 0, upright sides, the relief above baseMm, the lower right corner cut away.
 * The layout is the common one (80-byte header, uint32 count, then twelve float32 and a uint16 a triangle, little
 * endian); common practice, no published source. Triangles turn anticlockwise seen from outside.
 */
export function modelPrintable(model: DemoModel): Uint8Array {
  const triangles = closedSurface(model);
  const bytes = new Uint8Array(HEADER_BYTES + 4 + triangles.length * TRIANGLE_BYTES);
  // A header beginning with "solid" would be taken for the text form of the format.
  bytes.set(new TextEncoder().encode(`Teaching model ${model.slug} version ${model.version}, millimetres`).slice(0, 80));
  const view = new DataView(bytes.buffer);
  view.setUint32(HEADER_BYTES, triangles.length, true);
  triangles.forEach((triangle, index) => writeTriangle(view, HEADER_BYTES + 4 + index * TRIANGLE_BYTES, triangle));
  return bytes;
}

function closedSurface(model: DemoModel): Triangle[] {
  const { scale } = model;
  const field = modelRelief(model);
  const cut = Math.round(scale.cutCornerMm / field.cellMm);
  const top = (column: number, row: number): Point => [
    column * field.cellMm,
    row * field.cellMm,
    scale.baseMm + heightMmAt(field, column, row),
  ];
  const rim = rimOf(field, cut).map(([column, row]) => top(column, row));
  const middle: Point = [scale.widthMm / 2, scale.heightMm / 2, 0];
  return [...faceOf(field, cut, top), ...sidesAndBack(rim, middle)];
}

/** The face: two triangles a cell, split along the direction of the cut, so that the cut runs along their edges. */
function faceOf(field: ReliefField, cut: number, top: (column: number, row: number) => Point): Triangle[] {
  const triangles: Triangle[] = [];
  const last = field.columns - 1;
  for (let row = 0; row < field.rows - 1; row++) {
    for (let column = 0; column < last; column++) {
      const a = top(column, row);
      const b = top(column + 1, row);
      const c = top(column + 1, row + 1);
      const d = top(column, row + 1);
      const fromCorner = last - column + row;
      if (fromCorner > cut) triangles.push([a, b, c]);
      if (fromCorner >= cut) triangles.push([a, c, d]);
    }
  }
  return triangles;
}

/** Crossings along the outer edge, anticlockwise from the lower left, with the lower right corner cut. */
function rimOf(field: ReliefField, cut: number): [column: number, row: number][] {
  const right = field.columns - 1;
  const upper = field.rows - 1;
  const rim: [number, number][] = [];
  for (let column = 0; column < right - cut; column++) rim.push([column, 0]);
  for (let step = 0; step < cut; step++) rim.push([right - cut + step, step]);
  for (let row = cut; row < upper; row++) rim.push([right, row]);
  for (let column = right; column > 0; column--) rim.push([column, upper]);
  for (let row = upper; row > 0; row--) rim.push([0, row]);
  return rim;
}

function sidesAndBack(rim: Point[], middle: Point): Triangle[] {
  return rim.flatMap((p, index): Triangle[] => {
    const q = rim[(index + 1) % rim.length];
    if (!q) return [];
    const pBack: Point = [p[0], p[1], 0];
    const qBack: Point = [q[0], q[1], 0];
    return [
      [pBack, qBack, q],
      [pBack, q, p],
      [middle, qBack, pBack],
    ];
  });
}

function writeTriangle(view: DataView, offset: number, triangle: Triangle): void {
  [normalOf(triangle), ...triangle].forEach((point, pointIndex) => {
    point.forEach((value, axis) => view.setFloat32(offset + pointIndex * 12 + axis * 4, value, true));
  });
}

function normalOf([a, b, c]: Triangle): Point {
  const [ux, uy, uz] = [b[0] - a[0], b[1] - a[1], b[2] - a[2]];
  const [vx, vy, vz] = [c[0] - a[0], c[1] - a[1], c[2] - a[2]];
  const [nx, ny, nz] = [uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx];
  const length = Math.hypot(nx, ny, nz);
  return [nx / length, ny / length, nz / length];
}
