import { randomUUID } from "node:crypto";
import type { SignIn, SignUp, User } from "../../shared/schemas/auth.ts";
import { createMailedTokenService } from "../auth/mailed-token.ts";
import type { Passwords } from "../auth/password.ts";
import type { Sessions } from "../auth/session.ts";
import type { UserRow } from "../db/users.ts";
import { passwordResetMessage, verificationMessage } from "../mail/messages.ts";
import { deadLink, emailTaken, notSignedIn, wrongCredentials, wrongFields } from "../problems.ts";
import { eraseAccount } from "./erase.ts";
import type { MailParts } from "./mail-parts.ts";

export interface AccountParts extends MailParts {
  passwords: Passwords;
  sessions: Sessions;
}

const shown = ({ id, name, email, verified }: UserRow): User => ({ id, name, email, verified });

export function createAccounts({ store, passwords, sessions, mailer, publicOrigin }: AccountParts) {
  const { users } = store;
  const tokens = createMailedTokenService(store);

  function find(id: string): User {
    const user = users.find(id);
    if (!user) throw notSignedIn();
    return shown(user);
  }

  function sendVerification({ id: userId, email }: User): void {
    const issued = tokens.issue(userId, "verify-email");
    if (!issued) return;
    const { token, goodUntil } = issued;
    const message = verificationMessage(publicOrigin, token);
    mailer.queue({ topic: "verify-email", userId, to: email, message, goodUntil });
  }

  async function signUp({ email, password, name }: SignUp): Promise<User> {
    const passwordHash = await passwords.hashPassword(password);
    const createdAt = new Date().toISOString();
    const user = { id: randomUUID(), email, name, passwordHash, verified: false, createdAt };
    store.write(() => {
      if (!users.add(user)) throw emailTaken();
      sendVerification(user);
    });
    return shown(user);
  }

  async function signIn({ email, password }: SignIn): Promise<User> {
    const user = users.findByEmail(email);
    const matches = await passwords.passwordMatches(user?.passwordHash ?? null, password);
    if (!user || !matches) throw wrongCredentials();
    return shown(user);
  }

  function verifyEmail(token: string): User {
    const userId = tokens.redeem(token, "verify-email");
    if (userId === null) throw deadLink();
    users.markVerified(userId);
    return find(userId);
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

  /** Also ends every session of the account: whoever knew the old password is out. */
  async function resetPassword(token: string, password: string): Promise<void> {
    const passwordHash = await passwords.hashPassword(password);
    const userId = store.write(() => {
      const redeemedFor = tokens.redeem(token, "reset-password");
      if (redeemedFor !== null) users.setPasswordHash(redeemedFor, passwordHash);
      return redeemedFor;
    });
    if (userId === null) throw deadLink();
    await sessions.endAllOf(userId);
  }

  async function erase(userId: string, password: string): Promise<void> {
    const stored = users.find(userId)?.passwordHash ?? null;
    if (!(await passwords.passwordMatches(stored, password)))
      throw wrongFields({ password: "This is not your password." });
    eraseAccount(store, userId);
  }

  return { find, signUp, signIn, verifyEmail, requestPasswordReset, resetPassword, erase };
}
