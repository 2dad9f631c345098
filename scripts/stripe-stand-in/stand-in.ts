import { makeEvent } from "./make-event";
import type { Cause, Happening } from "./make-event";
import { newId } from "./ids";
import type { Clock } from "./clock";
import type { Faults } from "./faults";
import type { EventRecord } from "./records";
import type { Store } from "./store";
import type { Webhooks } from "./webhooks";

/** The parts every request handler works with. */
export type StandIn = {
  secretKey: string;
  publicUrl: string;
  clock: Clock;
  store: Store;
  faults: Faults;
  webhooks: Webhooks;
};

/** Writes down that something happened and sets its webhook on the way, without waiting for the receiver. */
export function tell(standIn: StandIn, happening: Happening, cause: Cause): void {
  const { store, clock, webhooks } = standIn;
  const event = makeEvent(newId("evt"), clock.seconds(), happening, cause);
  const record: EventRecord = {
    id: event.id,
    created: event.created,
    type: event.type,
    // Indented as Stripe sends it, so that a receiver that parses and writes it again before checking is found out.
    body: JSON.stringify(event, null, 2),
    delivery: "pending",
    attempts: [],
  };
  store.events.set(record.id, record);
  webhooks.announce(record);
}
