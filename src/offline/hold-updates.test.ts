import { renderHook } from "@testing-library/react";
import { describe, expect, it, vi } from "vitest";
import {
  holdUpdates,
  onUpdatesHeldChange,
  updatesHeld,
  useHoldUpdates,
  whenUpdatesFree,
} from "./hold-updates.ts";

describe("holding updates back", () => {
  it("lasts until every form has let go, each once", async () => {
    const [first, second] = [holdUpdates(), holdUpdates()];
    first();
    first();
    await Promise.resolve();
    expect(updatesHeld()).toBe(true);
    second();
    await Promise.resolve();
    expect(updatesHeld()).toBe(false);
  });

  it("lasts as long as a form is open", async () => {
    const { rerender, unmount } = renderHook(({ open }) => useHoldUpdates(open), {
      initialProps: { open: false },
    });
    expect(updatesHeld()).toBe(false);
    rerender({ open: true });
    expect(updatesHeld()).toBe(true);
    unmount();
    await Promise.resolve();
    expect(updatesHeld()).toBe(false);
  });

  it("tells who listens", async () => {
    const listener = vi.fn();
    const stop = onUpdatesHeldChange(listener);
    holdUpdates()();
    await Promise.resolve();
    expect(listener).toHaveBeenCalledTimes(2);
    stop();
  });

  it("keeps an update away meanwhile", async () => {
    const update = vi.fn();
    const release = holdUpdates();
    await whenUpdatesFree(update);
    expect(update).not.toHaveBeenCalled();
    release();
    await Promise.resolve();
    await whenUpdatesFree(update);
    expect(update).toHaveBeenCalledOnce();
  });
});
