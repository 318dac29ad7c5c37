import { BUILD } from "./bike-row.ts";
import { BIKE_ROW_FORMAT, type BikeRow } from "./database.ts";
import type { Phone } from "./phone.ts";
import { refreshBike } from "./refresh-bike.ts";

const isCurrent = (bike: BikeRow) => bike.format === BIKE_ROW_FORMAT && bike.builtWith === BUILD;

/** Judges anew what another version of the app judged. True where there was any. */
export async function rebuildBikes(phone: Phone): Promise<boolean> {
  const database = await phone.open();
  const change = database.transaction(["entries", "bikes"], "readwrite");
  const outdated = (await change.objectStore("bikes").getAll()).filter((bike) => !isCurrent(bike));
  for (const { bikeId, access, rev } of outdated)
    await refreshBike(change, { bikeId, access, rev }, phone.account);
  await change.done;
  return outdated.length > 0;
}
