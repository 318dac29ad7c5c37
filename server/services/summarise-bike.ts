import { bikeDetails } from "../../shared/logbook/bike-details.ts";
import { standingEntries } from "../../shared/logbook/standing-entries.ts";
import { summariseLogbook } from "../../shared/logbook/summarise-logbook.ts";
import type { LogEntry } from "../../shared/schemas/entry.ts";
import type { Store } from "../db/store.ts";

/** Makes a bike's summary anew from its entries. To be called in the transaction that adds them. */
export function summariseBike(store: Store, bikeId: string): void {
  const ownerId = store.bikes.ownerOf(bikeId);
  if (ownerId === undefined) return;
  // Parsed when they were stored; a kind or version of a newer server is left out by the logbook.
  const entries = store.entries.ofBike(bikeId) as unknown as LogEntry[];
  const summary = summariseLogbook({ ownerId, entries });
  store.bikeSummaries.put({
    bikeId,
    name: summary.name,
    retired: bikeDetails(standingEntries(ownerId, entries).standing).retired,
    verdict: summary.verdict,
    action: summary.action,
    pLow: summary.pLow,
    hoursNow: summary.hours.now,
    dueInHours: summary.due.inHours,
    lastCheckAt: summary.checks.at(-1)?.at ?? null,
    summary,
  });
}

/** Makes all summaries anew, a bike a transaction, so that a server at work is not held up. */
export function rebuildSummaries(store: Store): number {
  const bikeIds = store.bikes.allIds();
  for (const bikeId of bikeIds) store.write(() => summariseBike(store, bikeId));
  return bikeIds.length;
}
