import { expect, test as base, type BrowserContext, type BrowserContextOptions, type Page } from "@playwright/test";
import type { SignedIn } from "@/lib/shared/actor";
import { place, type Ground } from "./place";
import { sessionCookie } from "./people";

type Options = BrowserContextOptions & { ground?: Ground };

type Fixtures = {
  /** What the browser reports as an error anywhere in the test; the test fails if there is anything. */
  faults: string[];
  /** Opens a browser window of its own, signed in as somebody or as nobody. */
  open: (who: SignedIn | null, options?: Options) => Promise<Page>;
};

export const test = base.extend<Fixtures>({
  baseURL: async ({}, use) => use(place().app),
  faults: [
    async ({}, use) => {
      const faults: string[] = [];
      await use(faults);
      expect(faults, "errors in the browser").toEqual([]);
    },
    { auto: true },
  ],
  context: async ({ context, faults }, use) => {
    watch(context, faults);
    await use(context);
  },
  open: async ({ browser, faults }, use) => {
    const opened: BrowserContext[] = [];
    await use(async (who, { ground = place(), ...options } = {}) => {
      const context = await browser.newContext({ baseURL: ground.app, ...options });
      opened.push(context);
      watch(context, faults);
      if (who) await context.addCookies([await sessionCookie(who, ground)]);
      return context.newPage();
    });
    for (const context of opened) await context.close();
  },
});

/** A page that answers 404 on purpose is an error to the browser and none to us. */
function watch(context: BrowserContext, faults: string[]): void {
  context.on("weberror", (error) => faults.push(String(error.error())));
  context.on("console", (message) => {
    if (message.type() !== "error" || message.text().startsWith("Failed to load resource")) return;
    faults.push(`${message.page()?.url() ?? ""}: ${message.text()}`);
  });
}

export { expect };
