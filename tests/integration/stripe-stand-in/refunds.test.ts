import { describe, expect, it } from "vitest";
import { paidIntentId, press, sessionParams, startWithReceiver } from "./running-stand-in";

describe("a refund", () => {
  it("gives back a part, then the rest, and never more than was paid", async () => {
    const { stripe } = await startWithReceiver();
    const payment_intent = await paidIntentId(stripe);
    const part = await stripe.refunds.create({ payment_intent, amount: 1000, reason: "requested_by_customer" });
    expect(part).toMatchObject({ amount: 1000, status: "succeeded", payment_intent, reason: "requested_by_customer" });
    await expect(stripe.refunds.create({ payment_intent, amount: 1501 })).rejects.toThrow("$15.01");
    expect((await stripe.refunds.create({ payment_intent })).amount).toBe(1500);
    await expect(stripe.refunds.create({ payment_intent })).rejects.toMatchObject({ code: "charge_already_refunded" });
    const all = await stripe.refunds.list({ payment_intent });
    expect(all.data.map(({ amount }) => amount)).toEqual([1500, 1000]);
    expect(await stripe.refunds.retrieve(part.id)).toMatchObject({ id: part.id });
  });

  it("tells by webhook how much of the charge is given back so far", async () => {
    const { stripe, control, receiver } = await startWithReceiver();
    const payment_intent = await paidIntentId(stripe, { payment_intent_data: { metadata: { registration: "reg_1" } } });
    await control("webhooks/settle");
    await stripe.refunds.create({ payment_intent, amount: 1000 });
    await control("webhooks/settle");
    await stripe.refunds.create({ payment_intent });
    await control("webhooks/settle");
    expect(receiver.received.slice(1).map(({ body }) => JSON.parse(body))).toMatchObject([
      {
        type: "charge.refunded",
        data: {
          object: { payment_intent, amount_refunded: 1000, refunded: false, metadata: { registration: "reg_1" } },
          previous_attributes: { amount_refunded: 0 },
        },
      },
      { data: { object: { amount_refunded: 2500, refunded: true }, previous_attributes: { amount_refunded: 1000 } } },
    ]);
  });

  it("is refused for a payment that never succeeded or never was", async () => {
    const { stripe } = await startWithReceiver();
    const open = await stripe.checkout.sessions.create(sessionParams());
    await press(open.url, "decline");
    const { payment_intent } = await stripe.checkout.sessions.retrieve(open.id);
    await expect(stripe.refunds.create({ payment_intent: String(payment_intent) })).rejects.toThrow(
      "does not have a successful charge",
    );
    await expect(stripe.refunds.create({ payment_intent: "pi_none" })).rejects.toMatchObject({ statusCode: 404 });
    await expect(stripe.refunds.create({ amount: 100 })).rejects.toMatchObject({ statusCode: 400 });
  });

  it("is made once when the answer was lost and the client asks again", async () => {
    const { stripe, control } = await startWithReceiver();
    const payment_intent = await paidIntentId(stripe);
    await control("fail", { calls: "1", kind: "lost-reply" });
    const options = { idempotencyKey: "refund/1", maxNetworkRetries: 1 };
    const refund = await stripe.refunds.create({ payment_intent, amount: 500 }, options);
    expect(refund.lastResponse.headers["idempotent-replayed"]).toBe("true");
    expect((await stripe.refunds.list({ payment_intent })).data).toHaveLength(1);
  });
});
