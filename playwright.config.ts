import { defineConfig } from "@playwright/test";

/** End-to-end tests in Debian's Chromium. tests/e2e/support/ground.ts starts what they need on free ports. */
export default defineConfig({
  testDir: "tests/e2e",
  globalSetup: "./tests/e2e/support/ground.ts",
  workers: 2,
  retries: 0,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  use: {
    browserName: "chromium",
    launchOptions: {
      executablePath: process.env.CHROMIUM_PATH ?? "/usr/bin/chromium",
      args: [
        ...["--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run"],
        ...["--disable-background-networking", "--disable-component-update", "--disable-sync"],
      ],
    },
    locale: "en-US",
    timezoneId: "America/Los_Angeles",
    viewport: { width: 1280, height: 900 },
    trace: process.env.E2E_TRACE ? "retain-on-failure" : "off",
  },
});
