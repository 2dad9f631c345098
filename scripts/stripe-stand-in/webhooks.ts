import type { EventRecord } from "./records";
import type { Store } from "./store";
import { signWebhook } from "./webhook-signature";

export type WebhookOptions = {
  url: string;
  secret: string;
  /** Waits before the second and later attempts; as many attempts as entries, and one. */
  retryDelaysMs: readonly number[];
  attemptTimeoutMs: number;
  onGivenUp(event: EventRecord): void;
};

export type Webhooks = {
  /** Sends the event in the background, or keeps it while deliveries are held. Never waits for the receiver. */
  announce(event: EventRecord): void;
  /** Sends an event once more, right now and once, and tells what the receiver answered (null: nobody did). */
  redeliver(event: EventRecord): Promise<number | null>;
  hold(): void;
  /** Sends what was held. */
  release(): void;
  isHolding(): boolean;
  /** Resolves when nothing is on its way any more: all delivered, given up, or held. */
  settled(): Promise<void>;
  /** Takes up what an earlier run left undelivered. */
  resume(): void;
  /** Drops everything on its way, for a fresh start. */
  forget(): void;
  close(): void;
};

export function createWebhooks(store: Store, options: WebhookOptions): Webhooks {
  let holding = false;
  let stopped = new AbortController();
  const underway = new Set<Promise<void>>();

  function begin(event: EventRecord): void {
    event.delivery = "pending";
    const delivery = deliver(store, event, options, stopped.signal).finally(() => underway.delete(delivery));
    underway.add(delivery);
  }

  function sendAll(state: EventRecord["delivery"]): void {
    for (const event of store.events.values()) if (event.delivery === state) begin(event);
  }

  return {
    announce: (event) => {
      if (!holding) return begin(event);
      event.delivery = "held";
    },
    redeliver: (event) => attempt(store, event, options, stopped.signal),
    hold: () => {
      holding = true;
    },
    release: () => {
      holding = false;
      sendAll("held");
    },
    isHolding: () => holding,
    settled: async () => {
      while (underway.size > 0) await Promise.allSettled(underway);
    },
    resume: () => {
      sendAll("pending");
      sendAll("held");
    },
    forget: () => {
      stopped.abort();
      stopped = new AbortController();
      holding = false;
    },
    close: () => stopped.abort(),
  };
}

async function deliver(store: Store, event: EventRecord, options: WebhookOptions, stop: AbortSignal): Promise<void> {
  for (const delayMs of [0, ...options.retryDelaysMs]) {
    await pause(delayMs, stop);
    // A redelivery asked for in the meantime may have arrived already.
    if (isOver(event, stop)) return;
    await attempt(store, event, options, stop);
    // Stopped in the middle: the event stays pending, and a later run with the same state file sends it.
    if (isOver(event, stop)) return;
  }
  event.delivery = "given-up";
  store.save();
  options.onGivenUp(event);
}

async function attempt(
  store: Store,
  event: EventRecord,
  options: WebhookOptions,
  stop: AbortSignal,
): Promise<number | null> {
  const httpStatus = await post(event.body, options, stop);
  if (stop.aborted) return httpStatus;
  event.attempts.push({ at: new Date().toISOString(), httpStatus });
  if (isAccepted(httpStatus)) event.delivery = "delivered";
  store.save();
  return httpStatus;
}

async function post(body: string, options: WebhookOptions, stop: AbortSignal): Promise<number | null> {
  // Signed anew each time and by the real clock: the receiver refuses a signature older than five minutes.
  const signature = signWebhook(body, options.secret, Math.floor(Date.now() / 1000));
  try {
    const response = await fetch(options.url, {
      method: "POST",
      headers: { "content-type": "application/json; charset=utf-8", "stripe-signature": signature },
      body,
      // A redirect is not an answer from the receiver, and a signed body must not wander.
      redirect: "manual",
      signal: AbortSignal.any([stop, AbortSignal.timeout(options.attemptTimeoutMs)]),
    });
    await response.body?.cancel();
    return response.status;
  } catch {
    return null;
  }
}

function isOver(event: EventRecord, stop: AbortSignal): boolean {
  return stop.aborted || event.delivery === "delivered";
}

function isAccepted(httpStatus: number | null): boolean {
  return httpStatus !== null && httpStatus >= 200 && httpStatus < 300;
}

function pause(ms: number, stop: AbortSignal): Promise<void> {
  if (ms === 0 || stop.aborted) return Promise.resolve();
  return new Promise((resolve) => {
    const finish = () => {
      clearTimeout(timer);
      stop.removeEventListener("abort", finish);
      resolve();
    };
    const timer = setTimeout(finish, ms);
    stop.addEventListener("abort", finish);
  });
}
