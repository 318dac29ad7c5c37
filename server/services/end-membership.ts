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
 * Takes out a member whom nobody can hold back. A club whose last organiser goes is passed on: to
 * the mechanic who has been in it longest, else to the member. One with nobody left ends.
 */
export function leaveClub(store: Store, clubId: string, userId: string): void {
  const others = store.clubMembers.membersOf(clubId).filter(({ id }) => id !== userId);
  const heir = others.find(({ mechanic }) => mechanic) ?? others[0];
  if (!heir) return endClub(store, clubId);
  if (!others.some(({ organiser }) => organiser))
    store.clubMembers.setRoles(clubId, heir.id, { organiser: true });
  endMembership(store, clubId, userId);
}
