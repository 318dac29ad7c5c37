import { act, renderHook } from "@testing-library/react";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { readAccountCopy } from "./account-copy.ts";
import { forgetAccount, rememberAccount, rememberedAccount, useAccount } from "./account.ts";

const ada = { id: "a", name: "Ada", email: "ada@club.example" };

describe("the remembered account", () => {
  beforeEach(forgetAccount);

  it("is there after a reload", () => {
    rememberAccount(ada);
    expect(JSON.parse(localStorage.getItem("sumpless-account")!)).toEqual(ada);
    expect(rememberedAccount()).toEqual(ada);
  });

  it("holds nothing but who it is", () => {
    rememberAccount({ ...ada, verified: true } as typeof ada);
    expect(rememberedAccount()).toEqual(ada);
  });

  it.each(["", "{", "null", "7", '{"id":"a"}', '{"id":"","name":"","email":""}', '["a"]'])(
    "is nobody where localStorage holds %j",
    (text) => {
      localStorage.setItem("sumpless-account", text);
      expect(rememberedAccount()).toBeNull();
    },
  );

  it("tells the screens when it changes here", () => {
    const { result } = renderHook(useAccount);
    expect(result.current).toBeNull();
    act(() => rememberAccount(ada));
    expect(result.current).toEqual(ada);
    act(forgetAccount);
    expect(result.current).toBeNull();
  });

  it("tells the screens when it changes in another tab", () => {
    const { result } = renderHook(useAccount);
    act(() => {
      localStorage.setItem("sumpless-account", JSON.stringify(ada));
      window.dispatchEvent(new StorageEvent("storage", { key: "sumpless-account" }));
    });
    expect(result.current).toEqual(ada);
  });
});

/** The app as it starts the next time. */
async function nextStart() {
  vi.resetModules();
  return import("./account.ts");
}

const copyHolds = (text: string | null) => expect.poll(() => readAccountCopy()).toBe(text);

describe("the lasting copy of the account", () => {
  const bea = { ...ada, id: "b" };
  beforeEach(async () => {
    rememberAccount(ada);
    await copyHolds(JSON.stringify(ada));
  });

  it("knows the account where localStorage lost it, and puts it back", async () => {
    localStorage.clear();
    const next = await nextStart();
    const listener = vi.fn();
    next.onAccountChange(listener);
    expect(next.rememberedAccount()).toBeNull();
    await next.settleAccount();
    expect(next.rememberedAccount()).toEqual(ada);
    expect(listener).toHaveBeenCalledOnce();
    expect(JSON.parse(localStorage.getItem("sumpless-account")!)).toEqual(ada);
  });

  it("knows nobody once signed out, also where localStorage still holds the account", async () => {
    const text = localStorage.getItem("sumpless-account")!;
    forgetAccount();
    await copyHolds(null);
    localStorage.setItem("sumpless-account", text);
    const next = await nextStart();
    await next.settleAccount();
    expect(next.rememberedAccount()).toBeNull();
    expect(localStorage.getItem("sumpless-account")).toBeNull();
  });

  it("gives way to whoever signs in while it is being read", async () => {
    localStorage.clear();
    const next = await nextStart();
    const settled = next.settleAccount();
    next.rememberAccount(bea);
    await settled;
    expect(next.rememberedAccount()).toEqual(bea);
    await copyHolds(JSON.stringify(bea));
  });

  it("is made at the next start of a phone that has none yet", async () => {
    indexedDB.deleteDatabase("sumpless-account");
    await (await nextStart()).settleAccount();
    await copyHolds(JSON.stringify(ada));
  });

  it("keeps an account that localStorage has no room for", async () => {
    vi.spyOn(Storage.prototype, "setItem").mockImplementation(() => {
      throw new DOMException("Full.", "QuotaExceededError");
    });
    rememberAccount(bea);
    expect(rememberedAccount()).toEqual(bea);
    expect(localStorage.getItem("sumpless-account")).toBeNull();
    await copyHolds(JSON.stringify(bea));
    forgetAccount();
    expect(rememberedAccount()).toBeNull();
  });
});
