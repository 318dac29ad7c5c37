/** The phone's own store and sync against the real server. */
import path from "node:path";
import { beforeEach, describe, expect, it } from "vitest";
import { backUpDatabase, backupsDir } from "../../server/db/back-up-database.ts";
import { eraseBike } from "../../server/services/erase.ts";
import { restoreDatabase } from "../../server/services/restore-database.ts";
import { ApiError, NoNetworkError } from "../../src/offline/errors.ts";
import type { NewEntry } from "../../src/offline/types.ts";
import { clubOfFour } from "../helpers/club.ts";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  newId,
  noteEntry,
  smallLog,
} from "../helpers/make-entry.ts";
import { PASSWORD, signUpRider, type Rider } from "../helpers/rider.ts";
import { startTestServer, type TestServer } from "../helpers/start-test-server.ts";
import { wiredPhone, type Network, type WiredPhone } from "../helpers/phones/wired-phone.ts";

let server: TestServer;
let rider: Rider;
let bikeId: string;

const phoneOf = (owner: Rider) =>
  wiredPhone(owner.user, { server: () => server, cookie: () => owner.cookie });

async function keepAll(phone: WiredPhone, entries: object[]): Promise<void> {
  for (const entry of entries) await phone.keep(entry as NewEntry);
}

/** What a phone shows of the bike, but for when it stored each line. */
async function shownBy(phone: WiredPhone) {
  const bike = await phone.bike(bikeId);
  return bike && { ...bike, log: bike.log.map(({ savedAt: _, ...line }) => line) };
}

const loseRequest: Network = () => Promise.reject(new TypeError("fetch failed"));
const loseAnswer: Network = async (input, init) => {
  await fetch(input, init);
  throw new TypeError("fetch failed");
};

beforeEach(async () => {
  server = await startTestServer();
  rider = await signUpRider(server);
  bikeId = newId();
});

describe("a phone that has what an erased account wrote", () => {
  it("shows it without the name, once it has synced, and is otherwise as it was", async () => {
    const { owner, mechanic, bikeId } = await clubOfFour(server);
    const phone = phoneOf(owner);
    await mechanic.sync([checkEntry(bikeId, 40, 3), noteEntry(bikeId, "Loose hose", "stop")]);
    await phone.sync();
    const kept = async () => {
      const database = await phone.open();
      return JSON.stringify([await database.getAll("entries"), await database.getAll("bikes")]);
    };
    const before = (await phone.bike(bikeId))!;
    expect(before.record.advice?.author?.name).toBe("Mick");

    await mechanic.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    await phone.sync();
    const after = (await phone.bike(bikeId))!;
    expect(after.record.advice?.author?.name).toBe("Former member");
    expect(await kept()).not.toContain("Mick");
    const lines = ({ log }: typeof after) => log.map(({ entry, state }) => [entry.id, state]);
    expect(lines(after)).toEqual(lines(before));
    expect(after.record.summary).toEqual(before.record.summary);
    expect(await owner.summary(bikeId)).toEqual(before.record.summary);

    const known = Object.fromEntries((await phone.bikes()).map((bike) => [bike.bikeId, bike.rev]));
    expect((await owner.sync([], { known })).bikes).toEqual([]);
    const next = hoursEntry(bikeId, 41);
    const pulled = (await owner.sync([next], { known })).bikes;
    expect(pulled.flatMap(({ entries }) => entries.map(({ id }) => id))).toEqual([next.id]);
  });
});

describe("two phones of one rider", () => {
  it("show the same log and the summary that the server computed", async () => {
    const [first, second] = [phoneOf(rider), phoneOf(rider)];
    await keepAll(first, smallLog(bikeId));
    await first.sync();
    await second.sync();
    const shown = await shownBy(first);
    expect(shown?.log.map(({ state }) => state)).toEqual(Array(5).fill("sent"));
    expect(shown?.record.summary).toMatchObject({ verdict: "low", action: "stop" });
    expect(await shownBy(second)).toEqual(shown);
    expect(await rider.summary(bikeId)).toEqual(shown?.record.summary);
  });

  it("agree after both wrote with no network", async () => {
    const [first, second] = [phoneOf(rider), phoneOf(rider)];
    await keepAll(first, smallLog(bikeId));
    await first.sync();
    await second.sync();
    await keepAll(first, [hoursEntry(bikeId, 40, "2026-05-01T09:00:00.000Z")]);
    await keepAll(second, [checkEntry(bikeId, 52, 2.9, "2026-06-01T09:00:00.000Z")]);
    for (const phone of [first, second, first]) await phone.sync();
    expect(await shownBy(second)).toEqual(await shownBy(first));
    expect((await shownBy(first))?.record.summary).toEqual(await rider.summary(bikeId));
  });
});

