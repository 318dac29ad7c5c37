import {
  persistQueryClientRestore,
  persistQueryClientSave,
} from "@tanstack/react-query-persist-client";
import { describe, expect, it, vi } from "vitest";
import { createReadCache, type ReadCache } from "./query-cache.ts";

const optionsOf = ({ client, persistOptions }: ReadCache) => ({
  ...persistOptions,
  queryClient: client,
});

/** Writes a cache out and reads it into a new one, as closing and opening the app does. */
async function reopen(cache: ReadCache, accountId: string): Promise<ReadCache> {
  vi.useFakeTimers();
  await persistQueryClientSave(optionsOf(cache));
  vi.runAllTimers();
  vi.useRealTimers();
  const next = createReadCache(accountId);
  await persistQueryClientRestore(optionsOf(next));
  return next;
}

async function ask(cache: ReadCache, key: string, persist: boolean): Promise<void> {
  await cache.client.fetchQuery({
    queryKey: [key],
    queryFn: () => "answer",
    networkMode: "always",
    meta: { persist },
  });
}

describe("the read cache", () => {
  it("keeps the queries that ask for it, and no others", async () => {
    const cache = createReadCache("a");
    await ask(cache, "clubs", true);
    await ask(cache, "logbook", false);
    const next = await reopen(cache, "a");
    expect(next.client.getQueryData(["clubs"])).toBe("answer");
    expect(next.client.getQueryData(["logbook"])).toBeUndefined();
  });

  it("shows nothing of one account to another", async () => {
    const cache = createReadCache("a");
    await ask(cache, "clubs", true);
    const next = await reopen(cache, "b");
    expect(next.client.getQueryData(["clubs"])).toBeUndefined();
  });

  it("is empty where what was kept cannot be read", async () => {
    localStorage.setItem("sumpless-read-c", "{");
    const reports = [vi.mocked(console.error), vi.mocked(console.warn)];
    for (const report of reports) report.mockImplementation(() => undefined);
    const cache = createReadCache("c");
    await persistQueryClientRestore(optionsOf(cache)).catch(() => undefined);
    expect(cache.client.getQueryCache().getAll()).toEqual([]);
    for (const report of reports) report.mockClear();
  });
});
