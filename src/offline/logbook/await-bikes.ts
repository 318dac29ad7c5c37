import { z } from "zod";
import { changeLogbook } from "./change-logbook.ts";
import type { Phone } from "./phone.ts";
import { refreshBike } from "./refresh-bike.ts";

/** The server refuses a whole call for one id that cannot be a bike's. */
const bikeIdSchema = z.uuid();

/**
 * Puts bikes of others on this phone, still empty: the next sync asks for their logs, or takes them
 * off again where this account may not see them.
 */
export function awaitBikes(phone: Phone, bikeIds: readonly string[]): Promise<void> {
  const asked = bikeIds.filter((bikeId) => bikeIdSchema.safeParse(bikeId).success);
  return changeLogbook(phone, async (change) => {
    for (const bikeId of asked) {
      if (await change.objectStore("bikes").get(bikeId)) continue;
      await refreshBike(change, { bikeId, access: "mechanic", rev: 0 }, phone.account);
    }
  });
}
