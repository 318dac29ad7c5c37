import { byEffectiveOrder } from "../../../shared/logbook/effective-order.ts";
import type { LogEntry } from "../../../shared/schemas/entry.ts";
import type { BikeWithLog, KeptEntry } from "../types.ts";
import { asKeptEntry } from "./kept-entry.ts";
import type { Phone } from "./phone.ts";
import { readWaiting } from "./refusals.ts";

/** Only `at`, `receivedAt` and `id` are read, which every entry has, of whatever kind. */
const newestFirst = (a: KeptEntry, b: KeptEntry) =>
  byEffectiveOrder(b.entry as LogEntry, a.entry as LogEntry);

export async function readBike(phone: Phone, bikeId: string): Promise<BikeWithLog | null> {
  const database = await phone.open();
  const [record, rows] = await Promise.all([
    database.get("bikes", bikeId),
    database.getAllFromIndex("entries", "bike", bikeId),
  ]);
  if (!record || record.awaited) return null;
  return { record, log: rows.map((row) => asKeptEntry(row, phone.account)).sort(newestFirst) };
}

export async function readUnsent(phone: Phone): Promise<KeptEntry[]> {
  const rows = await readWaiting(await phone.open());
  return rows.map((row) => asKeptEntry(row, phone.account));
}
