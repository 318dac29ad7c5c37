import { beforeAll, beforeEach, expect, it, vi } from "vitest";
import { holdUpdates } from "../offline/index.ts";
import { reloadOnMissingChunk } from "./missing-chunk.ts";

const reload = vi.fn();
/** True where the error takes its course to the screen's error boundary. */
const missChunk = () => window.dispatchEvent(new Event("vite:preloadError", { cancelable: true }));

beforeAll(() => reloadOnMissingChunk(reload));
beforeEach(() => {
  sessionStorage.clear();
  reload.mockClear();
});

it("loads the page anew for a missing chunk, once", () => {
  expect(missChunk()).toBe(false);
  expect(missChunk()).toBe(true);
  expect(reload).toHaveBeenCalledOnce();
});

it("never does so over an open form", async () => {
  const release = holdUpdates();
  expect(missChunk()).toBe(true);
  expect(reload).not.toHaveBeenCalled();
  release();
  await Promise.resolve();
});

it("does not trade a working page for the browser's own error page", () => {
  const onLine = vi.spyOn(navigator, "onLine", "get").mockReturnValue(false);
  expect(missChunk()).toBe(true);
  expect(reload).not.toHaveBeenCalled();
  onLine.mockRestore();
});
