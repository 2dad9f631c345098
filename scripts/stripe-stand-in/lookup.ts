import type { ApiObject, Lookup } from "./expand";
import { makeCharge } from "./make-charge";
import { makeLineItem } from "./make-line-item";
import { makePaymentIntent } from "./make-payment-intent";
import { makeRefund } from "./make-refund";
import type { StandIn } from "./stand-in";

/** The objects and lists that `expand` may ask for. */
export function lookUpIn(standIn: StandIn): Lookup {
  return (holder, name) => {
    if (holder.object === "checkout.session" && name === "line_items") return lineItemsOf(standIn, holder);
    if (holder.object === "charge" && name === "refunds") return refundsOf(standIn, holder);
    return objectWithId(standIn, name, String(holder[name]));
  };
}

function objectWithId(standIn: StandIn, name: string, id: string): ApiObject | null {
  const { paymentIntents, charges } = standIn.store;
  if (name === "payment_intent") return made(paymentIntents.get(id), makePaymentIntent);
  if (name === "latest_charge" || name === "charge") return made(charges.get(id), makeCharge);
  return null;
}

function made<T>(record: T | undefined, make: (record: T) => ApiObject): ApiObject | null {
  return record === undefined ? null : make(record);
}

function lineItemsOf(standIn: StandIn, holder: ApiObject): ApiObject | null {
  const session = standIn.store.sessions.get(String(holder.id));
  if (session === undefined) return null;
  const data = session.lineItems.map((item) => makeLineItem(item, session));
  return { object: "list", data, has_more: false, url: `/v1/checkout/sessions/${session.id}/line_items` };
}

function refundsOf(standIn: StandIn, holder: ApiObject): ApiObject {
  const refunds = [...standIn.store.refunds.values()].filter((refund) => refund.chargeId === holder.id).reverse();
  const url = `/v1/charges/${String(holder.id)}/refunds`;
  return { object: "list", data: refunds.map(makeRefund), has_more: false, url };
}
