import Stripe from "stripe";
import type { LineItemRecord, SessionRecord } from "./records";

export function makeLineItem(item: LineItemRecord, session: SessionRecord) {
  const amount = item.unitAmount * item.quantity;
  return {
    id: item.id,
    object: "item",
    adjustable_quantity: null,
    amount_discount: 0,
    amount_subtotal: amount,
    amount_tax: 0,
    amount_total: amount,
    currency: session.currency,
    description: item.name,
    metadata: {},
    price: {
      id: item.priceId,
      object: "price",
      active: false,
      billing_scheme: "per_unit",
      created: session.created,
      currency: session.currency,
      custom_unit_amount: null,
      livemode: false,
      lookup_key: null,
      metadata: {},
      nickname: null,
      product: item.productId,
      recurring: null,
      tax_behavior: "unspecified",
      tiers_mode: null,
      transform_quantity: null,
      type: "one_time",
      unit_amount: item.unitAmount,
      unit_amount_decimal: Stripe.Decimal.from(item.unitAmount),
    },
    quantity: item.quantity,
  } satisfies Stripe.LineItem;
}
