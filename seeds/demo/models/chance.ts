/**
 * A repeatable stream of numbers from 0 up to 1, so that the same model always gives the same bytes.
 * Xorshift with shifts 13, 17, 5: G. Marsaglia, "Xorshift RNGs", Journal of Statistical Software 8(14), 2003.
 */
export function chanceFrom(words: string): () => number {
  let state = 2166136261;
  for (const letter of words) state = Math.imul(state ^ (letter.codePointAt(0) ?? 0), 16777619) >>> 0;
  if (state === 0) state = 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return state / 2 ** 32;
  };
}
