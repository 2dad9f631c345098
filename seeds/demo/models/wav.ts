import { chanceFrom } from "./chance";
import type { DemoModel } from "./demo-models";
import type { SoundEvent } from "./model-events";
import { bandTopHzAt, endSeconds, loudnessAt, pitchHzAt } from "./model-events";

export const SAMPLE_RATE_HZ = 22050;
/** Peak of every recording, relative to full scale: loud enough to hear, with room to spare. */
export const PEAK_DBFS = -12;

const HEADER_BYTES = 44;
const FULL_SCALE = 32767;
/**
 * Half the loudness is taken as 10 dB less, so amplitude goes with loudness to the power log2(10) / 2.
 * Source: S. S. Stevens, "The measurement of loudness", J. Acoust. Soc. Am. 27, 1955 (from memory).
 */
const AMPLITUDE_POWER = Math.log2(10) / 2;

/**
 * The sound a model shows, made from the same events as its relief.
 * @returns a WAV file: PCM, 16 bit, mono, 22.05 kHz, as long as the model's scale says, peak at -12 dBFS
 */
export function modelAudio(model: DemoModel): Uint8Array {
  const samples = new Float64Array(Math.round(model.scale.durationSeconds * SAMPLE_RATE_HZ));
  for (const event of model.events) sound(samples, event);
  return wavFile(levelled(samples));
}

function sound(samples: Float64Array, event: SoundEvent): void {
  const first = Math.ceil(event.onsetSeconds * SAMPLE_RATE_HZ);
  const last = Math.min(samples.length, Math.floor(endSeconds(event) * SAMPLE_RATE_HZ));
  const carrier = event.kind === "noise" ? bandOfNoise(event, first, last - first) : voice(event, first, last - first);
  carrier.forEach((value, index) => {
    const amplitude = loudnessAt(event, (first + index) / SAMPLE_RATE_HZ) ** AMPLITUDE_POWER;
    samples[first + index] = (samples[first + index] ?? 0) + amplitude * value;
  });
}

/** A pure tone, held or gliding, of root mean square 1. */
function voice(event: SoundEvent, first: number, length: number): Float64Array {
  const carrier = new Float64Array(length);
  let phase = 0;
  for (let index = 0; index < length; index++) {
    carrier[index] = Math.SQRT2 * Math.sin(phase);
    phase += (2 * Math.PI * pitchHzAt(event, (first + index) / SAMPLE_RATE_HZ)) / SAMPLE_RATE_HZ;
  }
  return carrier;
}

/** Noise between the event's lowest and highest pitch, of root mean square 1. */
function bandOfNoise(event: SoundEvent, first: number, length: number): Float64Array {
  const chance = chanceFrom(event.name);
  // Run the filters in before the sound starts, so that it does not begin with their settling.
  const lead = Math.round(SAMPLE_RATE_HZ / 10);
  let noise = Float64Array.from({ length: lead + length }, () => chance() * 2 - 1);
  for (let pass = 0; pass < 2; pass++) {
    noise = filtered(noise, () => highPass(event.lowHz));
    noise = filtered(noise, (index) => lowPass(bandTopHzAt(event, (first - lead + index) / SAMPLE_RATE_HZ)));
  }
  const heard = noise.subarray(lead);
  const rms = Math.sqrt(heard.reduce((sum, value) => sum + value * value, 0) / length);
  return heard.map((value) => value / rms);
}

type Biquad = { b0: number; b1: number; b2: number; a1: number; a2: number };

/** Second-order filters with Q = 1/√2. Source: Audio EQ Cookbook, https://www.w3.org/TR/audio-eq-cookbook/ */
function lowPass(hz: number): Biquad {
  const { cosine, alpha } = corner(hz);
  return biquad((1 - cosine) / 2, 1 - cosine, (1 - cosine) / 2, cosine, alpha);
}

function highPass(hz: number): Biquad {
  const { cosine, alpha } = corner(hz);
  return biquad((1 + cosine) / 2, -(1 + cosine), (1 + cosine) / 2, cosine, alpha);
}

function corner(hz: number): { cosine: number; alpha: number } {
  const turn = (2 * Math.PI * hz) / SAMPLE_RATE_HZ;
  return { cosine: Math.cos(turn), alpha: Math.sin(turn) / Math.SQRT2 };
}

function biquad(b0: number, b1: number, b2: number, cosine: number, alpha: number): Biquad {
  const a0 = 1 + alpha;
  return { b0: b0 / a0, b1: b1 / a0, b2: b2 / a0, a1: (-2 * cosine) / a0, a2: (1 - alpha) / a0 };
}

/** How often a filter may move; short against any change a sound makes. */
const FILTER_BLOCK = 32;

function filtered(input: Float64Array, filterAt: (index: number) => Biquad): Float64Array<ArrayBuffer> {
  let [x1, x2, y1, y2] = [0, 0, 0, 0];
  let filter = filterAt(0);
  return Float64Array.from(input, (x, index) => {
    if (index % FILTER_BLOCK === 0) filter = filterAt(index);
    const y = filter.b0 * x + filter.b1 * x1 + filter.b2 * x2 - filter.a1 * y1 - filter.a2 * y2;
    [x2, x1, y2, y1] = [x1, x, y1, y];
    return y;
  });
}

function levelled(samples: Float64Array): Int16Array {
  const peak = samples.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const gain = peak === 0 ? 0 : (10 ** (PEAK_DBFS / 20) * FULL_SCALE) / peak;
  return Int16Array.from(samples, (value) => Math.round(value * gain));
}

function wavFile(samples: Int16Array): Uint8Array {
  const dataBytes = samples.length * 2;
  const bytes = new Uint8Array(HEADER_BYTES + dataBytes);
  const view = new DataView(bytes.buffer);
  const letters = (offset: number, word: string) => bytes.set(new TextEncoder().encode(word), offset);
  letters(0, "RIFF");
  view.setUint32(4, HEADER_BYTES - 8 + dataBytes, true);
  letters(8, "WAVEfmt ");
  view.setUint32(16, 16, true);
  view.setUint16(20, 1, true); // PCM
  view.setUint16(22, 1, true); // one channel
  view.setUint32(24, SAMPLE_RATE_HZ, true);
  view.setUint32(28, SAMPLE_RATE_HZ * 2, true);
  view.setUint16(32, 2, true);
  view.setUint16(34, 16, true);
  letters(36, "data");
  view.setUint32(40, dataBytes, true);
  samples.forEach((sample, index) => view.setInt16(HEADER_BYTES + index * 2, sample, true));
  return bytes;
}
