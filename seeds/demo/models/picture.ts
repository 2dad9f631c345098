import sharp from "sharp";
import type { Crossing } from "./contours";
import { contoursAt } from "./contours";
import type { DemoModel } from "./demo-models";
import { modelRelief } from "./relief";

const WIDTH = 1200;
const HEIGHT = 800;
const PX_PER_MM = 5.2;

const INK = "#10222b";
const PAPER = "#fbfaf5";
const MARSH = "#0b5446";
const FOAM = "#e3efe9";
const SHELL = "#f3e7d3";

/**
 * A picture of the model seen from above, drawn from its relief: the plate with its cut corner, and the relief in
 * steps, like layers of cut paper, lighter as it rises. No words in it; model.pictureAlt says what it shows.
 * @returns a PNG, 1200 by 800
 */
export async function modelPicture(model: DemoModel): Promise<Uint8Array> {
  const png = await sharp(Buffer.from(pictureSvg(model))).png({ palette: true, colours: 128 }).toBuffer();
  return new Uint8Array(png);
}

/** The same picture as SVG text. */
export function pictureSvg(model: DemoModel): string {
  const left = (WIDTH - model.scale.widthMm * PX_PER_MM) / 2;
  const top = (HEIGHT - model.scale.heightMm * PX_PER_MM) / 2;
  const plate = platePath(model);
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${WIDTH}" height="${HEIGHT}" viewBox="0 0 ${WIDTH} ${HEIGHT}">`,
    `<rect width="${WIDTH}" height="${HEIGHT}" fill="${SHELL}"/>`,
    `<g transform="translate(${left} ${top})">`,
    `<path d="${plate}" transform="translate(10 14)" fill="${INK}" opacity="0.18"/>`,
    `<path d="${plate}" fill="${MARSH}" stroke="${INK}" stroke-width="4" stroke-linejoin="round"/>`,
    ...reliefLayers(model),
    "</g></svg>",
  ].join("");
}

function platePath(model: DemoModel): string {
  const { widthMm, heightMm, cutCornerMm } = model.scale;
  const [w, h, cut] = [widthMm * PX_PER_MM, heightMm * PX_PER_MM, cutCornerMm * PX_PER_MM];
  return `M0 0H${w}V${h - cut}L${w - cut} ${h}H0Z`;
}

/**
 * From the foot of the relief to its top; each step is a share of the full height and the colour from there up.
 * The lowest already stands against the plate at 3:1.
 */
const STEPS: readonly { from: number; colour: string }[] = [
  { from: 0.06, colour: mix(MARSH, FOAM, 0.5) },
  { from: 0.2, colour: mix(MARSH, FOAM, 0.58) },
  { from: 0.34, colour: mix(MARSH, FOAM, 0.67) },
  { from: 0.48, colour: mix(MARSH, FOAM, 0.77) },
  { from: 0.62, colour: mix(MARSH, FOAM, 0.88) },
  { from: 0.76, colour: FOAM },
  { from: 0.9, colour: PAPER },
];

function reliefLayers(model: DemoModel): string[] {
  const field = modelRelief(model);
  return STEPS.flatMap(({ from, colour }) => {
    const rings = contoursAt(field, from * model.scale.reliefMmMax);
    const path = rings.map((ring) => ringPath(ring, model.scale.heightMm)).join("");
    // Each layer throws a thin shadow to the lower right, as if the light came over the left shoulder.
    return [
      `<path d="${path}" transform="translate(1.5 2.5)" fill="${INK}" fill-rule="evenodd" opacity="0.3"/>`,
      `<path d="${path}" fill="${colour}" fill-rule="evenodd"/>`,
    ];
  });
}

/** A ring through the middles of its sides, bent at its corners: the grid's steps disappear. */
function ringPath(ring: Crossing[], heightMm: number): string {
  const points = softened(ring).map(({ xMm, yMm }) => ({ x: xMm * PX_PER_MM, y: (heightMm - yMm) * PX_PER_MM }));
  const sides = points.map((point, index) => {
    const after = points[(index + 1) % points.length] ?? point;
    return { point: after, middle: { x: (point.x + after.x) / 2, y: (point.y + after.y) / 2 } };
  });
  const curves = sides.map((side, index) => {
    const end = (sides[(index + 1) % sides.length] ?? side).middle;
    return `Q${px(side.point.x)} ${px(side.point.y)} ${px(end.x)} ${px(end.y)}`;
  });
  const start = sides[0]?.middle ?? { x: 0, y: 0 };
  return `M${px(start.x)} ${px(start.y)}${curves.join("")}Z`;
}

/** Each point moved towards its neighbours, which evens out the steps of the grid on slanting edges. */
function softened(ring: Crossing[]): Crossing[] {
  return ring.map((point, index) => {
    const before = ring[(index + ring.length - 1) % ring.length] ?? point;
    const after = ring[(index + 1) % ring.length] ?? point;
    return {
      xMm: (before.xMm + 2 * point.xMm + after.xMm) / 4,
      yMm: (before.yMm + 2 * point.yMm + after.yMm) / 4,
    };
  });
}

function px(value: number): string {
  return value.toFixed(1);
}

function mix(from: string, to: string, share: number): string {
  const channel = (colour: string, at: number) => Number.parseInt(colour.slice(at, at + 2), 16);
  const mixed = [1, 3, 5].map((at) => Math.round(channel(from, at) * (1 - share) + channel(to, at) * share));
  return `#${mixed.map((value) => value.toString(16).padStart(2, "0")).join("")}`;
}
