import { env } from "./env";

/** Full addresses for what leaves the program: mails, calendar files, payment pages. */
export function publicAddress(path: `/${string}`): string {
  return new URL(path, env().PUBLIC_URL).toString();
}
