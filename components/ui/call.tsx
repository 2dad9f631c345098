/**
 * The call: a row of strokes that rises and turns like a flock, drawn from an outing's own name,
 * so that each has its mark. Decoration only, so it is hidden from screen readers.
 */
export function Call({ name, className = "" }: { name: string; className?: string }) {
  return (
    <svg viewBox="0 0 520 150" aria-hidden="true" fill="none" stroke="currentColor" strokeWidth="5" strokeLinecap="round" className={`text-marsh ${className}`}>
      <path d={callPath(name)} />
    </svg>
  );
}

/** The same name gives the same path: four swells whose place, height and turn come from the letters. */
export function callPath(name: string): string {
  const chance = chanceFrom(name);
  const swells = Array.from({ length: 4 }, () => ({ at: chance(), wide: 0.05 + chance() * 0.12, high: 0.4 + chance() * 0.6, lean: chance() * 2 - 1 }));
  const strokes = 44;
  let path = "";
  for (let index = 0; index < strokes; index += 1) {
    const x = index / (strokes - 1);
    const near = swells.map((swell) => swell.high * Math.exp(-(((x - swell.at) / swell.wide) ** 2)));
    const height = 5 + 52 * Math.min(1, near.reduce((sum, one) => sum + one, 0));
    const lean = 7 * Math.sin(x * 7 + (swells[0]?.lean ?? 0) * 3) + 3 * (swells[1]?.lean ?? 0);
    const middle = 75 + 22 * Math.sin(x * 5 + (swells[2]?.lean ?? 0) * 3);
    const left = 10 + x * 500;
    path += `M${round(left + lean / 2)} ${round(Math.max(6, middle - height / 1.6))}L${round(left - lean / 2)} ${round(Math.min(144, middle + height / 1.6))}`;
  }
  return path;
}

const round = (value: number) => Math.round(value * 10) / 10;

/** A stream of numbers in [0, 1) that depends only on the words (FNV-1a seed, mulberry32). */
function chanceFrom(words: string): () => number {
  let state = 2_166_136_261;
  for (const letter of words) state = Math.imul(state ^ (letter.codePointAt(0) ?? 0), 16_777_619);
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}
