import type { Account } from "../types.ts";
import { makeBikeRow, type BikeStanding } from "./bike-row.ts";
import type { LogbookChange } from "./database.ts";

/** Makes a bike's record anew from its log, within the transaction that changed the log. */
export async function refreshBike(
  change: LogbookChange,
  standing: BikeStanding,
  account: Account,
): Promise<void> {
  const rows = await change.objectStore("entries").index("bike").getAll(standing.bikeId);
  await change.objectStore("bikes").put(makeBikeRow(standing, rows, account));
}
