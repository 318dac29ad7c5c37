import { randomUUID } from "node:crypto";
import type { Club } from "../../shared/schemas/club.ts";
import type { Membership } from "../db/club-members.ts";
import type { Store } from "../db/store.ts";
import { endClub } from "./end-membership.ts";
import { membershipAs } from "./permissions.ts";
import { recordTakenBack } from "./take-back.ts";

export const shownClub = ({ id, name, organiser, mechanic }: Membership): Club => ({
  ...{ id, name, organiser, mechanic },
});

/** Clubs as a whole, each for the account that asks. */
export function createClubService(store: Store) {
  return {
    ofAccount: (accountId: string): Club[] => store.clubMembers.clubsOf(accountId).map(shownClub),

    find: (accountId: string, clubId: string): Club =>
      shownClub(membershipAs(store, accountId, clubId, "member")),

    /** Whoever makes a club is its first organiser. */
    add: (accountId: string, name: string): Club =>
      store.write(() => {
        const [id, createdAt] = [randomUUID(), new Date().toISOString()];
        const roles = { organiser: true, mechanic: false };
        store.clubs.add({ id, name, createdAt });
        store.clubMembers.add({ clubId: id, userId: accountId, ...roles, joinedAt: createdAt });
        return { id, name, ...roles };
      }),

    /** Ends the club for everyone: nothing is shared with it any more. */
    close(accountId: string, clubId: string): void {
      store.write(() => {
        membershipAs(store, accountId, clubId, "organiser");
        endClub(store, clubId);
        recordTakenBack(store, { clubIds: [clubId] });
      });
    },
  };
}
