import { z } from "zod";
import { expireSessionsThatAreDue } from "./checkout";
import { readForm } from "./form-encoding";
import { jsonReply } from "./reply";
import type { Reply } from "./reply";
import type { Incoming } from "./router";
import type { StandIn } from "./stand-in";

const wholeNumber = z.string().regex(/^\d{1,9}$/).transform(Number);
const failFields = z.strictObject({ calls: wholeNumber, kind: z.enum(["error", "lost-reply"]).default("error") });
const clockFields = z.strictObject({ seconds: wholeNumber });

type Control = (standIn: StandIn, incoming: Incoming) => Reply | Promise<Reply>;

/** What a test may ask of the stand-in and of no real payment company. Fields come as a form. */
const CONTROLS: Record<string, Control> = {
  "GET health": () => jsonReply(200, { ok: true }),
  "GET webhooks": (standIn) => jsonReply(200, deliveries(standIn)),
  "POST webhooks/hold": (standIn) => {
    standIn.webhooks.hold();
    return jsonReply(200, deliveries(standIn));
  },
  "POST webhooks/release": (standIn) => {
    standIn.webhooks.release();
    return jsonReply(200, deliveries(standIn));
  },
  // Answers when nothing is on its way any more, so that a test need not wait and look.
  "POST webhooks/settle": async (standIn) => {
    await standIn.webhooks.settled();
    return jsonReply(200, deliveries(standIn));
  },
  "POST webhooks/redeliver": redeliver,
  "POST fail": planFault,
  "POST clock": advanceClock,
  "POST reset": (standIn) => {
    standIn.webhooks.forget();
    standIn.faults.clear();
    standIn.store.clear();
    return jsonReply(200, { ok: true });
  },
};

export function answerControl(standIn: StandIn, incoming: Incoming): Reply | Promise<Reply> {
  const control = CONTROLS[`${incoming.method} ${incoming.path.replace(/^\/_stand-in\//, "")}`];
  if (control === undefined) {
    return jsonReply(404, { error: `No such control. There are: ${Object.keys(CONTROLS).join(", ")}.` });
  }
  return control(standIn, incoming);
}

function deliveries({ store, webhooks }: StandIn) {
  const events = [...store.events.values()].map(({ id, type, delivery, attempts }) => {
    return { id, type, delivery, attempts };
  });
  return { holding: webhooks.isHolding(), events };
}

async function redeliver(standIn: StandIn, incoming: Incoming): Promise<Reply> {
  const fields = readFields(z.strictObject({ event: z.string() }), incoming);
  if (fields === null) return jsonReply(400, { error: "Send event=evt_…" });
  const event = standIn.store.events.get(fields.event);
  if (event === undefined) return jsonReply(404, { error: `No such event: ${fields.event}` });
  return jsonReply(200, { httpStatus: await standIn.webhooks.redeliver(event) });
}

function planFault(standIn: StandIn, incoming: Incoming): Reply {
  const fields = readFields(failFields, incoming);
  if (fields === null) return jsonReply(400, { error: "Send calls=2, and kind=error or kind=lost-reply" });
  standIn.faults.plan(fields.kind, fields.calls);
  return jsonReply(200, { ok: true });
}

function advanceClock(standIn: StandIn, incoming: Incoming): Reply {
  const fields = readFields(clockFields, incoming);
  if (fields === null) return jsonReply(400, { error: "Send seconds=1800" });
  standIn.clock.advance(fields.seconds);
  expireSessionsThatAreDue(standIn);
  return jsonReply(200, { now: standIn.clock.seconds() });
}

function readFields<T extends z.ZodType>(schema: T, incoming: Incoming): z.output<T> | null {
  const reading = readForm(incoming.body);
  if (!reading.ok) return null;
  const fields = schema.safeParse(reading.fields);
  return fields.success ? fields.data : null;
}
