import { expect, it } from "vitest";
import { conflict, forbidden, invalid, notFound, type Outcome } from "@/lib/shared/outcome";
import { problemResponse } from "@/lib/web/http-handler";

// RFC 9457: the media type, and type, title, status and detail as members.
it.each<[Outcome<never>, number, object]>([
  [invalid({ title: "Enter a title." }), 400, { title: "invalid", fields: { title: "Enter a title." } }],
  [forbidden(), 403, { title: "forbidden" }],
  [notFound(), 404, { title: "not-found" }],
  [conflict("stale-edition", "Somebody else changed it."), 409, { title: "conflict", code: "stale-edition", detail: "Somebody else changed it." }],
])("a refusal is a problem document (%#)", async (outcome, status, members) => {
  if (outcome.ok) throw new Error("a refusal was meant");
  const response = problemResponse(outcome.refusal);
  expect(response.status).toBe(status);
  expect(response.headers.get("content-type")).toBe("application/problem+json");
  expect(await response.json()).toMatchObject({ type: "about:blank", status, detail: outcome.refusal.sentence, ...members });
});
