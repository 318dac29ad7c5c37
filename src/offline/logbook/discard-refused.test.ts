// @vitest-environment node
import { expect, it } from "vitest";
import type { RefusalReason } from "../../../shared/schemas/sync.ts";
import { testPhone } from "../../../tests/helpers/phones/test-phone.ts";
import type { NewEntry } from "../types.ts";
import { discardRefused } from "./discard-refused.ts";
import { keepEntry } from "./keep-entry.ts";
import type { Phone } from "./phone.ts";
import { readBike, readUnsent } from "./read-bike.ts";

const bikeId = "0193a000-0000-7000-8000-000000000001";
const about = { bikeId, at: "2026-03-01T09:00:00.000Z", hours: null };
const newBike: NewEntry = { ...about, kind: "bike", body: { name: "Moss" } };
const note: NewEntry = { ...about, kind: "note", body: { text: "Chain oiled" } };

const keep = async (phone: Phone, entry: NewEntry) =>
  (await keepEntry(phone, entry, { signal: new AbortController().signal })).entry.id;

async function refuse(phone: Phone, id: string, reason: RefusalReason): Promise<void> {
  const database = await phone.open();
  await database.put("entries", { ...(await database.get("entries", id))!, refusal: { reason } });
}

async function phoneWithNote(reason?: RefusalReason) {
  const phone = testPhone();
  const registration = await keep(phone, newBike);
  const noted = await keep(phone, note);
  if (reason) await refuse(phone, noted, reason);
  return { phone, registration, noted };
}

const waiting = async (phone: Phone) => (await readUnsent(phone)).map(({ entry }) => entry.id);

it.each(["not-writable", "erased"] as const)(
  "an entry refused as %s can be discarded once its bike is gone from the phone",
  async (reason) => {
    const { phone, registration, noted } = await phoneWithNote(reason);
    await (await phone.open()).delete("bikes", bikeId);
    await discardRefused(phone, noted);
    expect(await waiting(phone)).toEqual([registration]);
    expect(await readBike(phone, bikeId)).toBeNull();
  },
);

it("one refused for good can be discarded, and its bike is judged without it", async () => {
  const { phone, registration, noted } = await phoneWithNote("invalid");
  await discardRefused(phone, noted);
  expect(await waiting(phone)).toEqual([registration]);
  expect((await readBike(phone, bikeId))?.record.unsent).toBe(1);
});

it.each([undefined, "not-writable", "unknown-kind"] as const)(
  "one that the server may yet have stays (refused: %s)",
  async (reason) => {
    const { phone, noted } = await phoneWithNote(reason);
    await discardRefused(phone, noted);
    expect(await waiting(phone)).toContain(noted);
  },
);

it("what was not refused stays, though its bike is gone", async () => {
  const { phone, registration, noted } = await phoneWithNote();
  await (await phone.open()).delete("bikes", bikeId);
  await discardRefused(phone, noted);
  expect(await waiting(phone)).toEqual([registration, noted]);
});

it("a bike leaves the phone with its one registration, and nothing else does", async () => {
  const { phone, registration, noted } = await phoneWithNote("not-writable");
  await refuse(phone, registration, "invalid");
  await discardRefused(phone, registration);
  expect(await readBike(phone, bikeId)).toBeNull();
  expect(await waiting(phone)).toEqual([noted]);
});
