export type Clock = {
  /** Whole seconds since 1970, as Stripe writes every instant. */
  seconds(): number;
  /** Moves the stand-in's own time ahead, so that a session can grow old in a test that does not wait. */
  advance(seconds: number): void;
};

export function createClock(): Clock {
  let aheadSeconds = 0;
  return {
    seconds: () => Math.floor(Date.now() / 1000) + aheadSeconds,
    advance: (seconds) => {
      aheadSeconds += seconds;
    },
  };
}
