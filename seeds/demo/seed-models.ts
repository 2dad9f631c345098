import { storeFile } from "@/lib/files/file-store";
import type { TeachingModelFacts } from "@/lib/teaching-models/teaching-model";
import { insertModel } from "@/lib/teaching-models/teaching-model-store";
import { demoModels, type DemoModel } from "./models/demo-models";
import { modelPicture } from "./models/picture";
import { modelPrintable } from "./models/stl";
import { modelAudio } from "./models/wav";
import type { Story } from "./story";

type MadeFiles = { picture: Uint8Array; audio: Uint8Array; printable: Uint8Array };

const made = new Map<string, MadeFiles>();

/** A model's files. They are the same each time and take half a second, so a process makes them once. */
async function filesOf(model: DemoModel): Promise<MadeFiles> {
  const before = made.get(model.slug);
  if (before) return before;
  const files = { picture: await modelPicture(model), audio: modelAudio(model), printable: modelPrintable(model) };
  made.set(model.slug, files);
  return files;
}

/** The five models with their files, and their ids by slug. */
export async function seedModels(story: Story, filesDir: string): Promise<ReadonlyMap<string, string>> {
  const ids = new Map<string, string>();
  const at = story.daysAgo(115, "14:00");
  for (const [position, model] of demoModels.entries()) {
    const keep = (bytes: Uint8Array, mediaType: string) => storeFile(story.conn, at, filesDir, { bytes, mediaType });
    const { slug, title, concept } = model;
    const { picture, audio, printable } = await filesOf(model);
    const id = insertModel(story.conn, {
      slug,
      title,
      concept,
      facts: factsOf(model),
      pictureSha256: keep(picture, "image/png"),
      audioSha256: keep(audio, "audio/wav"),
      printableSha256: keep(printable, "model/stl"),
      position,
    });
    ids.set(slug, id);
  }
  return ids;
}

function factsOf(model: DemoModel): TeachingModelFacts {
  const { scale, making, audio } = model;
  return {
    forWhom: model.forWhom,
    level: model.level,
    description: model.description,
    fingerTour: model.fingerTour.map((step) => step.say),
    listenFor: [...model.listenFor],
    scale: {
      widthMm: scale.widthMm,
      heightMm: scale.heightMm,
      baseMm: scale.baseMm,
      reliefMmMax: scale.reliefMmMax,
      secondsPerCm: scale.secondsPerCm,
      durationSeconds: scale.durationSeconds,
      smallestGapSeconds: scale.smallestGapSeconds,
      lowestHz: scale.lowestHz,
      highestHz: scale.highestHz,
      axis: scale.axis,
    },
    copies: model.copies,
    making: { ...making, notes: [...making.notes] },
    safety: model.safety,
    audioInWords: audio.inWords,
    audioSeconds: audio.durationSeconds,
    pictureAlt: model.pictureAlt,
    version: model.version,
    status: model.status,
  };
}
