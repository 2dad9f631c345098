import type { Route } from "next";

/**
 * A path on this site to go back to; anything else leads to the account's page, never away from here.
 * Tabs and line ends count as something else: browsers drop them, and "/<tab>/elsewhere" would lead there.
 */
export function safeBack(raw: unknown): Route {
  if (typeof raw !== "string" || !/^\/(?![/\\])\P{Cc}*$/u.test(raw)) return "/account";
  return raw as Route;
}
