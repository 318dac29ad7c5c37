import { QueryClient } from "@tanstack/react-query";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { LineUpRow } from "../../shared/schemas/club.ts";
import { lineUpQuery } from "./club-queries.ts";

const row = (bikeId: string, name: string): LineUpRow => ({
  bikeId,
  name,
  owner: { id: "wren", name: "Wren" },
  ...{ tag: "7KMX4P", place: "settling", action: null, verdict: "settling", ratio: null },
  ...{ trendPerHour: null, hoursNow: 12, dueInHours: 20, onDate: null, lastCheckAt: null },
  ...{ pumpHours: null, limitsTightened: false, lowCheckStruck: false, stopAdvised: false },
  hoseMaybeOff: false,
});

/** A board of two pages, at one revision. */
const board = (etag: string, ...pages: LineUpRow[][]) =>
  vi.fn((path: string, { headers }: { headers: Record<string, string> }) => {
    const after = Number(new URL(path, "http://club.example").searchParams.get("after") ?? 0);
    const holds = headers["if-none-match"] === etag;
    if (holds) return Promise.resolve(new Response(null, { status: 304 }));
    const next = after + 1 < pages.length ? String(after + 1) : null;
    return Promise.resolve(Response.json({ bikes: pages[after], next }, { headers: { etag } }));
  });

describe("a club's Line-up", () => {
  afterEach(() => vi.unstubAllGlobals());

  const ask = async (client: QueryClient) =>
    (await client.fetchQuery(lineUpQuery("moor"))).bikes.map(({ name }) => name);

  it("is read page by page, a bike met twice as it was met last", async () => {
    vi.stubGlobal("fetch", board('"1"', [row("a", "Moss")], [row("b", "Fern"), row("a", "Reed")]));
    expect(await ask(new QueryClient())).toEqual(["Reed", "Fern"]);
  });

  it("is not read again while it is as it was, and is once it has changed", async () => {
    const client = new QueryClient();
    const first = board('"1"', [row("a", "Moss")], [row("b", "Fern")]);
    vi.stubGlobal("fetch", first);
    await ask(client);
    expect(await ask(client)).toEqual(["Moss", "Fern"]);
    expect(first).toHaveBeenCalledTimes(3);
    vi.stubGlobal("fetch", board('"2"', [row("b", "Fern")]));
    expect(await ask(client)).toEqual(["Fern"]);
  });
});
