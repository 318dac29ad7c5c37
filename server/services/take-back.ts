import type { Erasure } from "../db/erasure-record.ts";
import type { Store } from "../db/store.ts";
import { endClub, endMembership } from "./end-membership.ts";
import { revokeInvite } from "./revoke-invites.ts";

type TakenBack = Pick<Erasure, "clubIds" | "members" | "roles" | "invites" | "shares">;

/** To be called last in the transaction: what cannot be written down is not taken back. */
export function recordTakenBack(store: Store, taken: TakenBack): void {
  store.erasureRecord.append({
    ...{ erasedAt: new Date().toISOString(), bikeIds: [], entryIds: [] },
    ...taken,
  });
}

/**
 * After a restore: what was given before that moment, and is there again, is taken back again. It may
 * leave clubs without an organiser.
 */
export function takeBackAgain(store: Store, erasure: Erasure): void {
  const { erasedAt, clubIds = [], members = [], roles = [], invites = [], shares = [] } = erasure;
  const wasMember = (clubId: string, userId: string) => {
    const member = store.clubMembers.membersOf(clubId).find(({ id }) => id === userId);
    return member !== undefined && member.joinedAt <= erasedAt;
  };
  for (const { bikeId, clubId } of shares) {
    const share = store.bikeShares.clubsOf(bikeId).find(({ id }) => id === clubId);
    if (!share || share.since > erasedAt) continue;
    store.bikeShares.remove(bikeId, clubId);
    store.clubs.touch(clubId);
  }
  for (const { clubId, userId } of members)
    if (wasMember(clubId, userId)) endMembership(store, clubId, userId);
  for (const { clubId, userId, ...then } of roles)
    if (wasMember(clubId, userId)) store.clubMembers.setRoles(clubId, userId, then);
  for (const { clubId, inviteId } of invites) revokeInvite(store, clubId, inviteId);
  for (const clubId of clubIds) if (store.clubs.find(clubId)) endClub(store, clubId);
}
