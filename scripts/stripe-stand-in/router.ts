import type { IncomingHttpHeaders, IncomingMessage } from "node:http";
import { answerApi } from "./api";
import { expireSessionsThatAreDue } from "./checkout";
import { answerControl } from "./control";
import { answerPay } from "./pay-routes";
import { jsonReply, readBody } from "./reply";
import type { Reply } from "./reply";
import type { StandIn } from "./stand-in";

export type Incoming = {
  method: string;
  path: string;
  query: string;
  headers: IncomingHttpHeaders;
  body: string;
};

/** Three doors: the API, the page a person pays at, and the controls for tests. */
export async function answerRequest(standIn: StandIn, request: IncomingMessage): Promise<Reply> {
  const body = await readBody(request);
  if (body === null) return jsonReply(413, { error: { type: "invalid_request_error", message: "Too long." } });
  const [path = "/", query = ""] = (request.url ?? "/").split("?", 2);
  const incoming: Incoming = { method: request.method ?? "GET", path, query, headers: request.headers, body };
  expireSessionsThatAreDue(standIn);
  if (path.startsWith("/pay/")) return answerPay(standIn, incoming);
  if (path.startsWith("/_stand-in/")) return answerControl(standIn, incoming);
  return answerApi(standIn, incoming);
}
