import { defineConfig } from "vitest/config";

const root = import.meta.dirname;

export default defineConfig({
  resolve: { alias: { "@": root } },
  test: {
    root,
    include: ["tests/{unit,integration,architecture}/**/*.test.{ts,tsx}"],
    globalSetup: ["tests/support/template-database.ts"],
    setupFiles: ["tests/support/console-errors.ts"],
    env: { DUNLIN_ENV: "test", LOG_LEVEL: "silent", TZ: "UTC" },
    testTimeout: 20_000,
  },
});
