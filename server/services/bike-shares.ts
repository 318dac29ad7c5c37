import type { Share } from "../../shared/schemas/club.ts";
import type { Store } from "../db/store.ts";
import { notFound } from "../problems.ts";
import { assertOwner, membershipAs } from "./permissions.ts";
import { recordTakenBack } from "./take-back.ts";

/** With which clubs the owner of a bike shares it. */
export function createBikeShareService(store: Store) {
  /** Of the people who may see the bike, those other than its owner. */
  const mechanicsOf = (clubId: string, ownerId: string) =>
    store.clubMembers
      .membersOf(clubId)
      .filter(({ id, mechanic }) => mechanic && id !== ownerId)
      .map(({ name }) => name);

  return {
    list(accountId: string, bikeId: string): Share[] {
      assertOwner(store, accountId, bikeId);
      return store.bikeShares.clubsOf(bikeId).map(({ id, name, since }) => ({
        ...{ club: { id, name }, since, mechanics: mechanicsOf(id, accountId) },
      }));
    },

    share(accountId: string, bikeId: string, clubId: string): void {
      store.write(() => {
        assertOwner(store, accountId, bikeId);
        membershipAs(store, accountId, clubId, "member");
        const facts = store.lineUpFacts.find(bikeId);
        if (!facts) throw notFound();
        const { rank, dueInHours } = facts;
        const sharedAt = new Date().toISOString();
        store.bikeShares.add({ bikeId, clubId, sharedAt, rank, dueInHours });
        store.clubs.touch(clubId);
      });
    },

    /** Also where nothing was shared: what the owner asked for is so. */
    withdraw(accountId: string, bikeId: string, clubId: string): void {
      store.write(() => {
        assertOwner(store, accountId, bikeId);
        store.bikeShares.remove(bikeId, clubId);
        store.clubs.touch(clubId);
        recordTakenBack(store, { shares: [{ clubId, bikeId }] });
      });
    },
  };
}
