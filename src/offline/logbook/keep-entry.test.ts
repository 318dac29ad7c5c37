// @vitest-environment node
import { describe, expect, it } from "vitest";
import { rider, testPhone } from "../../../tests/helpers/phones/test-phone.ts";
import { InvalidEntryError, NotSavedError, StoreUnavailableError } from "../errors.ts";
import type { NewEntry } from "../types.ts";
import { openDatabase } from "./database.ts";
import { keepEntry } from "./keep-entry.ts";
import { previewSummary } from "./preview-summary.ts";
import { readBike } from "./read-bike.ts";
import { rebuildBikes } from "./rebuild-bikes.ts";

const bikeId = "0193a000-0000-7000-8000-000000000001";
const at = "2026-03-01T09:00:00.000Z";
const syringe = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };
const newBike: NewEntry = { bikeId, kind: "bike", at, hours: null, body: { name: "Blue" } };
const hours = (reading: number): NewEntry => ({
  bikeId,
  kind: "hours",
  at,
  hours: reading,
  body: {},
});
const check: NewEntry = {
  bikeId,
  kind: "check",
  at,
  hours: 12,
  body: { syringe, runs: [{ startMl: 0, endMl: 3 }], closedOut: true },
};

const patient = () => ({ signal: new AbortController().signal });
const keep = (phone: ReturnType<typeof testPhone>, entry: NewEntry) =>
  keepEntry(phone, entry, patient());

describe("keeping an entry", () => {
  it("stores it with an id of version 7 and marks it saved", async () => {
    const phone = testPhone();
    const kept = await keep(phone, newBike);
    expect(kept).toMatchObject({
      state: "saved",
      understood: true,
      mine: true,
      savedAt: phone.clock.now.toISOString(),
      entry: { ...newBike, v: 1, author: { id: rider.id, name: rider.name } },
    });
    expect(kept.entry.id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7/);
  });

  it("is judged at the next start where the app was closed right after saving", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    // Two openings write the entry and read it back; the third would judge it.
    let openings = 0;
    const open = () => ((openings += 1) > 2 ? Promise.reject(new Error("closed")) : phone.open());
    await keep({ ...phone, open }, hours(12));
    const before = await readBike(phone, bikeId);
    expect(before?.record).toMatchObject({ unsent: 2, summary: { hours: { now: null } } });
    expect(await rebuildBikes(phone)).toBe(true);
    expect(await rebuildBikes(phone)).toBe(false);
    const after = await readBike(phone, bikeId);
    expect(after?.record).toMatchObject({ unsent: 2, summary: { hours: { now: 12 } } });
  });

  it("makes the bike's record anew", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    await keep(phone, check);
    const bike = await readBike(phone, bikeId);
    expect(bike?.record).toMatchObject({
      access: "owner",
      details: { name: "Blue" },
      summary: { name: "Blue", verdict: "settling", hours: { now: 12 } },
      unsent: 2,
    });
    expect(bike?.log.map((line) => line.entry.kind)).toEqual(["check", "bike"]);
  });

  it("remembers the syringe of a check, the latest word on it", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    await keep(phone, check);
    const renamed = { ...syringe, label: "Old 5 mL" };
    const earlier = "2026-02-01T09:00:00.000Z";
    await keep(phone, { ...check, at: earlier, body: { ...check.body, syringe: renamed } });
    expect(await (await phone.open()).getAll("syringes")).toEqual([
      { id: "five", syringe, changedAt: at, retired: false },
    ]);
  });

  it("drops the draft it was made from", async () => {
    const phone = testPhone();
    const database = await phone.open();
    const draft = { bikeId: "new", form: "bike" };
    await database.put("drafts", { ...draft, content: {}, savedAt: at });
    await keepEntry(phone, newBike, { ...patient(), draft });
    expect(await database.getAll("drafts")).toEqual([]);
  });

  it("says by field what is wrong, and stores nothing", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    const wrong = { ...check, body: { ...check.body, runs: [{ startMl: 3, endMl: 2 }] } };
    const error = await keep(phone, wrong as NewEntry).catch((thrown: unknown) => thrown);
    expect(error).toBeInstanceOf(InvalidEntryError);
    expect((error as InvalidEntryError).errors).toEqual({
      "body.runs.0.endMl": "The end level is below the start level.",
    });
    expect(await (await phone.open()).count("entries")).toBe(1);
  });

  it("wants a bike registered, with a name, before anything else", async () => {
    const phone = testPhone();
    await expect(keep(phone, hours(3))).rejects.toMatchObject({
      errors: { bikeId: expect.any(String) as string },
    });
    await expect(keep(phone, { ...newBike, body: {} })).rejects.toMatchObject({
      errors: { "body.name": expect.any(String) as string },
    });
    expect(await (await phone.open()).count("entries")).toBe(0);
  });
});

