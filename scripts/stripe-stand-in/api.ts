import { API_CALLS } from "./api-calls";
import type { ApiCall } from "./api-calls";
import { ApiError, invalidRequest, unauthorized } from "./api-error";
import { readForm } from "./form-encoding";
import type { FormFields } from "./form-encoding";
import { fingerprintOf, recallReply } from "./idempotency";
import { newId } from "./ids";
import { jsonReply } from "./reply";
import type { Reply } from "./reply";
import type { Incoming } from "./router";
import type { StandIn } from "./stand-in";

/** One call to Stripe's API: who asks, a planned fault, the same call again, and then the work itself. */
export function answerApi(standIn: StandIn, incoming: Incoming): Reply {
  const headers = answerHeaders(incoming);
  try {
    checkKey(standIn, incoming.headers.authorization);
    const fault = standIn.faults.next();
    if (fault === "error") return plannedError(headers);
    const reply = answerOnce(standIn, incoming, headers);
    if (incoming.method === "POST") standIn.store.save();
    return fault === "lost-reply" ? "cut" : reply;
  } catch (error) {
    if (error instanceof ApiError) return jsonReply(error.status, error.body, headers);
    throw error;
  }
}

function answerHeaders({ headers }: Incoming): Record<string, string> {
  const answer: Record<string, string> = { "request-id": newId("req") };
  for (const name of ["stripe-version", "idempotency-key"]) {
    const value = headers[name];
    if (typeof value === "string") answer[name] = value;
  }
  return answer;
}

function checkKey(standIn: StandIn, authorization: string | undefined): void {
  const key = keyIn(authorization ?? "");
  if (key === null) throw unauthorized("You did not provide an API key. Send it as a Bearer token.");
  if (key === standIn.secretKey) return;
  // Never the key itself: a real one may have been sent here by mistake, and answers are logged.
  throw unauthorized(`Invalid API Key provided: ${key.slice(0, 8)}****`);
}

function keyIn(authorization: string): string | null {
  const [scheme = "", value = ""] = authorization.split(" ");
  if (scheme.toLowerCase() === "bearer" && value !== "") return value;
  if (scheme.toLowerCase() !== "basic") return null;
  const [user = ""] = Buffer.from(value, "base64").toString("utf8").split(":");
  return user === "" ? null : user;
}

function plannedError(headers: Record<string, string>): Reply {
  const error = { type: "api_error", message: "The stand-in was asked to fail this call." };
  return jsonReply(500, { error }, headers);
}

function answerOnce(standIn: StandIn, incoming: Incoming, headers: Record<string, string>): Reply {
  const key = headers["idempotency-key"];
  if (incoming.method !== "POST" || key === undefined) return jsonReply(200, work(standIn, incoming, headers), headers);
  const fingerprint = fingerprintOf(incoming.path, incoming.body);
  const before = recallReply(standIn, key, fingerprint);
  if (before !== null) {
    return jsonReply(before.status, JSON.parse(before.body), { ...headers, "idempotent-replayed": "true" });
  }
  // A refusal is thrown past this point and so not remembered: a corrected call may use the same key.
  const object = work(standIn, incoming, headers);
  const created = standIn.clock.seconds();
  standIn.store.rememberedReplies.set(key, { key, fingerprint, created, status: 200, body: JSON.stringify(object) });
  return jsonReply(200, object, headers);
}

function work(standIn: StandIn, incoming: Incoming, headers: Record<string, string>) {
  const { answer, id } = findCall(incoming);
  const fields = readFields(incoming.method === "GET" ? incoming.query : incoming.body);
  const requestId = headers["request-id"] ?? null;
  const call: ApiCall = { id, fields, cause: { requestId, idempotencyKey: headers["idempotency-key"] ?? null } };
  return answer(standIn, call);
}

function findCall({ method, path }: Incoming) {
  const asked = path.split("/");
  for (const call of API_CALLS) {
    const parts = call.path.split("/");
    const fits = parts.length === asked.length && parts.every((part, at) => part === ":id" || part === asked[at]);
    if (call.method === method && fits) return { answer: call.answer, id: asked[parts.indexOf(":id")] ?? "" };
  }
  throw new ApiError(404, {
    type: "invalid_request_error",
    message:
      `Unrecognized request URL (${method}: ${path}). ` +
      "The stand-in speaks only the part of the API that is used.",
  });
}

function readFields(text: string): FormFields {
  const reading = readForm(text);
  if (!reading.ok) throw invalidRequest(reading.reason);
  return reading.fields;
}
