import { tmpdir } from "node:os";
import path from "node:path";
import { defineConfig } from "vitest/config";

const root = import.meta.dirname;

export default defineConfig({
  resolve: { alias: { "@": root } },
  test: {
    root,
    include: ["tests/{unit,integration,architecture}/**/*.test.{ts,tsx}"],
    globalSetup: ["tests/support/template-database.ts"],
    setupFiles: ["tests/support/console-errors.ts"],
    env: {
      DUNLIN_ENV: "test",
      LOG_LEVEL: "silent",
      TZ: "UTC",
      FILES_DIR: path.join(tmpdir(), `dunlin-test-files-${process.pid}`), // removed with the template database
    },
    // Each test has a database of its own, so files share a process and its loaded packages: a third less work.
    isolate: false,
    // Unsaid, one core is left idle for whoever is typing; here both work.
    maxWorkers: 2,
    testTimeout: 20_000,
  },
});
