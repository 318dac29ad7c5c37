import type { User } from "../../shared/schemas/auth.ts";
import type { AccountParts } from "./account-parts.ts";
import { shownClub } from "./clubs.ts";

type Parts = Pick<AccountParts, "store" | "sessions">;

/**
 * All that is kept of an account's own: who it is, its devices, clubs and settings, its bikes'
 * entries as they were written, with whom each bike is shared, and what it wrote of other bikes.
 */
export function exportAccount({ store, sessions }: Parts, user: User) {
  return store.read(() => ({
    exportedAt: new Date().toISOString(),
    user,
    devices: sessions.list(user.id).map(({ id: _id, ...device }) => device),
    reminders: store.reminders.of(user.id),
    clubs: store.clubMembers.clubsOf(user.id).map(shownClub),
    bikes: store.bikes.idsOf(user.id).map((bikeId) => ({
      bikeId,
      sharedWith: store.bikeShares.clubsOf(bikeId),
      entries: store.entries.ofBike(bikeId),
    })),
    writtenElsewhere: store.entries.writtenElsewhere(user.id),
  }));
}
