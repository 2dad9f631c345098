/** A model that turns a sound into something a hand can read. Lengths in mm, times in seconds, pitches in Hz. */
export type TeachingModelFacts = {
  forWhom: string;
  level: string;
  description: string;
  fingerTour: string[];
  listenFor: string[];
  scale: {
    widthMm: number;
    heightMm: number;
    baseMm: number;
    reliefMmMax: number;
    secondsPerCm: number;
    durationSeconds: number;
    smallestGapSeconds: number;
    lowestHz: number;
    highestHz: number;
    axis: "linear" | "log";
  };
  copies: number;
  making: { layerHeightMm: number; material: string; orientation: string; cutCorner: string; notes: string[] };
  safety: string;
  audioInWords: string;
  audioSeconds: number;
  pictureAlt: string;
  version: string;
  status: string;
};

export type TeachingModel = {
  id: string;
  slug: string;
  title: string;
  concept: string;
  facts: TeachingModelFacts;
  picture: StoredFile;
  audio: StoredFile;
  printable: StoredFile;
};

export type StoredFile = { sha256: string; bytes: number; mediaType: string };

export const modelFiles = ["picture", "audio", "printable"] as const;
