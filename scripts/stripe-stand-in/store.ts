import { existsSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { stateSchema } from "./records";
import type {
  ChargeRecord,
  EventRecord,
  PaymentIntentRecord,
  RefundRecord,
  RememberedReply,
  SessionRecord,
  State,
} from "./records";

export type Store = {
  sessions: Map<string, SessionRecord>;
  paymentIntents: Map<string, PaymentIntentRecord>;
  charges: Map<string, ChargeRecord>;
  refunds: Map<string, RefundRecord>;
  events: Map<string, EventRecord>;
  rememberedReplies: Map<string, RememberedReply>;
  /** Writes the state file, if there is one. Called once at the end of whatever changed something. */
  save(): void;
  clear(): void;
};

/**
 * Everything in memory, in order of creation. With a file, the same state is there again after a restart.
 * @throws when the file holds something that is not this program's state
 */
export function openStore(stateFile: string | null): Store {
  const state = stateFile === null ? null : readState(stateFile);
  const store: Store = {
    sessions: byId(state?.sessions ?? []),
    paymentIntents: byId(state?.paymentIntents ?? []),
    charges: byId(state?.charges ?? []),
    refunds: byId(state?.refunds ?? []),
    events: byId(state?.events ?? []),
    rememberedReplies: new Map((state?.rememberedReplies ?? []).map((reply) => [reply.key, reply])),
    save: () => {
      if (stateFile !== null) writeState(stateFile, store);
    },
    clear: () => {
      for (const records of collectionsOf(store)) records.clear();
      store.save();
    },
  };
  return store;
}

function byId<T extends { id: string }>(records: T[]): Map<string, T> {
  return new Map(records.map((record) => [record.id, record]));
}

function collectionsOf(store: Store): { clear(): void }[] {
  const { sessions, paymentIntents, charges, refunds, events, rememberedReplies } = store;
  return [sessions, paymentIntents, charges, refunds, events, rememberedReplies];
}

function readState(stateFile: string): State | null {
  if (!existsSync(stateFile)) return null;
  return stateSchema.parse(JSON.parse(readFileSync(stateFile, "utf8")));
}

function writeState(stateFile: string, store: Store): void {
  const state: State = {
    sessions: [...store.sessions.values()],
    paymentIntents: [...store.paymentIntents.values()],
    charges: [...store.charges.values()],
    refunds: [...store.refunds.values()],
    events: [...store.events.values()],
    rememberedReplies: [...store.rememberedReplies.values()],
  };
  // Written aside and renamed, so that a stop in the middle leaves the old state and not half of the new one.
  const aside = `${stateFile}.new`;
  writeFileSync(aside, JSON.stringify(state, null, 2));
  renameSync(aside, stateFile);
}
