import type { Member, MemberRoles } from "../../shared/schemas/club.ts";
import type { Store } from "../db/store.ts";
import { lastOrganiser, notFound } from "../problems.ts";
import { endMembership } from "./end-membership.ts";
import { assertMayRemove, maySeeMember, membershipAs } from "./permissions.ts";
import { revokeAllInvites } from "./revoke-invites.ts";
import { recordTakenBack } from "./take-back.ts";

/** The members of clubs, each for the account that asks. */
export function createClubMemberService(store: Store) {
  function find(clubId: string, userId: string): Member {
    const member = store.clubMembers.membersOf(clubId).find(({ id }) => id === userId);
    if (!member) throw notFound();
    return member;
  }

  /** A club is never without somebody who can invite and remove. */
  function assertOrganiserLeft(clubId: string, without: string): void {
    const members = store.clubMembers.membersOf(clubId);
    if (!members.some(({ id, organiser }) => organiser && id !== without)) throw lastOrganiser();
  }

  return {
    list(accountId: string, clubId: string): Member[] {
      const viewer = membershipAs(store, accountId, clubId, "member");
      const members = store.clubMembers.membersOf(clubId);
      return members.filter((member) => maySeeMember(viewer, accountId, member));
    },

    setRoles: (accountId: string, clubId: string, userId: string, roles: MemberRoles): Member =>
      store.write(() => {
        membershipAs(store, accountId, clubId, "organiser");
        const member = { ...find(clubId, userId), ...roles };
        if (!member.organiser) assertOrganiserLeft(clubId, userId);
        const { organiser, mechanic } = member;
        store.clubMembers.setRoles(clubId, userId, { organiser, mechanic });
        recordTakenBack(store, { roles: [{ clubId, userId, organiser, mechanic }] });
        return member;
      }),

    /**
     * Removes a member, or lets one leave; what that member shared is shared no more. Whoever was
     * removed cannot come back by a link that was open then: who holds which, nobody knows.
     */
    remove(accountId: string, clubId: string, userId: string): void {
      store.write(() => {
        assertMayRemove(store, accountId, clubId, userId);
        if (find(clubId, userId).organiser) assertOrganiserLeft(clubId, userId);
        endMembership(store, clubId, userId);
        const left = accountId === userId;
        const inviteIds = left ? [] : revokeAllInvites(store, clubId);
        recordTakenBack(store, {
          members: [{ clubId, userId }],
          invites: inviteIds.map((inviteId) => ({ clubId, inviteId })),
        });
      });
    },
  };
}
