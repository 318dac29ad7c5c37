import type { User } from "../../shared/schemas/auth.ts";
import type { Store } from "../db/store.ts";

/** All that is kept of an account's own: who it is, and its bikes' entries as they were written. */
export function exportAccount(store: Store, user: User) {
  return store.read(() => ({
    exportedAt: new Date().toISOString(),
    user,
    bikes: store.bikes
      .idsOf(user.id)
      .map((bikeId) => ({ bikeId, entries: store.entries.ofBike(bikeId) })),
  }));
}
