import Stripe from "stripe";
import { describe, expect, it } from "vitest";
import { client, lineItem, press, sessionParams, startWithReceiver } from "./running-stand-in";

const nowSeconds = () => Math.floor(Date.now() / 1000);

describe("a checkout session", () => {
  it("keeps what the programme gave it and asks for the sum of its items", async () => {
    const { stripe, standIn } = await startWithReceiver();
    const session = await stripe.checkout.sessions.create(
      sessionParams({
        client_reference_id: "reg_1",
        customer_email: "parent@example.org",
        metadata: { registration: "reg_1" },
        line_items: [
          lineItem("Alder Bog Boardwalk", 1250, 2),
          lineItem("Bus", 300),
        ],
      }),
    );
    expect(session).toMatchObject({
      object: "checkout.session",
      status: "open",
      payment_status: "unpaid",
      amount_total: 2800,
      currency: "usd",
      client_reference_id: "reg_1",
      customer_email: "parent@example.org",
      metadata: { registration: "reg_1" },
      payment_intent: null,
      url: `${standIn.url}/pay/${session.id}`,
    });
    const items = await stripe.checkout.sessions.listLineItems(session.id);
    expect(items.data.map((item) => [item.description, item.quantity, item.amount_total])).toEqual([
      ["Alder Bog Boardwalk", 2, 2500],
      ["Bus", 1, 300],
    ]);
    expect(items.data[0]?.price?.unit_amount_decimal?.toString()).toBe("1250");
  });

  it("lives between 30 minutes and 24 hours, and 24 hours when nothing is said", async () => {
    const { stripe } = await startWithReceiver();
    const create = (expires_at?: number) => stripe.checkout.sessions.create(sessionParams({ expires_at }));
    const unsaid = await create();
    expect(unsaid.expires_at - unsaid.created).toBe(24 * 60 * 60);
    const short = nowSeconds() + 31 * 60;
    expect((await create(short)).expires_at).toBe(short);
    await expect(create(nowSeconds() + 29 * 60)).rejects.toMatchObject({ param: "expires_at", statusCode: 400 });
    await expect(create(nowSeconds() + 25 * 60 * 60)).rejects.toMatchObject({ param: "expires_at", statusCode: 400 });
  });

  it("is refused below 50 cents and allowed at 50", async () => {
    const { stripe } = await startWithReceiver();
    const create = (cents: number) =>
      stripe.checkout.sessions.create(sessionParams({ line_items: [lineItem("Bus", cents)] }));
    await expect(create(49)).rejects.toMatchObject({ code: "amount_too_small" });
    expect((await create(50)).amount_total).toBe(50);
  });

  it("names the parameter that is missing, misspelt or unreadable", async () => {
    const { stripe, standIn } = await startWithReceiver();
    const create = (body: string) =>
      fetch(`${standIn.url}/v1/checkout/sessions`, {
        method: "POST",
        headers: { authorization: "Bearer sk_test_stand_in" },
        body,
      }).then((response) => response.json());
    expect(await create("mode=payment")).toMatchObject({ error: { code: "parameter_missing", param: "line_items" } });
    await expect(stripe.checkout.sessions.create(sessionParams({ success_url: "nowhere" }))).rejects.toMatchObject({
      param: "success_url",
    });
    const misspelt = "mode=payment&line_items[0][quantity]=1&line_items[0][prize_data][currency]=usd";
    expect(await create(misspelt)).toMatchObject({ error: { param: expect.stringContaining("line_items[0]") } });
    await expect(
      stripe.checkout.sessions.create(sessionParams({ allow_promotion_codes: true })),
    ).rejects.toMatchObject({ code: "parameter_unknown", param: "allow_promotion_codes" });
  });

  it("refuses parameter names that would reach into an object's prototype", async () => {
    const { standIn } = await startWithReceiver();
    for (const name of ["__proto__[mode]", "metadata[__proto__][x]", "metadata[constructor]"]) {
      const response = await fetch(`${standIn.url}/v1/checkout/sessions`, {
        method: "POST",
        headers: { authorization: "Bearer sk_test_stand_in" },
        body: new URLSearchParams({ [name]: "payment" }),
      });
      expect(response.status).toBe(400);
      expect(await response.json()).toMatchObject({ error: { message: expect.stringContaining("not allowed") } });
    }
  });

  it("shows its payment whole when asked to expand it, in one session and in a list", async () => {
    const { stripe } = await startWithReceiver();
    const open = await stripe.checkout.sessions.create(
      sessionParams({ payment_intent_data: { metadata: { registration: "reg_7" } } }),
    );
    await press(open.url, "pay");
    const expand = ["payment_intent.latest_charge", "line_items"];
    const paid = await stripe.checkout.sessions.retrieve(open.id, { expand });
    expect(paid.payment_intent).toMatchObject({
      status: "succeeded",
      amount_received: 2500,
      metadata: { registration: "reg_7" },
      latest_charge: { object: "charge", paid: true },
    });
    expect(paid.line_items?.data).toHaveLength(1);
    const list = await stripe.checkout.sessions.list({ expand: ["data.payment_intent"] });
    expect(list.data[0]?.payment_intent).toMatchObject({ object: "payment_intent" });
    const unknown = stripe.checkout.sessions.retrieve(open.id, { expand: ["weather"] });
    await expect(unknown).rejects.toThrow("cannot be expanded");
  });

  it("is listed newest first, page by page, and by state", async () => {
    const { stripe } = await startWithReceiver();
    const ids: string[] = [];
    for (let count = 0; count < 5; count += 1) {
      ids.unshift((await stripe.checkout.sessions.create(sessionParams())).id);
    }
    const first = await stripe.checkout.sessions.list({ limit: 2 });
    expect(first.has_more).toBe(true);
    const all = await stripe.checkout.sessions.list({ limit: 2 }).autoPagingToArray({ limit: 100 });
    expect(all.map((session) => session.id)).toEqual(ids);
    await stripe.checkout.sessions.expire(ids[0] ?? "");
    const expired = await stripe.checkout.sessions.list({ status: "expired" });
    expect(expired.data.map((session) => session.id)).toEqual(ids.slice(0, 1));
  });

  it("can be expired once while open, and never after", async () => {
    const { stripe } = await startWithReceiver();
    const { id } = await stripe.checkout.sessions.create(sessionParams());
    const expired = await stripe.checkout.sessions.expire(id);
    expect(expired).toMatchObject({ status: "expired", payment_status: "unpaid", url: null });
    await expect(stripe.checkout.sessions.expire(id)).rejects.toBeInstanceOf(Stripe.errors.StripeInvalidRequestError);
  });

  it("expires by itself when its time is over, and says so by webhook", async () => {
    const { stripe, control, receiver } = await startWithReceiver();
    const { id } = await stripe.checkout.sessions.create(sessionParams({ expires_at: nowSeconds() + 31 * 60 }));
    await control("clock", { seconds: String(29 * 60) });
    expect((await stripe.checkout.sessions.retrieve(id)).status).toBe("open");
    await control("clock", { seconds: "180" });
    expect((await stripe.checkout.sessions.retrieve(id)).status).toBe("expired");
    await control("webhooks/settle");
    expect(receiver.received.map(({ body }) => JSON.parse(body))).toMatchObject([
      { type: "checkout.session.expired", data: { object: { id, status: "expired" } } },
    ]);
  });
});

