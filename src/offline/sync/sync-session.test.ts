// @vitest-environment node
import { v7 as makeId } from "uuid";
import { describe, expect, it } from "vitest";
import type { Entry } from "../../../shared/schemas/entry.ts";
import type { SyncRequest, SyncResponse, SyncResult } from "../../../shared/schemas/sync.ts";
import { rider, testPhone } from "../../../tests/helpers/phones/test-phone.ts";
import { ApiError, NoNetworkError } from "../errors.ts";
import { keepEntry } from "../logbook/keep-entry.ts";
import type { Phone } from "../logbook/phone.ts";
import { readBike, readUnsent } from "../logbook/read-bike.ts";
import type { NewEntry } from "../types.ts";
import { runSyncSession } from "./sync-session.ts";

const bikeId = "0193a000-0000-7000-8000-000000000001";
const otherBikeId = "0193a000-0000-7000-8000-000000000002";
const at = "2026-03-01T09:00:00.000Z";
const newBike: NewEntry = { bikeId, kind: "bike", at, hours: null, body: { name: "Blue" } };
const hours = (reading: number): NewEntry => ({
  bikeId,
  kind: "hours",
  at,
  hours: reading,
  body: {},
});
const keep = (phone: Phone, entry: NewEntry) =>
  keepEntry(phone, entry, { signal: new AbortController().signal });

const owner = { id: rider.id, name: rider.name };
const stored = (entry: object, rev: number, author = owner) => ({
  ...(entry as Entry),
  author,
  receivedAt: "2026-03-01T10:00:00.000Z",
  rev,
});

type Answer = (request: SyncRequest) => Partial<SyncResponse>;
const each = (request: SyncRequest, status: SyncResult["status"], more: Partial<SyncResult> = {}) =>
  request.entries.map((entry, index) => ({ index, id: (entry as Entry).id, status, ...more }));
const storesAll: Answer = (request) => ({ results: each(request, "stored") });
const refuses =
  (reason: SyncResult["reason"]): Answer =>
  (request) => ({ results: each(request, "refused", { reason }) });

/** Runs a session against a server that gives these answers in turn, and shows what it was sent. */
async function sync(phone: Phone, ...answers: Answer[]): Promise<SyncRequest[]> {
  const sent: SyncRequest[] = [];
  await runSyncSession({
    phone,
    send(request) {
      sent.push(structuredClone(request));
      const answer = answers.shift() ?? storesAll;
      const empty = { epoch: "one", results: [], bikes: [], gone: [], more: false };
      return Promise.resolve().then(() => ({ ...empty, ...answer(request) }));
    },
    isCurrent: () => true,
    onApplied: () => undefined,
  });
  return sent;
}

const statesOf = async (phone: Phone) =>
  (await readBike(phone, bikeId))?.log.map(({ entry, state }) => [entry.kind, state]);

/** A phone whose bike and first reading the server has, as it was told by a pull. */
async function settledPhone() {
  const phone = testPhone();
  const entries = [(await keep(phone, newBike)).entry, (await keep(phone, hours(3))).entry];
  const pulled = entries.map(({ author: _, ...entry }, index) => stored(entry, index + 1));
  await sync(phone, (request) => ({
    ...storesAll(request),
    bikes: [{ bikeId, access: "owner", rev: 2, entries: pulled }],
  }));
  return phone;
}

