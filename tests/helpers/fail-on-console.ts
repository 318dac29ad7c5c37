import { afterEach, beforeEach, expect, vi } from "vitest";

/** An unexpected console.error or console.warn fails the test that caused it. */
beforeEach(() => {
  vi.spyOn(console, "error");
  vi.spyOn(console, "warn");
});

afterEach(() => {
  const calls = [console.error, console.warn].flatMap((method) => vi.mocked(method).mock.calls);
  vi.restoreAllMocks();
  expect(calls, "unexpected console output").toEqual([]);
});
