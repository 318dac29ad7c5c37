import { createMailedTokenService } from "../auth/mailed-token.ts";
import type { UserRow } from "../db/users.ts";
import { keyLinkTo } from "../mail/compose.ts";
import { mailedPages } from "../../shared/schemas/mailed-pages.ts";
import type { AccountParts } from "./account-parts.ts";
import { eraseAccount } from "./erase.ts";

type Parts = Pick<AccountParts, "store" | "sessions" | "publicOrigin">;

/** Something the operator can put right: its message says how. */
export class AdministrationError extends Error {
  override name = "AdministrationError";
}

/** What whoever runs the server does for an account whose owner asks. Nobody's password is seen. */
export function createAdministration({ store, sessions, publicOrigin }: Parts) {
  const tokens = createMailedTokenService(store);

  function accountOf(email: string): UserRow {
    const user = store.users.findByEmail(email);
    if (!user) throw new AdministrationError(`There is no account for ${email}.`);
    return user;
  }

  const isOrganiser = ({ organiser }: { organiser: boolean }) => organiser;

  return {
    /** A link by which the account's owner chooses a new password: once, within 30 minutes. */
    resetLink(email: string): string {
      const issued = tokens.issue(accountOf(email).id, "reset-password");
      if (!issued)
        throw new AdministrationError("Five links wait to be used. The oldest ends in 30 minutes.");
      return keyLinkTo(publicOrigin, mailedPages.reset, issued.token);
    },
    /** Answers how many there were. */
    endSessions(email: string): number {
      const { id } = accountOf(email);
      const { length } = sessions.list(id);
      sessions.endAllOf(id);
      return length;
    },
    endAllSessions: () => sessions.endAll(),
    deleteAccount: (email: string) => eraseAccount(store, accountOf(email).id),
    listClubs: () =>
      store.clubs.all().map(({ id, name, createdAt }) => {
        const members = store.clubMembers.membersOf(id);
        const organisers = members.filter(isOrganiser);
        return {
          name,
          createdAt,
          members: members.length,
          organisers: organisers.map((member) => store.users.find(member.id)!.email),
        };
      }),
  };
}

export type Administration = ReturnType<typeof createAdministration>;
