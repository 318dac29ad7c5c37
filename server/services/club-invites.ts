import { addDays } from "date-fns";
import { randomBytes, randomUUID } from "node:crypto";
import type { Club, Invite, NewInvite } from "../../shared/schemas/club.ts";
import { mailedPages } from "../../shared/schemas/mailed-pages.ts";
import { hashToken } from "../auth/hash-token.ts";
import type { InviteRow } from "../db/club-invites.ts";
import { invitationMessage } from "../mail/club-messages.ts";
import { linkTo } from "../mail/compose.ts";
import { goneLink, notFound } from "../problems.ts";
import { shownClub } from "./clubs.ts";
import type { MailParts } from "./mail-parts.ts";
import { membershipAs } from "./permissions.ts";
import { revokeInvite } from "./revoke-invites.ts";
import { recordTakenBack } from "./take-back.ts";

const shown = ({ id, email, usesLeft, createdAt, expiresAt }: InviteRow): Invite => ({
  ...{ id, email, usesLeft, createdAt, expiresAt },
});

const isGood = (invite: InviteRow | undefined): invite is InviteRow =>
  invite !== undefined && invite.usesLeft > 0 && invite.expiresAt > new Date().toISOString();

/** Links by which people join clubs: kept as hashes, good for so many, for so long, until revoked. */
export function createClubInviteService({ store, mailer, publicOrigin }: MailParts) {
  const { clubInvites, clubMembers, clubs, write } = store;

  return {
    list(accountId: string, clubId: string): Invite[] {
      membershipAs(store, accountId, clubId, "organiser");
      return clubInvites.liveOf(clubId, new Date().toISOString()).map(shown);
    },

    add: (accountId: string, clubId: string, { email, uses, days }: NewInvite) =>
      write((): { invite: Invite; url: string } => {
        const club = membershipAs(store, accountId, clubId, "organiser");
        // The letter holds the club's name, which may be any words: not from whom nobody knows.
        const mailTo = store.users.find(accountId)?.verified ? email : undefined;
        const token = randomBytes(16).toString("base64url");
        const url = linkTo(publicOrigin, mailedPages.join, token);
        const now = new Date();
        const expires = addDays(now, days);
        const invite: InviteRow = {
          id: randomUUID(),
          clubId,
          hash: hashToken(token),
          email: mailTo ?? null,
          usesLeft: uses,
          createdAt: now.toISOString(),
          expiresAt: expires.toISOString(),
        };
        clubInvites.removeExpired(clubId, invite.createdAt);
        clubInvites.add(invite);
        if (mailTo !== undefined)
          mailer.queue({
            topic: "invitation",
            to: mailTo,
            occasion: invite.id,
            goodUntil: expires.getTime(),
            message: invitationMessage(club.name, url, days),
          });
        return { invite: shown(invite), url };
      }),

    revoke(accountId: string, clubId: string, inviteId: string): void {
      write(() => {
        membershipAs(store, accountId, clubId, "organiser");
        if (!revokeInvite(store, clubId, inviteId)) throw notFound();
        recordTakenBack(store, { invites: [{ clubId, inviteId }] });
      });
    },

    /** What whoever holds the link may know. */
    clubOf(token: string): Pick<Club, "id" | "name"> {
      const invite = clubInvites.findByHash(hashToken(token));
      const club = isGood(invite) ? clubs.find(invite.clubId) : undefined;
      if (!club) throw goneLink();
      return { id: club.id, name: club.name };
    },

    /** Who is in the club already takes no use, and may follow a used-up link again. */
    accept: (accountId: string, token: string): Club =>
      write(() => {
        const invite = clubInvites.findByHash(hashToken(token));
        const already = invite && clubMembers.find(invite.clubId, accountId);
        if (already) return shownClub(already);
        if (!isGood(invite)) throw goneLink();
        const roles = { organiser: false, mechanic: false };
        const joinedAt = new Date().toISOString();
        clubInvites.takeUse(invite.id);
        clubMembers.add({ clubId: invite.clubId, userId: accountId, ...roles, joinedAt });
        return shownClub(membershipAs(store, accountId, invite.clubId, "member"));
      }),
  };
}