describe("sending", () => {
  it("says whose entries they are and what the phone has", async () => {
    const phone = await settledPhone();
    await keep(phone, hours(4));
    const [request] = await sync(phone);
    expect(request).toEqual({
      account: rider.id,
      epoch: "one",
      known: { [bikeId]: 2 },
      entries: [{ ...hours(4), v: 1, id: expect.any(String) as string }],
    });
  });

  it("marks as sent what the server stored or has already", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    await sync(phone, (request) => ({ results: each(request, "duplicate") }));
    expect(await statesOf(phone)).toEqual([["bike", "sent"]]);
    expect((await readBike(phone, bikeId))?.record.unsent).toBe(0);
  });

  it("sends a bike's registration first, whatever was saved before it", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    const database = await phone.open();
    const [row] = await database.getAll("entries");
    await keep(phone, hours(3));
    await database.put("entries", { ...row!, unsentSince: "2026-12-31T00:00:00.000Z" });
    const [request] = await sync(phone);
    expect(request!.entries.map((entry) => (entry as Entry).kind)).toEqual(["bike", "hours"]);
  });

  it("sends at most 500 entries a call, and calls again for the rest and for more", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    const database = await phone.open();
    const [row] = await database.getAll("entries");
    for (let count = 0; count < 600; count += 1)
      await database.add("entries", { ...row!, entry: { ...row!.entry, id: makeId() } });
    const more: Answer = (request) => ({ ...storesAll(request), more: true });
    const sent = await sync(phone, more, more, storesAll);
    expect(sent.map(({ entries }) => entries.length)).toEqual([500, 101, 0]);
    expect(await readUnsent(phone)).toEqual([]);
  });

  it("keeps a refused entry in sight with its reason, and the others go through", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    await keep(phone, hours(3));
    const errors = { hours: "Too many." };
    await sync(phone, (request) => ({
      results: each(request, "stored").map((result) =>
        result.index === 1 ? { ...result, status: "refused", reason: "invalid", errors } : result,
      ),
    }));
    const bike = await readBike(phone, bikeId);
    expect(bike?.log).toMatchObject([
      { state: "refused", reason: "invalid", errors, entry: { kind: "hours" } },
      { state: "sent", entry: { kind: "bike" } },
    ]);
    expect(bike?.record).toMatchObject({ unsent: 1, summary: { hours: { now: null } } });
  });

  it.each(["not-writable", "unknown-kind"] as const)(
    "sends an entry refused as %s again next time, not before",
    async (reason) => {
      const phone = testPhone();
      await keep(phone, newBike);
      expect(await sync(phone, refuses(reason))).toHaveLength(1);
      expect(await statesOf(phone)).toEqual([["bike", "refused"]]);
      await sync(phone, storesAll);
      expect(await statesOf(phone)).toEqual([["bike", "sent"]]);
    },
  );

  it("never sends an entry refused as invalid again, and keeps its bike in sight", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    await sync(phone, refuses("invalid"));
    const [request] = await sync(phone);
    expect(request!.entries).toEqual([]);
    expect(await statesOf(phone)).toEqual([["bike", "refused"]]);
  });

  it("takes a bike that was erased elsewhere out of the Shed, and keeps what was refused", async () => {
    const phone = await settledPhone();
    await keep(phone, hours(4));
    await sync(phone, refuses("erased"));
    const [request] = await sync(phone);
    expect(request).toMatchObject({ known: {}, entries: [] });
    expect(await readBike(phone, bikeId)).toBeNull();
    expect(await readUnsent(phone)).toMatchObject([{ reason: "erased", entry: { hours: 4 } }]);
  });

  it("keeps the content of an entry whose id is taken, and takes the server's entry too", async () => {
    const phone = await settledPhone();
    const { entry } = await keep(phone, hours(4));
    const { author: _, ...mine } = entry;
    const theirs = stored({ ...mine, at: "2026-03-01T09:59:00.000Z", hours: 3.5 }, 3);
    await sync(phone, (request) => ({
      ...refuses("id-taken")(request),
      bikes: [{ bikeId, access: "owner", rev: 3, entries: [theirs] }],
    }));
    const bike = await readBike(phone, bikeId);
    const lines = bike!.log.map(({ entry, state }) => [(entry as Entry).hours, state]);
    expect(lines).toContainEqual([3.5, "sent"]);
    expect(lines).toContainEqual([4, "refused"]);
    expect(bike!.record.summary.hours.now).toBe(3.5);
  });

  it("sends what was saved while it was sending", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    const sent: number[] = [];
    await runSyncSession({
      phone,
      async send(request) {
        if (sent.length === 0) await keep(phone, hours(3));
        sent.push(request.entries.length);
        return {
          epoch: "one",
          results: each(request, "stored"),
          bikes: [],
          gone: [],
          more: false,
        };
      },
      isCurrent: () => true,
      onApplied: () => undefined,
    });
    expect(sent).toEqual([1, 1]);
    expect(await readUnsent(phone)).toEqual([]);
  });
});

