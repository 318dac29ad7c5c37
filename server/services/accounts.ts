import { randomUUID } from "node:crypto";
import type { SignIn, SignUp, User } from "../../shared/schemas/auth.ts";
import type { Caller } from "../auth/session.ts";
import type { UserRow } from "../db/users.ts";
import { emailTaken, wrongCredentials } from "../problems.ts";
import { createAccountEmail } from "./account-email.ts";
import {
  actWithPassword,
  confirmPassword,
  findUser,
  hashChosen,
  type AccountParts,
} from "./account-parts.ts";
import { createAccountPassword } from "./account-password.ts";
import { eraseAccount } from "./erase.ts";
import { shownUser } from "./shown-user.ts";

export function createAccounts(parts: AccountParts) {
  const { store, passwords, sessions } = parts;
  const { users } = store;
  const { sendVerification, ...email } = createAccountEmail(parts);

  async function signUp({ email, password, name }: SignUp): Promise<User> {
    const passwordHash = await hashChosen(parts, { email, name }, password);
    const createdAt = new Date().toISOString();
    const user = { id: randomUUID(), email, name, passwordHash, verified: false, createdAt };
    store.write(() => {
      if (!users.add(user)) throw emailTaken();
      sendVerification(user);
    });
    return shownUser(user);
  }

  async function renewHash({ id, passwordHash }: UserRow, password: string): Promise<void> {
    if (!passwords.isOutdated(passwordHash)) return;
    users.replacePasswordHash(id, passwordHash, await passwords.hashPassword(password));
  }

  async function signIn({ email, password }: SignIn, caller: Caller) {
    const find = () => users.findByEmail(email);
    const typed = { password, find, refusal: wrongCredentials };
    const signedIn = await actWithPassword(parts, typed, (user) => ({
      user,
      cookie: sessions.begin(user.id, caller),
    }));
    await renewHash(signedIn.user, password);
    return { user: shownUser(signedIn.user), cookie: signedIn.cookie };
  }

  const erase = (userId: string, password: string): Promise<void> =>
    confirmPassword(parts, userId, password, () => eraseAccount(store, userId));

  return {
    find: (id: string): User => shownUser(findUser(parts, id)),
    signUp,
    signIn,
    erase,
    ...email,
    ...createAccountPassword(parts),
  };
}
