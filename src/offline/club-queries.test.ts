import { QueryClient } from "@tanstack/react-query";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { LineUpRow } from "../../shared/schemas/club.ts";
import { lineUpQuery, type LineUp } from "./club-queries.ts";

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

describe("what was said of a club", () => {
  afterEach(() => vi.unstubAllGlobals());

  /** Asks as a screen does that shows what was said before. */
  async function saidAfter(answer: () => Promise<Response>) {
    const client = new QueryClient();
    vi.stubGlobal("fetch", board('"1"', [row("a", "Moss")]));
    await client.fetchQuery(lineUpQuery("moor"));
    vi.stubGlobal("fetch", answer);
    await client.fetchQuery(lineUpQuery("moor")).catch(() => undefined);
    return client.getQueryData<LineUp>(lineUpQuery("moor").queryKey)?.bikes[0]?.name;
  }

  const problem = (status: number) => () => {
    const body = { type: "about:blank", title: "", status, detail: "It is not here." };
    const headers = { "content-type": "application/problem+json" };
    return Promise.resolve(new Response(JSON.stringify(body), { status, headers }));
  };

  it.each([403, 404])("is forgotten once the server answers by %i", async (status) => {
    expect(await saidAfter(problem(status))).toBeUndefined();
  });

  it("stays where there is no network, an ended session or a problem of the server's", async () => {
    expect(await saidAfter(() => Promise.reject(new TypeError("Failed to fetch")))).toBe("Moss");
    expect(await saidAfter(() => Promise.resolve(new Response("", { status: 404 })))).toBe("Moss");
    for (const status of [401, 500]) expect(await saidAfter(problem(status))).toBe("Moss");
  });
});
