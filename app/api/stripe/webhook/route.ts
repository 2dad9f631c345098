import { after } from "next/server";
import { gateway } from "@/lib/payments/stripe-gateway";
import { takeCheckoutEvent } from "@/lib/payments/take-checkout-event";
import { problemResponse, signedHandler } from "@/lib/web/http-handler";
import { deliverOutbox } from "@/lib/web/outbox";

/** The payment service's messages, believed only with its signature over the very bytes that came. */
export const POST = signedHandler(
  takeCheckoutEvent,
  async (request) => {
    const event = gateway().readEvent(await request.text(), request.headers.get("stripe-signature") ?? "");
    if (event !== "bad signature") return event;
    return problemResponse({ kind: "invalid", sentence: "The signature does not fit the message.", fields: {} });
  },
  () => after(deliverOutbox),
);
