import { describe, expect, it } from "vitest";
import type { SyncStatus } from "../offline/index.ts";
import { statusWords } from "./status-words.ts";

const calm: SyncStatus = {
  phase: "idle",
  unsent: 0,
  refused: 0,
  oldestUnsentAt: null,
  lastSyncAt: null,
};
const longAgo = "2026-03-01T12:00:00.000Z";

describe("statusWords", () => {
  it("says nothing where there is nothing to say", () => expect(statusWords(calm)).toBe(""));

  it("says when everything was sent", () =>
    expect(statusWords({ ...calm, lastSyncAt: longAgo })).toBe("All sent, 1 Mar"));

  it("says that there is no network, how many entries wait and since when", () => {
    const waiting = { ...calm, phase: "offline" as const, unsent: 3, oldestUnsentAt: longAgo };
    expect(statusWords(waiting)).toBe("Offline · 3 entries wait since 1 Mar");
    expect(statusWords({ ...waiting, unsent: 1 })).toBe("Offline · 1 entry waits since 1 Mar");
  });

  it("counts apart what the server did not accept", () => {
    const refused = { ...calm, unsent: 3, refused: 3, oldestUnsentAt: longAgo };
    expect(statusWords(refused)).toBe("3 not accepted");
    expect(statusWords({ ...refused, refused: 1 })).toBe(
      "2 entries wait since 1 Mar · 1 not accepted",
    );
  });

  it("says that the session is over while the app goes on", () =>
    expect(statusWords({ ...calm, phase: "signed-out" })).toBe("Signed out"));
});
