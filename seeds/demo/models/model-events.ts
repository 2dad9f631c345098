/** How the loudness of a sound moves from its onset to its end. */
export type Envelope = "steady" | "strike" | "swell" | "wave";

type EventBase = {
  /** Name used by the finger tour to point at this sound. Unique in its model. */
  name: string;
  onsetSeconds: number;
  durationSeconds: number;
  lowHz: number;
  highHz: number;
  /** 0 is silence, 1 the loudest moment of the model; half the number sounds half as loud. */
  loudness: number;
  envelope: Envelope;
};

/**
 * One sound of a teaching model. A tone has one pitch (lowHz = highHz), a noise fills the band from lowHz
 * to highHz, a glide moves from one to the other by equal musical steps in equal times. A noise that brightens
 * reaches highHz only at its loudest moment.
 */
export type SoundEvent = EventBase &
  ({ kind: "tone" } | { kind: "noise"; brightens?: boolean } | { kind: "glide"; direction: "up" | "down" });

/** Long enough that a steady sound neither clicks in the ear nor ends in a knife edge under the finger. */
const STEADY_RAMP_SECONDS = 0.06;
/** Share of a wave that has passed when it breaks: it gathers slowly and runs out fast. */
const CREST_SHARE = 0.75;
/** A wave murmurs from its first moment, loud enough that a finger finds where it begins. */
const MURMUR_SHARE = 0.25;
/** A brightening noise begins with this share of its band, counted in octaves. */
const DULL_SHARE = 0.12;

/** The second at which a sound ends. */
export function endSeconds(event: SoundEvent): number {
  return event.onsetSeconds + event.durationSeconds;
}

/**
 * Loudness of a sound at a moment.
 * @param seconds time from the start of the model
 * @returns 0 to event.loudness; 0 outside the sound and at both of its ends
 */
export function loudnessAt(event: SoundEvent, seconds: number): number {
  const elapsed = seconds - event.onsetSeconds;
  if (elapsed <= 0 || elapsed >= event.durationSeconds) return 0;
  return event.loudness * envelopeAt(event.envelope, elapsed, event.durationSeconds);
}

/**
 * Pitch of a tone or glide at a moment; the middle of the band, in octaves, for a noise.
 * @param seconds time from the start of the model; held at the nearer end outside the sound
 * @returns hertz
 */
export function pitchHzAt(event: SoundEvent, seconds: number): number {
  const octaves = Math.log2(event.highHz / event.lowHz);
  if (event.kind !== "glide") return event.lowHz * 2 ** (octaves / 2);
  const share = clamp01((seconds - event.onsetSeconds) / event.durationSeconds);
  return event.lowHz * 2 ** (octaves * (event.direction === "up" ? share : 1 - share));
}

/** Upper edge of a sound at a moment, in hertz: highHz, or less while a brightening noise is not at its loudest. */
export function bandTopHzAt(event: SoundEvent, seconds: number): number {
  if (event.kind !== "noise" || !event.brightens) return event.highHz;
  const share = DULL_SHARE + (1 - DULL_SHARE) * (loudnessAt(event, seconds) / event.loudness);
  return event.lowHz * (event.highHz / event.lowHz) ** share;
}

/** The second at which a wave breaks. */
export function crestSeconds(event: SoundEvent): number {
  return event.onsetSeconds + CREST_SHARE * event.durationSeconds;
}

/** 0 below 0, 1 above 1, and a curve between them that starts and ends level. */
export function smoothStep(share: number): number {
  const s = clamp01(share);
  return s * s * (3 - 2 * s);
}

function clamp01(value: number): number {
  return Math.min(1, Math.max(0, value));
}

function envelopeAt(envelope: Envelope, elapsed: number, duration: number): number {
  const share = elapsed / duration;
  switch (envelope) {
    case "steady":
      return smoothStep(elapsed / STEADY_RAMP_SECONDS) * smoothStep((duration - elapsed) / STEADY_RAMP_SECONDS);
    case "strike":
      return smoothStep(share / 0.15) * smoothStep((1 - share) / 0.6);
    case "swell":
      return smoothStep(share / 0.3) * smoothStep((1 - share) / 0.3);
    case "wave":
      return share < CREST_SHARE
        ? smoothStep(share / 0.08) * (MURMUR_SHARE + (1 - MURMUR_SHARE) * gathering(share / CREST_SHARE))
        : smoothStep((1 - share) / (1 - CREST_SHARE));
  }
}

/** Slow at first, then steeper, then round at the top. */
function gathering(share: number): number {
  return Math.sin((Math.PI / 2) * share) ** 4;
}
