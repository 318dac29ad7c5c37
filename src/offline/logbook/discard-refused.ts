import { changeLogbook } from "./change-logbook.ts";
import type { Phone } from "./phone.ts";
import { isPassing } from "./refusals.ts";
import { refreshBike } from "./refresh-bike.ts";

/**
 * Takes an entry off this phone that the server refused for good, or whose bike is no longer here.
 * Any other stays: the server may have taken it while its writer was being asked.
 */
export function discardRefused(phone: Phone, entryId: string): Promise<void> {
  return changeLogbook(phone, async (change) => {
    const [entries, bikes] = [change.objectStore("entries"), change.objectStore("bikes")];
    const row = await entries.get(entryId);
    if (!row?.refusal) return;
    const { bikeId } = row.entry;
    const bike = await bikes.get(bikeId);
    if (bike && isPassing(row.refusal.reason)) return;
    await entries.delete(entryId);
    if (!bike) return;
    const left = await entries.index("bike").getAll(bikeId);
    // Without its registration the server knows no such bike either.
    if (left.some(({ entry }) => entry.kind === "bike"))
      await refreshBike(change, bike, phone.account);
    else await bikes.delete(bikeId);
  });
}
