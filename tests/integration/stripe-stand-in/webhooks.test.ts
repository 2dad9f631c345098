import Stripe from "stripe";
import { describe, expect, it } from "vitest";
import { startStripeStandIn } from "../../../scripts/stripe-stand-in/start";
import { KEY, paidIntentId, press, sessionParams, startWithReceiver, WEBHOOK_SECRET } from "./running-stand-in";

const { webhooks } = new Stripe(KEY);

describe("a webhook", () => {
  it("is signed so that the official client accepts it, and not under another secret or changed", async () => {
    const { stripe, receiver, control } = await startWithReceiver();
    const open = await stripe.checkout.sessions.create(sessionParams({ metadata: { registration: "reg_ü" } }));
    await press(open.url, "pay");
    await control("webhooks/settle");
    const [sent] = receiver.received;
    const { body, signature } = sent ?? { body: "", signature: "" };
    const event = webhooks.constructEvent(body, signature, WEBHOOK_SECRET);
    expect(event).toMatchObject({
      type: "checkout.session.completed",
      api_version: Stripe.API_VERSION,
      data: { object: { id: open.id, payment_status: "paid", metadata: { registration: "reg_ü" } } },
    });
    expect(() => webhooks.constructEvent(body, signature, "whsec_other")).toThrow();
    expect(() => webhooks.constructEvent(body.replace("paid", "unpaid"), signature, WEBHOOK_SECRET)).toThrow();
    expect(() => webhooks.constructEvent(JSON.stringify(JSON.parse(body)), signature, WEBHOOK_SECRET)).toThrow();
  });

  it("tells of a declined payment", async () => {
    const { stripe, receiver, control } = await startWithReceiver();
    const open = await stripe.checkout.sessions.create(
      sessionParams({ payment_intent_data: { metadata: { registration: "reg_1" } } }),
    );
    await press(open.url, "decline");
    await control("webhooks/settle");
    expect(receiver.received.map(({ body }) => JSON.parse(body))).toMatchObject([
      { type: "payment_intent.payment_failed", data: { object: { metadata: { registration: "reg_1" } } } },
    ]);
  });

  it("is sent again until the receiver takes it, with the same event id", async () => {
    const { stripe, receiver, control } = await startWithReceiver({ receiverStatuses: [500, 302] });
    await paidIntentId(stripe);
    const settled = await control("webhooks/settle").then((response) => response.json());
    const attempts = [{ httpStatus: 500 }, { httpStatus: 302 }, { httpStatus: 200 }];
    expect(settled.events).toMatchObject([{ delivery: "delivered", attempts }]);
    expect(new Set(receiver.received.map(({ body }) => JSON.parse(body).id)).size).toBe(1);
  });

  it("is given up after a bounded number of attempts, and can be redelivered later", async () => {
    const lines: string[] = [];
    const { stripe, receiver, control } = await startWithReceiver({
      receiverStatuses: [500, 500, 500],
      report: (line) => lines.push(line),
    });
    await paidIntentId(stripe);
    const { events } = await control("webhooks/settle").then((response) => response.json());
    expect(events).toMatchObject([{ delivery: "given-up" }]);
    expect(receiver.received).toHaveLength(3);
    expect(lines).toEqual([expect.stringContaining(events[0].id)]);
    const again = await control("webhooks/redeliver", { event: events[0].id });
    expect(await again.json()).toEqual({ httpStatus: 200 });
  });

  it("does not keep the payer waiting while nobody takes it", async () => {
    // Port 9 on this machine: nobody listens, so each attempt fails at once and the next is an hour away.
    const { stripe, standIn } = await startWithReceiver({
      webhookUrl: "http://127.0.0.1:9/webhook",
      retryDelaysMs: [3_600_000],
    });
    const open = await stripe.checkout.sessions.create(sessionParams());
    expect((await press(open.url, "pay")).status).toBe(303);
    expect((await stripe.checkout.sessions.retrieve(open.id)).payment_status).toBe("paid");
    // Closing must not wait for the hour either.
    await standIn.close();
  });

  it("can be held until the payer is back, and is then released", async () => {
    const { stripe, receiver, control } = await startWithReceiver();
    await control("webhooks/hold");
    await paidIntentId(stripe);
    await control("webhooks/settle");
    expect(receiver.received).toHaveLength(0);
    await control("webhooks/release");
    await control("webhooks/settle");
    expect(receiver.received).toHaveLength(1);
  });

  it("can be delivered a second time", async () => {
    const { stripe, receiver, control } = await startWithReceiver();
    await paidIntentId(stripe);
    await control("webhooks/settle");
    const [event] = (await stripe.events.list()).data;
    await control("webhooks/redeliver", { event: event?.id ?? "" });
    expect(receiver.received.map(({ body }) => JSON.parse(body).id)).toEqual([event?.id, event?.id]);
    expect((await control("webhooks/redeliver", { event: "evt_none" })).status).toBe(404);
  });
});

describe("the list of events", () => {
  it("holds each event as it was sent, newest first, by kind", async () => {
    const { stripe, receiver, control } = await startWithReceiver();
    const payment_intent = await paidIntentId(stripe);
    await stripe.refunds.create({ payment_intent });
    await control("webhooks/settle");
    const all = await stripe.events.list();
    expect(all.data.map(({ type }) => type)).toEqual(["charge.refunded", "checkout.session.completed"]);
    const refunded = await stripe.events.list({ types: ["charge.refunded", "charge.expired"] });
    expect(refunded.data).toHaveLength(1);
    const one = await stripe.events.retrieve(all.data[1]?.id ?? "");
    const sent = receiver.received.map(({ body }) => JSON.parse(body)).find(({ id }) => id === one.id);
    expect(one).toEqual(sent);
  });
});

describe("reset", () => {
  it("forgets sessions, events and planned failures", async () => {
    const { stripe, control } = await startWithReceiver();
    await paidIntentId(stripe);
    await control("fail", { calls: "5" });
    await control("reset");
    expect((await stripe.events.list()).data).toEqual([]);
    expect((await stripe.checkout.sessions.list()).data).toEqual([]);
  });
});

describe("the stand-in", () => {
  it("refuses to start with a key for real money", async () => {
    await expect(startStripeStandIn({ secretKey: "sk_live_x" })).rejects.toThrow("real money");
  });
});
