import type { User } from "../../shared/schemas/auth.ts";
import type { Store } from "../db/store.ts";
import { shownClub } from "./clubs.ts";

/**
 * All that is kept of an account's own: who it is, its clubs and settings, and its bikes' entries as
 * they were written, with whom each bike is shared.
 */
export function exportAccount(store: Store, user: User) {
  return store.read(() => ({
    exportedAt: new Date().toISOString(),
    user,
    reminders: store.reminders.of(user.id),
    clubs: store.clubMembers.clubsOf(user.id).map(shownClub),
    bikes: store.bikes.idsOf(user.id).map((bikeId) => ({
      bikeId,
      sharedWith: store.bikeShares.clubsOf(bikeId),
      entries: store.entries.ofBike(bikeId),
    })),
  }));
}
