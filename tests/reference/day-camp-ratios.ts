/**
 * Supervision ratios for day camps, as published, and the sums worked from them by hand. A band's ratio is
 * participants per adult. Both ends of a band are included.
 */
const WASHINGTON_FAMILY = "https://www.washingtonfamily.com/10-questions-for-camp-directors-2/";
const TPG_ONLINE_DAILY = "https://tpgonlinedaily.com/choosing-a-summer-camp";

/** American Camp Association, day camp, as both pages report it. The top band is written 15–17 or 15–18. */
export const publishedDayCampBands = [
  { ages: [6, 7, 8], participantsPerAdult: 8, source: `${WASHINGTON_FAMILY} ; ${TPG_ONLINE_DAILY} (from 7)` },
  { ages: [9, 10, 11, 12, 13, 14], participantsPerAdult: 10, source: `${WASHINGTON_FAMILY} ; ${TPG_ONLINE_DAILY}` },
  { ages: [15, 16, 17, 18], participantsPerAdult: 12, source: `${WASHINGTON_FAMILY} ; ${TPG_ONLINE_DAILY}` },
] as const;

/** Reported without a page that could be named. */
export const fromMemoryDayCampBands = [
  { ages: [3, 4, 5], participantsPerAdult: 6, source: "from memory" },
] as const;

/** One adult for one person with severe needs is published; the rest of the set is from memory. */
export const supportRatios = [
  { level: "constant", participantsPerAdult: 1, source: WASHINGTON_FAMILY },
  { level: "close", participantsPerAdult: 2, source: "from memory" },
  { level: "occasional", participantsPerAdult: 4, source: "from memory" },
  { level: "minimal", participantsPerAdult: 5, source: "from memory" },
] as const;

/**
 * Worked by hand from the bands: each band is rounded up by itself and the bands are added. By support levels the
 * same people may need more; these are the supervision figures alone.
 */
export const workedMixedAges = [
  { children: [{ count: 11, age: 6 }], adults: 2 },
  { children: [{ count: 8, age: 8 }], adults: 1 },
  { children: [{ count: 9, age: 8 }], adults: 2 },
  // Not ceil(22 / 8) = 3, nor ceil(11/8 + 11/10) = 3.
  { children: [{ count: 11, age: 6 }, { count: 11, age: 10 }], adults: 4 },
  { children: [{ count: 1, age: 8 }, { count: 1, age: 9 }], adults: 2 },
  { children: [{ count: 1, age: 5 }, { count: 1, age: 7 }, { count: 1, age: 14 }, { count: 1, age: 15 }], adults: 4 },
  { children: [{ count: 24, age: 15 }], adults: 2 },
  { children: [{ count: 25, age: 18 }], adults: 3 },
] as const;
