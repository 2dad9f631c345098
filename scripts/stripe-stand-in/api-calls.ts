import { noSuch } from "./api-error";
import { createSession, expireOpenSession, getSession } from "./checkout";
import { expandObject } from "./expand";
import type { ApiObject } from "./expand";
import type { FormFields } from "./form-encoding";
import { takePage, wasCreatedWithin } from "./list-page";
import type { Page } from "./list-page";
import { lookUpIn } from "./lookup";
import type { Cause } from "./make-event";
import { makeCharge } from "./make-charge";
import { makeLineItem } from "./make-line-item";
import { makePaymentIntent } from "./make-payment-intent";
import { makeRefund } from "./make-refund";
import { makeSession } from "./make-session";
import {
  createRefundParams,
  createSessionParams,
  listEventsParams,
  listLineItemsParams,
  listRefundsParams,
  listSessionsParams,
  onlyExpandParams,
  readParams,
} from "./params";
import { createRefund } from "./refund";
import type { StandIn } from "./stand-in";

export type ApiCall = { id: string; fields: FormFields; cause: Cause };

type Answer = (standIn: StandIn, call: ApiCall) => ApiObject;

/** The parts of Stripe's API that the stand-in speaks. `:id` is one path segment. */
export const API_CALLS: readonly { method: "GET" | "POST"; path: string; answer: Answer }[] = [
  { method: "POST", path: "/v1/checkout/sessions", answer: answerCreateSession },
  { method: "GET", path: "/v1/checkout/sessions", answer: answerListSessions },
  { method: "GET", path: "/v1/checkout/sessions/:id", answer: answerSession },
  { method: "POST", path: "/v1/checkout/sessions/:id/expire", answer: answerExpireSession },
  { method: "GET", path: "/v1/checkout/sessions/:id/line_items", answer: answerListLineItems },
  { method: "GET", path: "/v1/payment_intents/:id", answer: answerPaymentIntent },
  { method: "GET", path: "/v1/charges/:id", answer: answerCharge },
  { method: "POST", path: "/v1/refunds", answer: answerCreateRefund },
  { method: "GET", path: "/v1/refunds", answer: answerListRefunds },
  { method: "GET", path: "/v1/refunds/:id", answer: answerRefund },
  { method: "GET", path: "/v1/events", answer: answerListEvents },
  { method: "GET", path: "/v1/events/:id", answer: answerEvent },
];

function answerCreateSession(standIn: StandIn, { fields }: ApiCall): ApiObject {
  const params = readParams(createSessionParams, fields);
  const session = createSession(standIn, params);
  return expanded(standIn, makeSession(session, standIn.publicUrl), params);
}

function answerSession(standIn: StandIn, { id, fields }: ApiCall): ApiObject {
  const session = getSession(standIn, id);
  return expanded(standIn, makeSession(session, standIn.publicUrl), readParams(onlyExpandParams, fields));
}

function answerExpireSession(standIn: StandIn, { id, fields, cause }: ApiCall): ApiObject {
  const params = readParams(onlyExpandParams, fields);
  return expanded(standIn, makeSession(expireOpenSession(standIn, id, cause), standIn.publicUrl), params);
}

function answerListSessions(standIn: StandIn, { fields }: ApiCall): ApiObject {
  const params = readParams(listSessionsParams, fields);
  const wanted = newestFirst(standIn.store.sessions).filter(
    (session) =>
      wasCreatedWithin(session.created, params.created) &&
      matches(session.paymentIntentId, params.payment_intent) &&
      matches(session.status, params.status),
  );
  const page = takePage(wanted, params);
  const objects = page.items.map((session) => makeSession(session, standIn.publicUrl));
  return expanded(standIn, listOf("/v1/checkout/sessions", page, objects), params);
}

function answerListLineItems(standIn: StandIn, { id, fields }: ApiCall): ApiObject {
  const params = readParams(listLineItemsParams, fields);
  const session = getSession(standIn, id);
  const page = takePage(session.lineItems, params);
  const objects = page.items.map((item) => makeLineItem(item, session));
  return expanded(standIn, listOf(`/v1/checkout/sessions/${id}/line_items`, page, objects), params);
}

function answerPaymentIntent(standIn: StandIn, { id, fields }: ApiCall): ApiObject {
  const intent = standIn.store.paymentIntents.get(id);
  if (intent === undefined) throw noSuch("payment_intent", id, "intent");
  return expanded(standIn, makePaymentIntent(intent), readParams(onlyExpandParams, fields));
}

function answerCharge(standIn: StandIn, { id, fields }: ApiCall): ApiObject {
  const charge = standIn.store.charges.get(id);
  if (charge === undefined) throw noSuch("charge", id, "id");
  return expanded(standIn, makeCharge(charge), readParams(onlyExpandParams, fields));
}

function answerCreateRefund(standIn: StandIn, { fields, cause }: ApiCall): ApiObject {
  const params = readParams(createRefundParams, fields);
  return expanded(standIn, makeRefund(createRefund(standIn, params, cause)), params);
}

function answerRefund(standIn: StandIn, { id, fields }: ApiCall): ApiObject {
  const refund = standIn.store.refunds.get(id);
  if (refund === undefined) throw noSuch("refund", id, "id");
  return expanded(standIn, makeRefund(refund), readParams(onlyExpandParams, fields));
}

function answerListRefunds(standIn: StandIn, { fields }: ApiCall): ApiObject {
  const params = readParams(listRefundsParams, fields);
  const wanted = newestFirst(standIn.store.refunds).filter(
    (refund) =>
      wasCreatedWithin(refund.created, params.created) &&
      matches(refund.paymentIntentId, params.payment_intent) &&
      matches(refund.chargeId, params.charge),
  );
  const page = takePage(wanted, params);
  return expanded(standIn, listOf("/v1/refunds", page, page.items.map(makeRefund)), params);
}

function answerEvent(standIn: StandIn, { id, fields }: ApiCall): ApiObject {
  const event = standIn.store.events.get(id);
  if (event === undefined) throw noSuch("event", id, "id");
  return expanded(standIn, JSON.parse(event.body), readParams(onlyExpandParams, fields));
}

function answerListEvents(standIn: StandIn, { fields }: ApiCall): ApiObject {
  const params = readParams(listEventsParams, fields);
  const wanted = newestFirst(standIn.store.events).filter(
    (event) =>
      wasCreatedWithin(event.created, params.created) &&
      matches(event.type, params.type) &&
      (params.types?.includes(event.type) ?? true),
  );
  const page = takePage(wanted, params);
  const objects = page.items.map((event): ApiObject => JSON.parse(event.body));
  return expanded(standIn, listOf("/v1/events", page, objects), params);
}

function expanded(standIn: StandIn, object: ApiObject, params: { expand?: string[] }): ApiObject {
  return expandObject(object, params.expand ?? [], lookUpIn(standIn));
}

function listOf(url: string, page: Page<unknown>, data: ApiObject[]): ApiObject {
  return { object: "list", data, has_more: page.hasMore, url };
}

function newestFirst<T>(records: Map<string, T>): T[] {
  return [...records.values()].reverse();
}

function matches(value: string | null, wanted: string | undefined): boolean {
  return wanted === undefined || value === wanted;
}
