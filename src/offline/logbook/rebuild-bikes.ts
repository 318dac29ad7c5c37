import { BUILD } from "./bike-row.ts";
import { changeLogbook } from "./change-logbook.ts";
import { BIKE_ROW_FORMAT, type BikeRow } from "./database.ts";
import type { Phone } from "./phone.ts";
import { refreshBike } from "./refresh-bike.ts";

const isCurrent = (bike: BikeRow) => bike.format === BIKE_ROW_FORMAT && bike.builtWith === BUILD;

/**
 * Judges anew what another version of the app judged, and what has had an entry since. True where
 * there was any.
 */
export function rebuildBikes(phone: Phone): Promise<boolean> {
  return changeLogbook(phone, async (change) => {
    const bikes = await change.objectStore("bikes").getAll();
    const outdated = bikes.filter((bike) => !isCurrent(bike));
    for (const { bikeId, access, rev } of outdated)
      await refreshBike(change, { bikeId, access, rev }, phone.account);
    return outdated.length > 0;
  });
}
