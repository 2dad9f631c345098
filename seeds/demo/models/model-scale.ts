/** What a model's size means. The left edge is second 0, the lower edge is lowestHz, the upper edge highestHz. */
export type ModelScale = {
  widthMm: number;
  heightMm: number;
  baseMm: number;
  /** Height of the loudest moment above the base. */
  reliefMmMax: number;
  /** Length of each short side of the triangle cut away at the lower right. */
  cutCornerMm: number;
  durationSeconds: number;
  secondsPerCm: number;
  lowestHz: number;
  highestHz: number;
  axis: "linear" | "log";
  /** Sounds nearer together than this blend under a finger. */
  smallestGapSeconds: number;
};

/**
 * Least distance between two shapes that a finger tells apart: 5 mm between separate lines.
 * Source: Round Table on Information Access, 3D printing design,
 * https://printdisability.org/about-us/accessible-graphics/3d-printing/design
 */
export const FINGER_GAP_MM = 5;

type GivenScale = Omit<ModelScale, "secondsPerCm" | "smallestGapSeconds">;

/** Completes a scale with the two figures that follow from width and duration. */
export function scaleFrom(given: GivenScale): ModelScale {
  const secondsPerCm = given.durationSeconds / (given.widthMm / 10);
  return { ...given, secondsPerCm, smallestGapSeconds: (FINGER_GAP_MM / 10) * secondsPerCm };
}

/** Millimetres from the left edge for a second of the sound. */
export function mmAtSeconds(scale: ModelScale, seconds: number): number {
  return (seconds / scale.secondsPerCm) * 10;
}

/** Second of the sound for millimetres from the left edge. */
export function secondsAtMm(scale: ModelScale, mm: number): number {
  return (mm / 10) * scale.secondsPerCm;
}

/** Millimetres from the lower edge for a pitch in hertz; below 0 or above heightMm if the pitch is off the model. */
export function mmAtHz(scale: ModelScale, hz: number): number {
  const share =
    scale.axis === "log"
      ? Math.log(hz / scale.lowestHz) / Math.log(scale.highestHz / scale.lowestHz)
      : (hz - scale.lowestHz) / (scale.highestHz - scale.lowestHz);
  return share * scale.heightMm;
}