describe("an answer that does not count", () => {
  const wrong: [string, Answer][] = [
    ["answers for fewer entries", () => ({ results: [] })],
    ["names another id", (request) => ({ results: each(request, "stored", { id: makeId() }) })],
    [
      "names one entry twice",
      (request) => ({ results: [each(request, "stored")[0]!, each(request, "stored")[0]!] }),
    ],
    [
      "answers for more than was sent",
      (request) => ({
        results: [...each(request, "stored"), { index: 2, id: makeId(), status: "stored" }],
      }),
    ],
  ];

  it.each(wrong)("changes nothing where it %s", async (_, answer) => {
    const phone = testPhone();
    await keep(phone, newBike);
    await keep(phone, hours(3));
    await expect(sync(phone, answer)).rejects.toBeInstanceOf(NoNetworkError);
    expect(await readUnsent(phone)).toHaveLength(2);
  });

  it("changes nothing once another account has signed in", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    await runSyncSession({
      phone,
      send: (request) =>
        Promise.resolve({
          epoch: "one",
          results: each(request, "stored"),
          bikes: [],
          gone: [],
          more: false,
        }),
      isCurrent: () => false,
      onApplied: () => undefined,
    });
    expect(await readUnsent(phone)).toHaveLength(1);
  });

  it("keeps everything where the server has a problem", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    const unauthorised = () => {
      throw new ApiError({ type: "about:blank", title: "", status: 401, detail: "" });
    };
    await expect(sync(phone, unauthorised)).rejects.toMatchObject({ status: 401 });
    expect(await readUnsent(phone)).toHaveLength(1);
  });
});

describe("a push that is too large", () => {
  const takesAtMost =
    (most: number): Answer =>
    (request) => {
      if (request.entries.length > most)
        throw new NoNetworkError({ status: 413, retryAfterMs: null });
      return storesAll(request);
    };

  it("is halved until it is taken", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    for (let reading = 1; reading < 5; reading += 1) await keep(phone, hours(reading));
    const sent = await sync(phone, ...Array.from({ length: 9 }, () => takesAtMost(2)));
    expect(sent.map(({ entries }) => entries.length)).toEqual([5, 3, 2, 2, 1]);
    expect(await readUnsent(phone)).toEqual([]);
  });

  it("does not keep the others back where one entry is too large by itself", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    const { entry: large } = await keep(phone, hours(1));
    await keep(phone, hours(2));
    const picky: Answer = (request) => {
      if (request.entries.some((entry) => (entry as Entry).id === large.id))
        throw new NoNetworkError({ status: 413, retryAfterMs: null });
      return storesAll(request);
    };
    await sync(phone, ...Array.from({ length: 9 }, () => picky));
    expect((await readUnsent(phone)).map(({ entry }) => entry.id)).toEqual([large.id]);
  });
});

describe("fetching", () => {
  const registration = { ...newBike, bikeId: otherBikeId, id: makeId(), v: 1 };
  const bikeOf = (rev: number, ...entries: object[]): Answer => {
    return (request) => ({
      ...storesAll(request),
      bikes: [
        {
          bikeId: otherBikeId,
          access: "owner",
          rev,
          entries: entries.map((entry) => stored(entry, rev)),
        },
      ],
    });
  };

  it("shows the bikes of another phone, with their summary", async () => {
    const phone = testPhone();
    await sync(phone, bikeOf(7, registration));
    const bike = await readBike(phone, otherBikeId);
    expect(bike?.record).toMatchObject({ details: { name: "Blue" }, unsent: 0 });
    const [request] = await sync(phone);
    expect(request!.known).toEqual({ [otherBikeId]: 7 });
  });

  it("keeps an entry of a later version out of the summary, and in the log", async () => {
    const phone = testPhone();
    const later = { ...registration, id: makeId(), v: 2, kind: "weather", body: { rain: true } };
    await sync(phone, bikeOf(7, registration, later));
    const bike = await readBike(phone, otherBikeId);
    expect(bike?.log.find(({ understood }) => !understood)?.entry).toMatchObject({
      kind: "weather",
      body: { rain: true },
    });
    expect(bike?.record.details.name).toBe("Blue");
  });

  it("finds the syringes of its own checks", async () => {
    const phone = testPhone();
    const syringe = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };
    const body = { syringe, runs: [{ startMl: 0, endMl: 3 }], closedOut: true };
    const check = { ...registration, id: makeId(), kind: "check", hours: 3, body };
    await sync(phone, bikeOf(7, registration, check));
    expect(await (await phone.open()).getAll("syringes")).toMatchObject([{ syringe }]);
  });

  it("judges a shared bike's strikes by its own owner", async () => {
    const phone = testPhone();
    const theOwner = { id: "someone-else", name: "Bo" };
    const reading = { ...hours(50), bikeId: otherBikeId, id: makeId(), v: 1 };
    await sync(phone, () => ({
      bikes: [
        {
          bikeId: otherBikeId,
          access: "mechanic",
          rev: 2,
          entries: [stored(registration, 1, theOwner), stored(reading, 2, theOwner)],
        },
      ],
    }));
    const strike: NewEntry = {
      bikeId: otherBikeId,
      kind: "strike",
      at,
      hours: null,
      body: { entryId: reading.id, reason: "Not mine to strike." },
    };
    await keep(phone, strike);
    const bike = await readBike(phone, otherBikeId);
    expect(bike?.record.summary.hours.now).toBe(50);
  });
});

