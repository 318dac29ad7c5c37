import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { Club } from "../../../shared/schemas/club.ts";
import { rememberAccount } from "../account.ts";
import { clubsQuery, lineUpQuery } from "../club-queries.ts";
import { keepDraft } from "../drafts.ts";
import { NoNetworkError } from "../errors.ts";
import { phoneOf, type Phone } from "../logbook/phone.ts";
import { createReadCache } from "../query-cache.ts";
import { changeTestDay } from "../test-day.ts";
import { recheckClubs } from "./recheck-clubs.ts";

const moor: Club = { id: "moor", name: "Moor Riders", organiser: false, mechanic: true };

const row = (bikeId: string) => ({
  ...{ bikeId, name: bikeId, owner: { id: "wren", name: "Wren" }, tag: "7KMX4P" },
  ...{ place: "settling", action: null, verdict: "settling", ratio: null, trendPerHour: null },
  ...{ hoursNow: 12, dueInHours: 20, onDate: null, lastCheckAt: null, pumpHours: null },
  ...{ limitsTightened: false, lowCheckStruck: false, stopAdvised: false, hoseMaybeOff: false },
});

/** What the server knows; undefined where it has a problem of its own. */
interface World {
  clubs?: Club[];
  bikes: string[];
}
let world: World;
const asked: string[] = [];

function server(path: string): Promise<Response> {
  asked.push(path);
  const problem = (status: number) => {
    const body = { type: "about:blank", title: "", status, detail: "It is not here." };
    const headers = { "content-type": "application/problem+json" };
    return new Response(JSON.stringify(body), { status, headers });
  };
  if (!world.clubs) return Promise.resolve(problem(500));
  if (path === "/api/clubs") return Promise.resolve(Response.json({ clubs: world.clubs }));
  const [, clubId] = /^\/api\/clubs\/(\w+)\/line-up/.exec(path)!;
  const isMechanic = world.clubs.some(({ id, mechanic }) => id === clubId && mechanic);
  if (!isMechanic) return Promise.resolve(problem(404));
  return Promise.resolve(Response.json({ bikes: world.bikes.map(row), next: null }));
}

let riders = 0;

/** As when the app is opened. */
function shownClient(accountId: string) {
  const { client, persistOptions } = createReadCache(accountId);
  void persistOptions.persister.restoreClient();
  return client;
}

/** A mechanic's phone on which the board was looked at, and both its bikes are in the queue. */
async function mechanicsPhone() {
  const account = { id: `mechanic-${(riders += 1)}`, name: "Maud", email: "maud@club.example" };
  rememberAccount(account);
  const phone = phoneOf(account);
  const client = shownClient(account.id);
  await client.fetchQuery(clubsQuery);
  await client.fetchQuery(lineUpQuery("moor"));
  client.setQueryData(["clubs", "moor", "members"], [{ name: "Wren" }]);
  const queued = { owner: "Wren", tag: "7KMX4P" };
  await changeTestDay("moor", (testDay) => ({
    ...testDay,
    bikes: [
      { bikeId: "Moss", name: "Moss", ...queued, entryId: null },
      { bikeId: "Fern", name: "Fern", ...queued, entryId: "checked" },
    ],
  }));
  asked.length = 0;
  return { phone, client };
}

const recheck = (phone: Phone) => recheckClubs(phone, () => true);

const draftsOf = async (phone: Phone) =>
  JSON.stringify(await (await phone.open()).getAll("drafts"));

/** All that was said of clubs. */
const saidIn = ({ client }: Awaited<ReturnType<typeof mechanicsPhone>>) =>
  JSON.stringify(client.getQueriesData({ queryKey: ["clubs"] }));

describe("after a sync", () => {
  beforeEach(() => {
    world = { clubs: [moor], bikes: ["Moss", "Fern"] };
    vi.stubGlobal("fetch", server);
  });
  afterEach(() => vi.unstubAllGlobals());

  it("a bike that was withdrawn is on no board, and in no test day", async () => {
    const mechanic = await mechanicsPhone();
    world.bikes = ["Fern"];
    await recheck(mechanic.phone);
    expect(saidIn(mechanic)).toContain("Fern");
    expect(saidIn(mechanic)).not.toContain("Moss");
    expect(await draftsOf(mechanic.phone)).toContain("Fern");
    expect(await draftsOf(mechanic.phone)).not.toContain("Moss");
  });

  it("what was typed of it and not saved stays", async () => {
    const { phone } = await mechanicsPhone();
    await keepDraft("Moss", "station-check", { runs: [{ endText: "2.9" }] });
    world.bikes = [];
    await recheck(phone);
    expect(await draftsOf(phone)).toContain("2.9");
  });

  it("one who was removed keeps nothing of the club", async () => {
    const mechanic = await mechanicsPhone();
    world.clubs = [];
    await recheck(mechanic.phone);
    expect(saidIn(mechanic)).not.toMatch(/Moss|Wren|Moor/);
    expect(await draftsOf(mechanic.phone)).toBe("[]");
  });

  it("one who is mechanic no more keeps the club, and nothing of its board", async () => {
    const mechanic = await mechanicsPhone();
    world.clubs = [{ ...moor, mechanic: false }];
    await recheck(mechanic.phone);
    expect(saidIn(mechanic)).toMatch(/Moor.*Wren/);
    expect(saidIn(mechanic)).not.toContain("Moss");
    expect(await draftsOf(mechanic.phone)).toBe("[]");
  });

  it("all stays while the server has a problem, and where there is no network", async () => {
    const mechanic = await mechanicsPhone();
    const before = [saidIn(mechanic), await draftsOf(mechanic.phone)];
    world.clubs = undefined;
    await recheck(mechanic.phone);
    vi.stubGlobal("fetch", () => Promise.reject(new TypeError("Failed to fetch")));
    await expect(recheck(mechanic.phone)).rejects.toBeInstanceOf(NoNetworkError);
    expect([saidIn(mechanic), await draftsOf(mechanic.phone)]).toEqual(before);
  });

  it("nothing is asked on the phone of one who is in no club", async () => {
    const account = { id: "alone", name: "Ada", email: "ada@club.example" };
    rememberAccount(account);
    const client = shownClient(account.id);
    world.clubs = [];
    await client.fetchQuery(clubsQuery);
    asked.length = 0;
    await recheck(phoneOf(account));
    expect(asked).toEqual([]);
  });

  it("nothing changes once someone else has signed in", async () => {
    const mechanic = await mechanicsPhone();
    const before = await draftsOf(mechanic.phone);
    world.clubs = [];
    let asks = 0;
    await recheckClubs(mechanic.phone, () => (asks += 1) < 2);
    expect(asks).toBe(2);
    expect(await draftsOf(mechanic.phone)).toBe(before);
  });
});
