import { act, renderHook } from "@testing-library/react";
import { beforeEach, describe, expect, it } from "vitest";
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