describe("a bad network", () => {
  it("loses nothing where the request was lost, and doubles nothing where the answer was", async () => {
    const phone = phoneOf(rider);
    await keepAll(phone, smallLog(bikeId));
    await expect(phone.sync(loseRequest)).rejects.toBeInstanceOf(NoNetworkError);
    await expect(phone.sync(loseAnswer)).rejects.toBeInstanceOf(NoNetworkError);
    expect(await phone.unsent()).toHaveLength(5);
    await phone.sync();
    expect(await phone.unsent()).toEqual([]);
    expect(server.store.entries.ofBike(bikeId)).toHaveLength(5);
  });

  it("sends a log longer than one call takes, and fetches it whole", async () => {
    const phone = phoneOf(rider);
    await phone.keep(bikeEntry(bikeId));
    const [row] = await (await phone.open()).getAll("entries");
    const change = (await phone.open()).transaction("entries", "readwrite");
    for (let count = 0; count < 600; count += 1)
      await change.store.put({ ...row!, entry: { ...row!.entry, id: newId() } });
    await change.done;
    await phone.sync();
    expect(await phone.unsent()).toEqual([]);
    const other = phoneOf(rider);
    await other.sync();
    expect((await other.bike(bikeId))?.log).toHaveLength(601);
  });
});

describe("someone else's session", () => {
  it("is refused whole, and the entries stay with their writer", async () => {
    const stranger = await signUpRider(server, "Bob");
    const phone = wiredPhone(rider.user, {
      server: () => server,
      cookie: () => stranger.cookie,
    });
    await keepAll(phone, smallLog(bikeId));
    await expect(phone.sync()).rejects.toMatchObject({ name: "ApiError", status: 409 });
    expect(await phone.unsent()).toHaveLength(5);
    expect(server.store.entries.ofBike(bikeId)).toEqual([]);
  });

  it("that has ended keeps everything for the next one", async () => {
    const phone = phoneOf(rider);
    await keepAll(phone, smallLog(bikeId));
    await rider.phone.post("/api/auth/sign-out");
    const error = await phone.sync().catch((thrown: unknown) => thrown);
    expect(error).toBeInstanceOf(ApiError);
    expect(error).toMatchObject({ status: 401 });
    expect(await phone.unsent()).toHaveLength(5);
  });
});

describe("a bike erased on the server", () => {
  it("leaves every phone, but for what was still unsent", async () => {
    const [first, second] = [phoneOf(rider), phoneOf(rider)];
    await keepAll(first, smallLog(bikeId));
    await first.sync();
    await second.sync();
    eraseBike(server.store, rider.user.id, bikeId);
    await keepAll(second, [hoursEntry(bikeId, 40)]);
    await first.sync();
    await second.sync();
    expect(await first.bike(bikeId)).toBeNull();
    expect(await second.bike(bikeId)).toBeNull();
    expect(await second.unsent()).toMatchObject([
      { state: "refused", reason: "erased", entry: { hours: 40 } },
    ]);
  });
});

describe("a restored server", () => {
  it("is healed by its riders' phones, and every phone agrees again", async () => {
    const [first, second] = [phoneOf(rider), phoneOf(rider)];
    const log = smallLog(bikeId);
    await keepAll(first, log.slice(0, 2));
    await first.sync();
    const backup = path.join(backupsDir(server.dataDir), "kept.sqlite");
    await backUpDatabase(server.database.$client, backup);
    await keepAll(first, log.slice(2));
    await first.sync();
    await second.sync();
    const before = await shownBy(first);

    await server.stop();
    await restoreDatabase(server.dataDir, backup);
    server = await startTestServer({ dataDir: server.dataDir });
    await second.sync();
    await first.sync();
    expect(server.store.entries.ofBike(bikeId)).toHaveLength(5);
    const after = await shownBy(first);
    expect(after?.record.summary).toEqual(before?.record.summary);
    expect(await shownBy(second)).toEqual(after);
    expect(await second.unsent()).toEqual([]);
  });
});