describe("an entry that could not be saved in time", () => {
  const impatient = () => ({ signal: AbortSignal.abort() });

  it("is not there, and the form is told so", async () => {
    const phone = testPhone();
    await expect(keepEntry(phone, newBike, impatient())).rejects.toBeInstanceOf(NotSavedError);
    expect(await (await phone.open()).count("entries")).toBe(0);
  });

  it("is given up where the store hangs", async () => {
    const phone = { ...testPhone(), open: () => new Promise<never>(() => undefined) };
    const giveUp = new AbortController();
    const keeping = keepEntry(phone, newBike, { signal: giveUp.signal });
    giveUp.abort();
    await expect(keeping).rejects.toBeInstanceOf(NotSavedError);
  });

  it("does not become two when the unseen write completed after all", async () => {
    const phone = testPhone();
    const database = await phone.open();
    await keep(phone, newBike);
    // The write completes; then the connection is lost before it can be read back.
    let calls = 0;
    const open = () =>
      (calls += 1) === 1 ? Promise.resolve(database) : Promise.reject(new Error("lost"));
    await expect(keep({ ...phone, open }, hours(7))).rejects.toBeInstanceOf(NotSavedError);
    expect(await database.count("entries")).toBe(2);
    const kept = await keep(phone, { ...hours(7), at: "2026-03-01T09:00:05.000Z" });
    expect(await database.count("entries")).toBe(2);
    expect(kept.entry.at).toBe(at);
    await keep(phone, hours(7));
    expect(await database.count("entries")).toBe(3);
  });
});

describe("the store of another app version", () => {
  it("closes when a newer version asks for it, and says so afterwards", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    const { openDB } = await import("idb");
    const newer = await openDB(phone.databaseName, 99);
    expect(await newer.count("entries")).toBe(1);
    await expect(keep(phone, hours(3))).rejects.toMatchObject({
      name: "StoreUnavailableError",
      code: "store-newer",
    });
    newer.close();
  });

  it("opens again after the connection was closed", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    const hooks = { blocking: () => undefined, terminated: () => undefined };
    const other = await openDatabase(phone.databaseName, hooks);
    expect(await other.count("entries")).toBe(1);
    other.close();
    await keep(phone, hours(3));
  });

  it("is an error with a sentence where the browser gives no storage", async () => {
    const open = () => Promise.reject(new StoreUnavailableError("store-unavailable"));
    await expect(keep({ ...testPhone(), open }, newBike)).rejects.toMatchObject({
      code: "store-unavailable",
      message: expect.stringContaining("private window") as string,
    });
  });
});

describe("previewing an entry", () => {
  it("answers the summary with it, and saves nothing", async () => {
    const phone = testPhone();
    await keep(phone, newBike);
    await keep(phone, check);
    const lower = {
      ...check,
      at: "2026-04-01T09:00:00.000Z",
      hours: 32,
      body: { ...check.body, runs: [{ startMl: 0, endMl: 2.5 }] },
    };
    const preview = await previewSummary(phone, bikeId, lower);
    expect(preview).toMatchObject({ verdict: "low", action: "stop", hours: { now: 32 } });
    expect(await (await phone.open()).count("entries")).toBe(2);
    await keep(phone, lower);
    const bike = await readBike(phone, bikeId);
    const entryIds = ({ checks }: typeof preview) => checks.map(({ entryId }) => entryId);
    expect(entryIds(bike!.record.summary)).toHaveLength(entryIds(preview).length);
    expect(bike!.record.summary.pLow).toBe(preview.pLow);
  });

  it("serves a bike that is only being registered", async () => {
    expect(await previewSummary(testPhone(), bikeId, newBike)).toMatchObject({
      name: "Blue",
      verdict: "none",
    });
  });

  it("says by field what is wrong", async () => {
    await expect(
      previewSummary(testPhone(), bikeId, { ...newBike, at: "soon" }),
    ).rejects.toBeInstanceOf(InvalidEntryError);
  });
});