describe("bikes that are gone", () => {
  const gone: Answer = (request) => ({ ...storesAll(request), gone: [bikeId] });

  it("leave the phone", async () => {
    const phone = await settledPhone();
    await sync(phone, gone);
    expect(await readBike(phone, bikeId)).toBeNull();
    expect(await (await phone.open()).count("entries")).toBe(0);
  });

  it("leave what was not sent, refused as it may be", async () => {
    const phone = await settledPhone();
    await keep(phone, hours(4));
    await sync(phone, (request) => ({ ...refuses("not-writable")(request), gone: [bikeId] }));
    expect(await readBike(phone, bikeId)).toBeNull();
    expect(await readUnsent(phone)).toMatchObject([
      { state: "refused", reason: "not-writable", entry: { hours: 4 } },
    ]);
  });

  it("stay where the phone never asked about them", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    await sync(phone, gone);
    expect(await statesOf(phone)).toEqual([["bike", "sent"]]);
  });

  it("stay while an entry about them waits for its answer", async () => {
    const phone = await settledPhone();
    await runSyncSession({
      phone,
      async send({ entries }) {
        if (entries.length > 0) throw new NoNetworkError();
        await keep(phone, hours(4));
        return { epoch: "one", results: [], bikes: [], gone: [bikeId], more: false };
      },
      isCurrent: () => true,
      onApplied: () => undefined,
    }).catch(() => undefined);
    expect((await readBike(phone, bikeId))?.log).toHaveLength(3);
  });
});

describe("a server that was restored", () => {
  const restored: Answer = (request) => ({ ...storesAll(request), epoch: "two", gone: [bikeId] });

  it("gets again what this account wrote, and is asked for everything from the beginning", async () => {
    const phone = await settledPhone();
    const sent = await sync(phone, restored, restored);
    expect(sent.map(({ epoch, known }) => [epoch, known])).toEqual([
      ["one", { [bikeId]: 2 }],
      ["two", {}],
    ]);
    expect(sent[1]!.entries.map((entry) => (entry as Entry).kind)).toEqual(["bike", "hours"]);
    expect(await statesOf(phone)).toEqual([
      ["hours", "sent"],
      ["bike", "sent"],
    ]);
  });

  it("is believed about what is gone only after it has answered for that", async () => {
    const phone = await settledPhone();
    await expect(
      sync(phone, restored, () => {
        throw new NoNetworkError();
      }),
    ).rejects.toBeInstanceOf(NoNetworkError);
    expect(await statesOf(phone)).toEqual([
      ["hours", "saved"],
      ["bike", "saved"],
    ]);
  });

  it("is not believed where its answer was on its way while another sync went on", async () => {
    const phone = await settledPhone();
    let interrupt = true;
    const session = {
      phone,
      async send(request: SyncRequest): Promise<SyncResponse> {
        if (interrupt) {
          interrupt = false;
          await runSyncSession(session);
          return { epoch: "two", results: [], bikes: [], gone: [bikeId], more: false };
        }
        const results = each(request, "stored");
        return { epoch: "two", results, bikes: [], gone: [], more: false };
      },
      isCurrent: () => true,
      onApplied: () => undefined,
    };
    await runSyncSession(session);
    expect((await readBike(phone, bikeId))?.log).toHaveLength(2);
  });

  it("is not sent what others wrote", async () => {
    const phone = await settledPhone();
    const theirs = stored({ ...hours(8), id: makeId(), v: 1 }, 3, { id: "mechanic", name: "Bo" });
    await sync(phone, (request) => ({
      ...storesAll(request),
      bikes: [{ bikeId, access: "owner", rev: 3, entries: [theirs] }],
    }));
    const [, again] = await sync(phone, restored, restored);
    expect(again!.entries.map((entry) => (entry as Entry).id)).not.toContain(theirs.id);
    expect((await readBike(phone, bikeId))?.log).toHaveLength(3);
  });
});
