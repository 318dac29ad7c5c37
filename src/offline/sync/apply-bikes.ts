import { hashKey } from "@tanstack/react-query";
import type { StoredEntry } from "../../../shared/schemas/entry.ts";
import type { SyncResponse } from "../../../shared/schemas/sync.ts";
import { withoutReceipt } from "../logbook/kept-entry.ts";
import { rememberSyringe } from "../logbook/remember-syringe.ts";
import type { EntryRow } from "../logbook/database.ts";
import { setAside } from "./apply-results.ts";
import type { Applying } from "./applying.ts";
import { dropBike } from "./drop-bike.ts";

type PulledBike = SyncResponse["bikes"][number];

const sameContent = (a: EntryRow["entry"], b: EntryRow["entry"]) =>
  hashKey([withoutReceipt(a)]) === hashKey([withoutReceipt(b)]);

/**
 * Puts the server's copy in place. One still unsent here keeps its mark until the server has
 * answered for it; one with other content under the same id is set aside, never overwritten.
 */
async function keepPulledEntry(applying: Applying, entry: StoredEntry): Promise<void> {
  const entries = applying.change.objectStore("entries");
  let row = await entries.get(entry.id);
  if (row?.unsentSince !== undefined && !sameContent(row.entry, entry)) {
    await setAside(applying, row);
    row = undefined;
  }
  const pulled = { savedAt: applying.phone.now().toISOString(), ...row, entry };
  await entries.put(pulled);
  await rememberSyringe(applying.change, pulled, applying.phone.account);
}

async function keepPulledBike(applying: Applying, bike: PulledBike): Promise<void> {
  const { bikeId, access } = bike;
  for (const entry of bike.entries)
    if (entry.bikeId === bikeId) await keepPulledEntry(applying, entry);
  const rev = Math.max(bike.rev, applying.bikes.get(bikeId)?.rev ?? 0);
  applying.bikes.set(bikeId, { bikeId, access, rev });
  applying.touched.add(bikeId);
}

export async function keepPulled(applying: Applying, bikes: PulledBike[]): Promise<void> {
  for (const bike of bikes) await keepPulledBike(applying, bike);
}

async function isWaiting({ change }: Applying, bikeId: string): Promise<boolean> {
  const rows = await change.objectStore("entries").index("bike").getAll(bikeId);
  return rows.some((row) => row.unsentSince !== undefined && !row.refusal);
}

/**
 * Heeds the server's list of bikes no longer visible: only those the phone asked about and has
 * heard nothing of since, and only once the server has answered for all that this phone has
 * written about them.
 */
export async function dropGone(
  applying: Applying,
  gone: string[],
  known: Record<string, number>,
): Promise<void> {
  for (const bikeId of gone) {
    const bike = applying.bikes.get(bikeId);
    const isLatestWord = bike !== undefined && bike.rev === known[bikeId];
    if (isLatestWord && !(await isWaiting(applying, bikeId))) await dropBike(applying, bikeId);
  }
}
