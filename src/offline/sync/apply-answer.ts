import type { SyncResponse } from "../../../shared/schemas/sync.ts";
import { changeLogbook } from "../logbook/change-logbook.ts";
import { isMine, withoutReceipt } from "../logbook/kept-entry.ts";
import type { Phone } from "../logbook/phone.ts";
import { refreshBike } from "../logbook/refresh-bike.ts";
import { dropGone, keepPulled } from "./apply-bikes.ts";
import { applyResults } from "./apply-results.ts";
import type { Applying } from "./applying.ts";
import type { Round } from "./prepare-round.ts";

/**
 * The server was restored from a backup: it may lack what it had. Every entry this account wrote
 * is to be sent again, and every bike asked for from its beginning.
 */
async function startOver({ change, phone, bikes, touched }: Applying): Promise<void> {
  const entries = change.objectStore("entries");
  for (const row of await entries.getAll()) {
    if (!isMine(row, phone.account)) continue;
    const entry = withoutReceipt(row.entry);
    await entries.put({ unsentSince: row.savedAt, ...row, entry });
  }
  for (const [bikeId, bike] of bikes) {
    bikes.set(bikeId, { ...bike, rev: 0 });
    touched.add(bikeId);
  }
}

async function beginApplying(change: Applying["change"], phone: Phone): Promise<Applying> {
  const rows = await change.objectStore("bikes").getAll();
  const bikes = new Map(
    rows.map(({ bikeId, access, rev }) => [bikeId, { bikeId, access, rev }] as const),
  );
  return { change, phone, bikes, touched: new Set() };
}

/**
 * Applies an answer, all or nothing. False where only its results count and the phone has to ask
 * again: the server turned out to have been restored since the phone last spoke to it, or while
 * this answer was on its way.
 */
export function applyAnswer(phone: Phone, round: Round, answer: SyncResponse): Promise<boolean> {
  return changeLogbook(phone, async (change) => {
    const applying = await beginApplying(change, phone);
    const last = await change.objectStore("meta").get("sync");
    const restored = last !== undefined && last.epoch !== answer.epoch;
    if (restored) await startOver(applying);
    await applyResults(applying, answer.results);
    const counts = !restored && round.epoch === last?.epoch;
    if (counts) {
      await keepPulled(applying, answer.bikes);
      await dropGone(applying, answer.gone, round.known);
    }
    for (const bikeId of applying.touched) {
      const bike = applying.bikes.get(bikeId);
      if (bike) await refreshBike(change, bike, phone.account);
    }
    const lastSyncAt = phone.now().toISOString();
    await change.objectStore("meta").put({ id: "sync", epoch: answer.epoch, lastSyncAt });
    return counts;
  });
}
