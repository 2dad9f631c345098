/** How an API call goes wrong: nothing is done and 500 answered, or all is done and the answer is lost. */
export type FaultKind = "error" | "lost-reply";

export type Faults = {
  plan(kind: FaultKind, calls: number): void;
  /** The fault of the call that begins now, if one is planned. */
  next(): FaultKind | null;
  clear(): void;
};

export function createFaults(): Faults {
  let planned: { kind: FaultKind; callsLeft: number } | null = null;
  return {
    plan: (kind, calls) => {
      planned = { kind, callsLeft: calls };
    },
    next: () => {
      if (planned === null || planned.callsLeft <= 0) return null;
      planned.callsLeft -= 1;
      return planned.kind;
    },
    clear: () => {
      planned = null;
    },
  };
}
