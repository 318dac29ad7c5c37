import type { Erasure } from "../db/erasure-record.ts";
import type { Store } from "../db/store.ts";
import { endMembership, passOnClubs } from "./end-membership.ts";
import { assertOwner } from "./permissions.ts";
import { takeBackAgain } from "./take-back.ts";

/** Takes out the rows; keeps the ids, so that no phone brings them back. */
function eraseRows(store: Store, { bikeIds, entryIds, accountId }: Erasure): void {
  for (const bikeId of bikeIds) {
    store.clubs.touchAllOf(bikeId);
    store.bikeShares.removeAllOf(bikeId);
    store.mails.removeAbout(bikeId);
    store.lineUpFacts.remove(bikeId);
    store.bikeSummaries.remove(bikeId);
    store.entries.removeOf(bikeId);
    store.bikes.remove(bikeId);
  }
  if (accountId !== undefined) {
    for (const { id } of store.clubMembers.clubsOf(accountId)) endMembership(store, id, accountId);
    store.mails.removeTo(accountId);
    store.reminders.removeOf(accountId);
    store.users.remove(accountId);
    // What is left in the logs of others: phones have it with the name.
    store.entries.sendAgain(accountId);
  }
  store.erasedIds.add([...bikeIds, ...entryIds]);
}

const erasureOf = (store: Store, bikeIds: string[], accountId?: string): Erasure => ({
  erasedAt: new Date().toISOString(),
  ...(accountId !== undefined && { accountId }),
  bikeIds,
  entryIds: bikeIds.flatMap((bikeId) => store.entries.ofBike(bikeId).map((entry) => entry.id)),
});

/** The record is written last before the commit: where it cannot be, nothing is erased. */
function erase(store: Store, bikeIds: string[], accountId?: string): void {
  const erasure = erasureOf(store, bikeIds, accountId);
  eraseRows(store, erasure);
  store.erasureRecord.append({ ...erasure, roles: passOnClubs(store) });
}

export function eraseBike(store: Store, accountId: string, bikeId: string): void {
  store.write(() => {
    assertOwner(store, accountId, bikeId);
    erase(store, [bikeId]);
  });
}

/** The account with its bikes, their logs, and its place in clubs. */
export function eraseAccount(store: Store, accountId: string): void {
  store.write(() => erase(store, store.bikes.idsOf(accountId), accountId));
}

/** After a restore: what was erased or taken back since the backup was made is so again. */
export function replayErasures(store: Store): number {
  const erasures = store.erasureRecord.readAll();
  store.write(() => {
    for (const erasure of erasures) {
      eraseRows(store, erasure);
      takeBackAgain(store, erasure);
    }
    passOnClubs(store);
  });
  return erasures.length;
}
