import { act, renderHook, waitFor } from "@testing-library/react";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { askToKeepStorage, storageHealth, useStorageHealth } from "./storage-health.ts";

/** A browser that keeps storage once asked, or will not. */
function browserThat(grants: boolean) {
  let kept = false;
  const persist = vi.fn(() => Promise.resolve((kept = grants)));
  const storage = { persist, persisted: () => Promise.resolve(kept) };
  Object.defineProperty(navigator, "storage", { value: storage, configurable: true });
  return persist;
}

describe("the storage's health", () => {
  beforeEach(() => localStorage.clear());

  it("is asked about once, after which it is kept", async () => {
    const persist = browserThat(true);
    const { result } = renderHook(useStorageHealth);
    await waitFor(() => expect(result.current).toBe("unasked"));
    await act(askToKeepStorage);
    expect(result.current).toBe("persisted");
    await askToKeepStorage();
    expect(persist).toHaveBeenCalledOnce();
  });

  it("stays refused without asking again, also after opening the app anew", async () => {
    const persist = browserThat(false);
    await askToKeepStorage();
    await askToKeepStorage();
    expect(await storageHealth()).toBe("refused");
    expect(persist).toHaveBeenCalledOnce();
  });

  it("is not asked about where there is no room to note it", async () => {
    const persist = browserThat(true);
    vi.spyOn(Storage.prototype, "setItem").mockImplementation(() => {
      throw new DOMException("Full.", "QuotaExceededError");
    });
    await askToKeepStorage();
    expect(persist).not.toHaveBeenCalled();
  });

  it("is unavailable where the browser makes no promises", async () => {
    Object.defineProperty(navigator, "storage", { value: undefined, configurable: true });
    await askToKeepStorage();
    expect(await storageHealth()).toBe("unavailable");
  });
});
