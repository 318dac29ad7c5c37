// @vitest-environment node
import { describe, expect, it } from "vitest";
import type { RefusalReason } from "../../../shared/schemas/sync.ts";
import { testPhone } from "../../../tests/helpers/phones/test-phone.ts";
import type { NewEntry } from "../types.ts";
import { keepEntry } from "./keep-entry.ts";
import type { Phone } from "./phone.ts";
import { readBike, readUnsent } from "./read-bike.ts";

const bikeId = "0193a000-0000-7000-8000-000000000001";
const about = { bikeId, at: "2026-03-01T09:00:00.000Z", hours: null };
const details = (body: { name?: string; year?: number }): NewEntry => ({
  ...{ ...about, kind: "bike" },
  body,
});
const note = (text: string): NewEntry => ({ ...about, kind: "note", body: { text } });
const strike = (entryId: string): NewEntry => ({
  ...{ ...about, kind: "strike" },
  body: { entryId, reason: "Not accepted by the server, and written anew." },
});

async function keep(phone: ReturnType<typeof testPhone>, entry: NewEntry): Promise<string> {
  phone.clock.now = new Date(phone.clock.now.getTime() + 1_000);
  const { signal } = new AbortController();
  return (await keepEntry(phone, entry, { signal })).entry.id;
}

async function refuse(phone: Phone, id: string, reason: RefusalReason): Promise<void> {
  const database = await phone.open();
  await database.put("entries", { ...(await database.get("entries", id))!, refusal: { reason } });
}

async function phoneWithBike() {
  const phone = testPhone();
  await keep(phone, details({ name: "Moss" }));
  return phone;
}

const waiting = async (phone: Phone) => (await readUnsent(phone)).map(({ entry }) => entry.id);
const countOf = async (phone: Phone) => (await readBike(phone, bikeId))?.record.unsent;

describe("an entry refused for good", () => {
  it("waits for its rider, whatever else is written", async () => {
    const phone = await phoneWithBike();
    const refused = await keep(phone, note("Chain oild"));
    await refuse(phone, refused, "invalid");
    await keep(phone, note("Chain oiled"));
    expect(await waiting(phone)).toContain(refused);
    expect(await countOf(phone)).toBe(3);
  });

  it.each(["before", "after"] as const)(
    "waits no more once it is struck, be it %s it was refused, and stays in the log",
    async (when) => {
      const phone = await phoneWithBike();
      const refused = await keep(phone, note("Chain oild"));
      if (when === "after") await refuse(phone, refused, "invalid");
      const struck = await keep(phone, strike(refused));
      if (when === "before") await refuse(phone, refused, "invalid");
      const anew = await keep(phone, note("Chain oiled"));
      expect(await waiting(phone)).toEqual([expect.any(String), struck, anew]);
      expect(await countOf(phone)).toBe(3);
      const kept = (await readBike(phone, bikeId))!.log.find(({ entry }) => entry.id === refused);
      expect(kept).toMatchObject({ state: "refused", reason: "invalid" });
    },
  );

  it("waits on where the strike was refused for good as well", async () => {
    const phone = await phoneWithBike();
    const refused = await keep(phone, note("Chain oild"));
    await refuse(phone, refused, "invalid");
    await refuse(phone, await keep(phone, strike(refused)), "invalid");
    expect(await waiting(phone)).toContain(refused);
  });

  it("waits no more, where it is a bike's details, once all of them are given anew", async () => {
    const phone = await phoneWithBike();
    const refused = await keep(phone, details({ name: "Moss II", year: 2024 }));
    await refuse(phone, refused, "invalid");
    await keep(phone, details({ name: "Moss Two" }));
    expect(await waiting(phone)).toContain(refused);
    await keep(phone, details({ name: "Moss Two", year: 2023 }));
    expect(await waiting(phone)).not.toContain(refused);
  });
});

it("an entry whose refusal may pass waits, though it is struck", async () => {
  const phone = await phoneWithBike();
  const refused = await keep(phone, note("Chain oild"));
  await refuse(phone, refused, "not-writable");
  await keep(phone, strike(refused));
  expect(await waiting(phone)).toContain(refused);
});
