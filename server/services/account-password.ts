import type { ChangePassword } from "../../shared/schemas/account.ts";
import { createMailedTokenService } from "../auth/mailed-token.ts";
import type { Caller } from "../auth/session.ts";
import type { UserRow } from "../db/users.ts";
import { passwordChangedMessage, passwordResetMessage } from "../mail/messages.ts";
import { deadLink } from "../problems.ts";
import {
  confirmPassword,
  findUser,
  hashChosen,
  mailNews,
  type AccountParts,
} from "./account-parts.ts";

/** Choosing another password: with the last one, or by a mailed link where it is forgotten. */
export function createAccountPassword(parts: AccountParts) {
  const { store, mailer, sessions, publicOrigin } = parts;
  const { users, mailedTokens } = store;
  const tokens = createMailedTokenService(store);

  /**
   * Whoever got in by the last password is out: no session and no link outlives it, a change of
   * address that was asked for included.
   */
  function setPassword(user: UserRow, passwordHash: string): void {
    users.setPasswordHash(user.id, passwordHash);
    mailedTokens.removeOf(user.id, ["reset-password", "change-email"]);
    sessions.endAllOf(user.id);
    mailNews(parts, user, passwordChangedMessage(publicOrigin));
  }

  /** Answers the cookie of the one session that is there afterwards: the caller's. */
  async function changePassword(userId: string, typed: ChangePassword, caller: Caller) {
    const chosenBy = findUser(parts, userId);
    const passwordHash = await hashChosen(parts, chosenBy, typed.newPassword, "newPassword");
    return confirmPassword(parts, userId, typed.password, (user) => {
      setPassword(user, passwordHash);
      return sessions.begin(userId, caller);
    });
  }

  function requestPasswordReset(email: string): void {
    store.write(() => {
      const user = users.findByEmail(email);
      const issued = user && tokens.issue(user.id, "reset-password");
      if (!issued) return;
      const { token, goodUntil } = issued;
      const message = passwordResetMessage(publicOrigin, token);
      const to = { userId: user.id, to: user.email };
      mailer.queue({ topic: "reset-password", ...to, message, goodUntil });
    });
  }

  /** Answers whose it is. A password that is not accepted leaves the link its use. */
  async function resetPassword(token: string, password: string): Promise<string> {
    const asked = tokens.find(token, ["reset-password"]);
    if (!asked) throw deadLink();
    const user = findUser(parts, asked.userId);
    const passwordHash = await hashChosen(parts, user, password);
    store.write(() => {
      if (!tokens.redeem(token, ["reset-password"])) throw deadLink();
      setPassword(user, passwordHash);
    });
    return user.id;
  }

  return { changePassword, requestPasswordReset, resetPassword };
}
