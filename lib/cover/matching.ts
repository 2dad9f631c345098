/**
 * People matched to adults, at most one to one. Both sides are positions, 0 to n - 1; `NONE` is nobody.
 */
export type Matching = { readonly adultOf: number[]; readonly personOf: number[] };

/** For each person, the positions of the adults who would do. */
export type Choices = readonly (readonly number[])[];

export const NONE = -1;

/** Walks back along the path that reached a free adult and gives every person on it their new adult. */
function settle(freeAdult: number, reachedFrom: ReadonlyMap<number, number>, matching: Matching): void {
  let adult = freeAdult;
  while (adult !== NONE) {
    const person = reachedFrom.get(adult) ?? NONE;
    const before = matching.adultOf[person] ?? NONE;
    matching.adultOf[person] = adult;
    matching.personOf[adult] = person;
    adult = before;
  }
}

/**
 * Looks, breadth first, for a free adult along alternating paths from the given people's choices. Returns that
 * adult (or NONE) with everyone and every adult met on the way.
 */
function search(from: readonly number[], choices: Choices, matching: Matching, closed: ReadonlySet<number>) {
  const reachedFrom = new Map<number, number>();
  const queue = [...from];
  for (const person of queue) {
    for (const adult of choices[person] ?? []) {
      if (closed.has(adult) || reachedFrom.has(adult)) continue;
      reachedFrom.set(adult, person);
      const holder = matching.personOf[adult] ?? NONE;
      if (holder === NONE) return { freeAdult: adult, reachedFrom, people: queue };
      queue.push(holder);
    }
  }
  return { freeAdult: NONE, reachedFrom, people: queue };
}

/**
 * A largest possible matching, by augmenting paths. Starting from a given matching keeps everyone in it matched,
 * adults and people, though perhaps to someone else. Its size is exact, not an estimate.
 */
export function largestMatching(choices: Choices, adultCount: number, start?: Matching): Matching {
  const matching: Matching = {
    adultOf: start ? [...start.adultOf] : choices.map(() => NONE),
    personOf: start ? [...start.personOf] : Array.from({ length: adultCount }, () => NONE),
  };
  // Whatever a failed search met can never lead to a free adult later, so no later search looks there again.
  const closed = new Set<number>();
  for (const person of choices.keys()) {
    if (matching.adultOf[person] !== NONE) continue;
    const { freeAdult, reachedFrom } = search([person], choices, matching, closed);
    if (freeAdult === NONE) for (const adult of reachedFrom.keys()) closed.add(adult);
    else settle(freeAdult, reachedFrom, matching);
  }
  return matching;
}

export function matchedCount(matching: Matching): number {
  return matching.adultOf.filter((adult) => adult !== NONE).length;
}

/**
 * Of a largest matching that leaves somebody out: the people whose choices together are too few, and all of those
 * choices. There are more such people than adults by exactly the number left out (Hall's theorem, in König's
 * form). Null when nobody is left out.
 */
export function tooFewAdultsFor(
  choices: Choices,
  matching: Matching,
): { people: number[]; adults: number[] } | null {
  const leftOut = [...choices.keys()].filter((person) => (matching.adultOf[person] ?? NONE) === NONE);
  if (leftOut.length === 0) return null;
  const { reachedFrom, people } = search(leftOut, choices, matching, new Set());
  return { people: people.toSorted((a, b) => a - b), adults: [...reachedFrom.keys()].toSorted((a, b) => a - b) };
}

/** A matching with these adults free again, to start another from. */
export function freed(matching: Matching, adults: Iterable<number>): Matching {
  const [adultOf, personOf] = [[...matching.adultOf], [...matching.personOf]];
  for (const adult of adults) {
    const person = personOf[adult] ?? NONE;
    if (person !== NONE) adultOf[person] = NONE;
    personOf[adult] = NONE;
  }
  return { adultOf, personOf };
}

/**
 * The adults whom one more person could have while everyone matched keeps an adult: those who are free, and those
 * whose person could move, in steps, to one who is.
 */
export function adultsToBeHad(choices: Choices, matching: Matching): Set<number> {
  const choosers = matching.personOf.map((): number[] => []);
  choices.forEach((options, person) => options.forEach((adult) => choosers[adult]?.push(person)));
  const queue = [...matching.personOf.keys()].filter((adult) => matching.personOf[adult] === NONE);
  const reached = new Set(queue);
  for (const adult of queue) {
    for (const person of choosers[adult] ?? []) {
      const theirs = matching.adultOf[person] ?? NONE;
      if (theirs === NONE || reached.has(theirs)) continue;
      reached.add(theirs);
      queue.push(theirs);
    }
  }
  return reached;
}
