import { randomUUID } from "node:crypto";
import type { SignIn, SignUp, User } from "../../shared/schemas/auth.ts";
import { emailTaken, wrongCredentials } from "../problems.ts";
import { createAccountEmail } from "./account-email.ts";
import { confirmPassword, findUser, hashChosen, type AccountParts } from "./account-parts.ts";
import { createAccountPassword } from "./account-password.ts";
import { eraseAccount } from "./erase.ts";
import { shownUser } from "./shown-user.ts";

export function createAccounts(parts: AccountParts) {
  const { store, passwords } = parts;
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

  async function signIn({ email, password }: SignIn): Promise<User> {
    const user = users.findByEmail(email);
    const matches = await passwords.passwordMatches(user?.passwordHash ?? null, password);
    if (!user || !matches) throw wrongCredentials();
    if (passwords.isOutdated(user.passwordHash))
      users.setPasswordHash(user.id, await passwords.hashPassword(password));
    return shownUser(user);
  }

  async function erase(userId: string, password: string): Promise<void> {
    await confirmPassword(parts, userId, password);
    eraseAccount(store, userId);
  }

  return {
    find: (id: string): User => shownUser(findUser(parts, id)),
    signUp,
    signIn,
    erase,
    ...email,
    ...createAccountPassword(parts),
  };
}
