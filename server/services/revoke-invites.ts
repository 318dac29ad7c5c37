import type { Store } from "../db/store.ts";

/** Its link leads nowhere from now on, and is not sent if it was not yet. False where there is none. */
export function revokeInvite(store: Store, clubId: string, inviteId: string): boolean {
  store.mails.removeInvitation(inviteId);
  return store.clubInvites.remove(clubId, inviteId);
}

/** Those used up too, which an older backup holds with a use left; answers their ids. */
export function revokeAllInvites(store: Store, clubId: string): string[] {
  const inviteIds = store.clubInvites.idsOf(clubId);
  for (const inviteId of inviteIds) revokeInvite(store, clubId, inviteId);
  return inviteIds;
}
