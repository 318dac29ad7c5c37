import type { GivenRoles } from "../db/erasure-record.ts";
import type { Store } from "../db/store.ts";
import { revokeAllInvites } from "./revoke-invites.ts";

/** Takes an account out of a club, and the account's bikes off the club's Line-up. */
export function endMembership(store: Store, clubId: string, userId: string): void {
  store.bikeShares.removeOfMember(clubId, userId);
  store.clubMembers.remove(clubId, userId);
  store.clubs.touch(clubId);
}

/** The club with its members, invites and shares; of the mails with its links those not sent yet. */
export function endClub(store: Store, clubId: string): void {
  revokeAllInvites(store, clubId);
  store.clubs.remove(clubId);
}

/**
 * Clubs whose last organiser is gone are passed on: to the mechanic who has been in it longest, else
 * to the member. One with nobody left ends. Answers the roles so given.
 */
export function passOnClubs(store: Store): GivenRoles[] {
  return store.clubs.withoutOrganiser().flatMap((clubId) => {
    const members = store.clubMembers.membersOf(clubId);
    const heir = members.find(({ mechanic }) => mechanic) ?? members[0];
    if (!heir) {
      endClub(store, clubId);
      return [];
    }
    const roles = { organiser: true, mechanic: heir.mechanic };
    store.clubMembers.setRoles(clubId, heir.id, roles);
    return [{ clubId, userId: heir.id, ...roles }];
  });
}
