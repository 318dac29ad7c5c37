import type { InviteRow } from "../db/club-invites.ts";
import type { Store } from "../db/store.ts";

/** Its link leads nowhere from now on, and is not sent if it was not yet. False where there is none. */
export function revokeInvite(store: Store, clubId: string, inviteId: string): boolean {
  store.mails.removeInvitation(inviteId);
  return store.clubInvites.remove(clubId, inviteId);
}

/** One that was mailed to somebody else, for that person alone, is not in the account's hands. */
const mayHold = ({ email, usesLeft }: InviteRow, ownEmail: string) =>
  email === null || usesLeft > 1 || email.toLowerCase() === ownEmail.toLowerCase();

/** Revokes the invites by which someone just removed could come back, and answers their ids. */
export function revokeInvitesHeldBy(store: Store, clubId: string, userId: string): string[] {
  const ownEmail = store.users.find(userId)?.email ?? "";
  const live = store.clubInvites.liveOf(clubId, new Date().toISOString());
  const held = live.filter((invite) => mayHold(invite, ownEmail)).map(({ id }) => id);
  for (const inviteId of held) revokeInvite(store, clubId, inviteId);
  return held;
}
