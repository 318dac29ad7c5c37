import { lineUpFacts } from "../../shared/logbook/line-up-facts.ts";
import { standingAdvice, type AdviceNote } from "../../shared/logbook/standing-advice.ts";
import { standingEntries } from "../../shared/logbook/standing-entries.ts";
import { summariseLogbook } from "../../shared/logbook/summarise-logbook.ts";
import { lineUpOrder, type LineUpFacts } from "../../shared/schemas/club.ts";
import type { LogEntry } from "../../shared/schemas/entry.ts";
import type { Summary } from "../../shared/schemas/summary.ts";
import type { Store } from "../db/store.ts";

export interface SummarisedBike {
  summary: Summary;
  lineUp: LineUpFacts;
  /** The advice that stands. */
  advice: AdviceNote | null;
}

/**
 * Makes a bike's summary anew from its entries, and moves the bike on the Line-ups that show it.
 * To be called in the transaction that adds the entries.
 */
export function summariseBike(store: Store, bikeId: string): SummarisedBike | null {
  const ownerId = store.bikes.ownerOf(bikeId);
  if (ownerId === undefined) return null;
  // Parsed when they were stored; a kind or version of a newer server is left out by the logbook.
  const entries = store.entries.ofBike(bikeId) as unknown as LogEntry[];
  const summary = summariseLogbook({ ownerId, entries });
  const lineUp = lineUpFacts({ ownerId, entries }, summary);
  const place = { rank: lineUpOrder.indexOf(lineUp.place), dueInHours: lineUp.dueInHours };
  const moves = store.lineUpFacts.find(bikeId)?.json !== JSON.stringify(lineUp);
  store.bikeSummaries.put({
    bikeId,
    name: summary.name,
    retired: lineUp.place === "retired",
    verdict: summary.verdict,
    action: summary.action,
    pLow: summary.pLow,
    hoursNow: summary.hours.now,
    dueInHours: summary.due.inHours,
    lastCheckAt: lineUp.lastCheckAt,
    summary,
  });
  if (moves) {
    store.lineUpFacts.put({ bikeId, ...place, dueOn: lineUp.onDate, facts: lineUp });
    store.bikeShares.place(bikeId, place);
    store.clubs.touchAllOf(bikeId);
  }
  return { summary, lineUp, advice: standingAdvice(standingEntries(ownerId, entries).standing) };
}

/** A bike a transaction, so that a server at work is not held up. */
function summariseEach(store: Store, bikeIds: string[]): number {
  for (const bikeId of bikeIds) store.write(() => summariseBike(store, bikeId));
  return bikeIds.length;
}

/** Makes all summaries anew. */
export const rebuildSummaries = (store: Store) => summariseEach(store, store.bikes.allIds());

/** Makes anew those that an older server made, which knew of no Line-up. */
export const completeSummaries = (store: Store) =>
  summariseEach(store, store.lineUpFacts.missing());
