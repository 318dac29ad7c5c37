/** Who may do what with which bike: decided here and nowhere else. */
import type { BikeAccess } from "../../shared/schemas/sync.ts";
import type { Store } from "../db/store.ts";

/** What this account is to this bike; null for a bike it may not know of, as for one that is not. */
export function accessTo(store: Store, accountId: string, bikeId: string): BikeAccess | null {
  return store.bikes.ownerOf(bikeId) === accountId ? "owner" : null;
}

/** The bikes whose entries a phone is sent: the account's own, and those it lists and may read. */
export function bikesToSend(store: Store, accountId: string, listed: readonly string[]) {
  const bikeIds = new Set([...store.bikes.idsOf(accountId), ...listed]);
  return [...bikeIds].flatMap((bikeId) => {
    const access = accessTo(store, accountId, bikeId);
    return access === null ? [] : [{ bikeId, access }];
  });
}
