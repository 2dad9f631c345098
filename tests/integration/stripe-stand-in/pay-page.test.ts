import { describe, expect, it } from "vitest";
import { lineItem, press, sessionParams, startWithReceiver } from "./running-stand-in";

async function openPage(url: string | null): Promise<{ status: number; html: string; headers: Headers }> {
  const response = await fetch(url ?? "");
  return { status: response.status, html: await response.text(), headers: response.headers };
}

describe("the hosted payment page", () => {
  it("says that it is a stand-in, what is paid for and how much, without any script", async () => {
    const { stripe } = await startWithReceiver();
    const { url } = await stripe.checkout.sessions.create(sessionParams());
    const { status, html, headers } = await openPage(url);
    expect(status).toBe(200);
    expect(headers.get("content-type")).toBe("text/html; charset=utf-8");
    expect(html).toContain('<html lang="en">');
    expect(html).toContain("<title>Pay $25.00 – Payment stand-in</title>");
    expect(html).toContain("No money moves");
    expect(html).toContain("Heron Spit, evening listening");
    expect(html).not.toContain("<script");
    const buttons = [...html.matchAll(/<button[^>]*value="(\w+)"/g)].map(([, value]) => value);
    expect(buttons).toEqual(["pay", "decline", "back"]);
  });

  it("shows names as text, whatever is in them", async () => {
    const { stripe } = await startWithReceiver();
    const line_items = [lineItem(`<img src=x onerror="alert(1)"> & 'friends'`, 100)];
    const { url } = await stripe.checkout.sessions.create(sessionParams({ line_items }));
    const { html } = await openPage(url);
    expect(html).not.toContain("<img");
    expect(html).toContain("&lt;img src=x onerror=&quot;alert(1)&quot;&gt; &amp; &#39;friends&#39;");
  });

  it("takes the payment and goes back to the site with the session's id", async () => {
    const { stripe } = await startWithReceiver();
    const open = await stripe.checkout.sessions.create(sessionParams());
    const response = await press(open.url, "pay");
    expect(response.status).toBe(303);
    expect(response.headers.get("location")).toBe(`http://127.0.0.1:3000/family/paid?session=${open.id}`);
    const paid = await stripe.checkout.sessions.retrieve(open.id);
    expect(paid).toMatchObject({ status: "complete", payment_status: "paid", url: null });
    expect(await stripe.paymentIntents.retrieve(String(paid.payment_intent))).toMatchObject({
      status: "succeeded",
      amount: 2500,
      amount_received: 2500,
    });
  });

  it("comes back with an alert after a decline, stays open, and can then be paid", async () => {
    const { stripe } = await startWithReceiver();
    const open = await stripe.checkout.sessions.create(sessionParams());
    const declined = await press(open.url, "decline");
    expect(declined.status).toBe(303);
    const { html } = await openPage(new URL(declined.headers.get("location") ?? "", open.url ?? "").href);
    expect(html).toMatch(/role="alert"[^>]*>\s*<p><strong>The payment was declined\.<\/strong>/);
    expect(html).toContain("<title>Error: payment declined.");
    const session = await stripe.checkout.sessions.retrieve(open.id, { expand: ["payment_intent"] });
    expect(session).toMatchObject({
      status: "open",
      payment_status: "unpaid",
      payment_intent: { status: "requires_payment_method", last_payment_error: { code: "card_declined" } },
    });
    expect((await press(open.url, "pay")).headers.get("location")).toContain(open.id);
    expect((await stripe.checkout.sessions.retrieve(open.id)).payment_status).toBe("paid");
  });

  it("goes back without paying, and offers that only where there is a way back", async () => {
    const { stripe } = await startWithReceiver();
    const open = await stripe.checkout.sessions.create(sessionParams());
    expect((await press(open.url, "back")).headers.get("location")).toBe("http://127.0.0.1:3000/family/unpaid");
    expect((await stripe.checkout.sessions.retrieve(open.id)).status).toBe("open");
    const oneWay = await stripe.checkout.sessions.create(sessionParams({ cancel_url: undefined }));
    expect((await openPage(oneWay.url)).html).not.toContain('value="back"');
    expect((await press(oneWay.url, "back")).status).toBe(400);
  });

  it("takes no second payment for what is paid, and says so", async () => {
    const { stripe, receiver, control } = await startWithReceiver();
    const open = await stripe.checkout.sessions.create(sessionParams());
    await press(open.url, "pay");
    const again = await press(open.url, "pay");
    expect(again.status).toBe(409);
    expect(await again.text()).toContain("This is already paid");
    await control("webhooks/settle");
    expect(receiver.received).toHaveLength(1);
  });

  it("takes no payment for an expired session or one it never made, and says so", async () => {
    const { stripe, standIn } = await startWithReceiver();
    const open = await stripe.checkout.sessions.create(sessionParams());
    await stripe.checkout.sessions.expire(open.id);
    const late = await press(open.url, "pay");
    expect(late.status).toBe(409);
    expect(await late.text()).toContain("This payment page has expired");
    expect((await stripe.checkout.sessions.retrieve(open.id)).payment_status).toBe("unpaid");
    const { status, html } = await openPage(`${standIn.url}/pay/cs_test_none`);
    expect(status).toBe(404);
    expect(html).toContain("No such payment page");
  });
});