describe("a call that cannot be answered", () => {
  it("is an authentication error under another key, and does not repeat the key", async () => {
    const { standIn } = await startWithReceiver();
    const call = client(standIn.port, "sk_live_0123456789abcdef").checkout.sessions.list();
    await expect(call).rejects.toBeInstanceOf(Stripe.errors.StripeAuthenticationError);
    await expect(call).rejects.not.toThrow("0123456789abcdef");
    const response = await fetch(`${standIn.url}/v1/events`);
    expect(response.status).toBe(401);
  });

  it("is an invalid request with 404 for what was never made or is not spoken here", async () => {
    const { stripe } = await startWithReceiver();
    await expect(stripe.checkout.sessions.retrieve("cs_test_none")).rejects.toMatchObject({
      type: "StripeInvalidRequestError",
      code: "resource_missing",
      statusCode: 404,
    });
    await expect(stripe.paymentIntents.retrieve("pi_none")).rejects.toMatchObject({ statusCode: 404 });
    await expect(stripe.customers.list()).rejects.toMatchObject({ statusCode: 404 });
  });
});

describe("an idempotency key", () => {
  it("gives the first answer again for the same call, and makes nothing new", async () => {
    const { stripe } = await startWithReceiver();
    const options = { idempotencyKey: "reg_1/1" };
    const first = await stripe.checkout.sessions.create(sessionParams(), options);
    const second = await stripe.checkout.sessions.create(sessionParams(), options);
    expect(second.id).toBe(first.id);
    expect(second.lastResponse.headers["idempotent-replayed"]).toBe("true");
    expect(first.lastResponse.headers["idempotent-replayed"]).toBeUndefined();
    expect((await stripe.checkout.sessions.list()).data).toHaveLength(1);
  });

  it("is refused for another call", async () => {
    const { stripe } = await startWithReceiver();
    const options = { idempotencyKey: "reg_1/1" };
    await stripe.checkout.sessions.create(sessionParams(), options);
    await expect(
      stripe.checkout.sessions.create(sessionParams({ client_reference_id: "reg_2" }), options),
    ).rejects.toBeInstanceOf(Stripe.errors.StripeIdempotencyError);
  });

  it("stays free after a refusal, so that a corrected call may use it", async () => {
    const { stripe } = await startWithReceiver();
    const options = { idempotencyKey: "reg_1/1" };
    await expect(stripe.checkout.sessions.create(sessionParams({ success_url: "x" }), options)).rejects.toThrow();
    expect((await stripe.checkout.sessions.create(sessionParams(), options)).status).toBe("open");
  });

  it("lets a client whose answer was lost try again without paying twice", async () => {
    const { standIn, stripe, control } = await startWithReceiver();
    await control("fail", { calls: "1", kind: "lost-reply" });
    const session = await client(standIn.port, undefined, 1).checkout.sessions.create(sessionParams());
    expect(session.lastResponse.headers["idempotent-replayed"]).toBe("true");
    expect((await stripe.checkout.sessions.list()).data.map(({ id }) => id)).toEqual([session.id]);
  });
});

describe("planned failures", () => {
  it("fail the next calls with 500 and then stop, doing nothing meanwhile", async () => {
    const { stripe, control } = await startWithReceiver();
    await control("fail", { calls: "2" });
    for (let count = 0; count < 2; count += 1) {
      const call = stripe.checkout.sessions.create(sessionParams());
      await expect(call).rejects.toBeInstanceOf(Stripe.errors.StripeAPIError);
    }
    expect((await stripe.checkout.sessions.list()).data).toHaveLength(0);
  });
});
