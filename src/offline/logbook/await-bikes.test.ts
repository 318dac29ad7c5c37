// @vitest-environment node
import { v7 as makeId } from "uuid";
import { describe, expect, it } from "vitest";
import type { Entry, StoredEntry } from "../../../shared/schemas/entry.ts";
import type { SyncRequest, SyncResponse } from "../../../shared/schemas/sync.ts";
import { bikeEntry, checkEntry, noteEntry } from "../../../tests/helpers/make-entry.ts";
import { testPhone } from "../../../tests/helpers/phones/test-phone.ts";
import { runSyncSession } from "../sync/sync-session.ts";
import { awaitBikes } from "./await-bikes.ts";
import type { Phone } from "./phone.ts";
import { readBike } from "./read-bike.ts";

const owner = { id: makeId(), name: "Wren" };
const mechanic = { id: makeId(), name: "Maud" };
const stored = (entry: object, rev: number, author = owner): StoredEntry => ({
  ...(entry as Entry),
  author,
  receivedAt: "2026-03-01T10:00:00.000Z",
  rev,
});

/** One session with a server that answers so; shows what the phone said it has. */
async function sync(phone: Phone, answer: Partial<SyncResponse>) {
  const asked: SyncRequest["known"][] = [];
  await runSyncSession({
    phone,
    send: (request) => {
      asked.push(request.known);
      const empty = { epoch: "one", results: [], bikes: [], gone: [], more: false };
      return Promise.resolve({ ...empty, ...answer });
    },
    isCurrent: () => true,
    onApplied: () => undefined,
  });
  return asked[0];
}

const records = async (phone: Phone) => (await phone.open()).getAll("bikes");

describe("awaitBikes", () => {
  it("asks for a bike from its beginning, and has it once the server sent it", async () => {
    const phone = testPhone();
    const bikeId = makeId();
    await awaitBikes(phone, [bikeId]);
    expect(await records(phone)).toMatchObject([{ bikeId, access: "mechanic", awaited: true }]);
    expect(await readBike(phone, bikeId)).toBeNull();

    const stop = { ...noteEntry(bikeId), body: { text: "Blocked", advice: "stop" as const } };
    const entries = [
      stored(bikeEntry(bikeId), 1),
      stored(checkEntry(bikeId, 12, 3), 2),
      stored(stop, 3, mechanic),
    ];
    expect(await sync(phone, { bikes: [{ bikeId, access: "mechanic", rev: 3, entries }] })).toEqual(
      { [bikeId]: 0 },
    );
    expect((await readBike(phone, bikeId))?.record).toMatchObject({
      awaited: false,
      ownerId: owner.id,
      details: { name: "Moss" },
      lineUp: { place: "stop", stopAdvised: true },
      advice: { author: mechanic, body: { text: "Blocked" } },
    });
  });

  it("takes a bike off again that this account may not see", async () => {
    const phone = testPhone();
    const bikeId = makeId();
    await awaitBikes(phone, [bikeId]);
    await sync(phone, { gone: [bikeId] });
    expect(await records(phone)).toEqual([]);
  });

  it("leaves alone a bike that is here, and what cannot be a bike's id", async () => {
    const phone = testPhone();
    const bikeId = makeId();
    await awaitBikes(phone, [bikeId]);
    const entries = [stored(bikeEntry(bikeId), 7)];
    await sync(phone, { bikes: [{ bikeId, access: "mechanic", rev: 7, entries }] });
    await awaitBikes(phone, [bikeId, "new"]);
    expect(await records(phone)).toMatchObject([{ bikeId, rev: 7, awaited: false }]);
  });
});
