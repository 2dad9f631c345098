import { invalidRequest } from "./api-error";
import type { CreatedParam, PageParams } from "./params";

const DEFAULT_LIMIT = 10;

export type Page<T> = { items: T[]; hasMore: boolean };

/**
 * One page, newest first when the items are given newest first, with Stripe's cursors.
 * @throws ApiError (400) when the cursor names nothing in the list
 */
export function takePage<T extends { id: string }>(items: readonly T[], params: PageParams): Page<T> {
  const limit = params.limit ?? DEFAULT_LIMIT;
  if (params.ending_before !== undefined) {
    const end = positionOf(items, params.ending_before, "ending_before");
    const start = Math.max(0, end - limit);
    return { items: items.slice(start, end), hasMore: start > 0 };
  }
  const after = params.starting_after;
  const start = after === undefined ? 0 : positionOf(items, after, "starting_after") + 1;
  return { items: items.slice(start, start + limit), hasMore: start + limit < items.length };
}

export function wasCreatedWithin(createdSeconds: number, wanted: CreatedParam): boolean {
  if (wanted === undefined) return true;
  if (typeof wanted === "number") return createdSeconds === wanted;
  return (
    createdSeconds > (wanted.gt ?? -Infinity) &&
    createdSeconds >= (wanted.gte ?? -Infinity) &&
    createdSeconds < (wanted.lt ?? Infinity) &&
    createdSeconds <= (wanted.lte ?? Infinity)
  );
}

function positionOf(items: readonly { id: string }[], id: string, param: string): number {
  const position = items.findIndex((item) => item.id === id);
  if (position < 0) throw invalidRequest(`Invalid ${param}: no such object in this list: ${id}`, { param });
  return position;
}
