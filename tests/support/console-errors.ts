import { afterEach, beforeEach, expect } from "vitest";

/** What is written to console.error is a fault somebody would have overlooked: it fails the test it came from. */
const written: string[] = [];
const write = console.error;

beforeEach(() => {
  written.length = 0;
  console.error = (...parts: unknown[]) => {
    written.push(parts.map(String).join(" "));
    write(...parts);
  };
});

afterEach(() => {
  console.error = write;
  expect(written, "console.error was called during this test").toEqual([]);
});
