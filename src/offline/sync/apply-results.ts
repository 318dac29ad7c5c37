import { v7 as makeId } from "uuid";
import type { SyncResult } from "../../../shared/schemas/sync.ts";
import type { EntryRow } from "../logbook/database.ts";
import type { Applying } from "./applying.ts";
import { dropBike } from "./drop-bike.ts";

/**
 * The server has another entry under this id. Ours keeps its content under a new id, refused, so
 * that the rider can save it once more, and leaves its place to the server's.
 */
export async function setAside({ change }: Applying, row: EntryRow): Promise<void> {
  const entries = change.objectStore("entries");
  await entries.delete(row.entry.id);
  await entries.add({
    ...row,
    entry: { ...row.entry, id: makeId() },
    refusal: { reason: "id-taken" },
  });
}

async function applyResult(applying: Applying, result: SyncResult): Promise<void> {
  const entries = applying.change.objectStore("entries");
  const row = result.id === null ? undefined : await entries.get(result.id);
  if (row?.unsentSince === undefined) return;
  applying.touched.add(row.entry.bikeId);
  const { unsentSince: _unsentSince, refusal: _refusal, ...sent } = row;
  if (result.status !== "refused") {
    await entries.put(sent);
  } else if (result.reason === "id-taken") {
    await setAside(applying, row);
  } else {
    const { reason = "invalid", errors } = result;
    await entries.put({ ...row, refusal: { reason, ...(errors && { errors }) } });
    // Entries are erased with their whole bike only: it was deleted on another phone.
    if (reason === "erased") await dropBike(applying, row.entry.bikeId);
  }
}

/** Marks each entry of a round as the server answered for it. */
export async function applyResults(applying: Applying, results: SyncResult[]): Promise<void> {
  for (const result of results) await applyResult(applying, result);
}
