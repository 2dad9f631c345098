import type { IncomingMessage, ServerResponse } from "node:http";

/** What a handler answers; "cut" closes the connection without an answer. */
export type Reply = { status: number; headers: Record<string, string>; body: string } | "cut";

const LONGEST_BODY_BYTES = 1024 * 1024;

export function jsonReply(status: number, value: unknown, headers: Record<string, string> = {}): Reply {
  return {
    status,
    headers: { "content-type": "application/json; charset=utf-8", ...headers },
    body: JSON.stringify(value, null, 2),
  };
}

export function redirectTo(location: string): Reply {
  // 303: the browser fetches the next page with GET, and going back does not post again.
  return { status: 303, headers: { location, "cache-control": "no-store" }, body: "" };
}

export function send(response: ServerResponse, reply: Reply): void {
  if (reply === "cut") {
    response.destroy();
    return;
  }
  response.writeHead(reply.status, { ...reply.headers, "content-length": String(Buffer.byteLength(reply.body)) });
  response.end(reply.body);
}

/** The whole body as text, or null when it is longer than a megabyte. */
export async function readBody(request: IncomingMessage): Promise<string | null> {
  const chunks: Buffer[] = [];
  let length = 0;
  for await (const chunk of request) {
    const bytes = Buffer.from(chunk);
    length += bytes.length;
    if (length > LONGEST_BODY_BYTES) return null;
    chunks.push(bytes);
  }
  return Buffer.concat(chunks).toString("utf8");
}
