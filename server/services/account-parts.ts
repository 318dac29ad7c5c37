import { addDays } from "date-fns";
import { isEasilyGuessed } from "../auth/guessable-password.ts";
import type { Passwords } from "../auth/password.ts";
import type { Sessions } from "../auth/session.ts";
import type { UserRow } from "../db/users.ts";
import type { Message } from "../mail/letter.ts";
import { notSignedIn, wrongFields } from "../problems.ts";
import type { MailParts } from "./mail-parts.ts";

/** What accounts are made of. */
export interface AccountParts extends MailParts {
  passwords: Passwords;
  sessions: Sessions;
}

export function findUser({ store }: Pick<AccountParts, "store">, userId: string): UserRow {
  const user = store.users.find(userId);
  if (!user) throw notSignedIn();
  return user;
}

/** A password that was typed, and the account it is to be the password of. */
interface Typed {
  password: string;
  find: () => UserRow | undefined;
  refusal: () => Error;
}

/**
 * Does `act`, in a transaction, for whoever typed the account's password. Checking takes a while:
 * a password that is another one by then is checked again.
 */
export async function actWithPassword<T>(
  { store, passwords }: AccountParts,
  { password, find, refusal }: Typed,
  act: (user: UserRow) => T,
): Promise<T> {
  for (;;) {
    const checked = find();
    const matches = await passwords.passwordMatches(checked?.passwordHash ?? null, password);
    if (!checked || !matches) throw refusal();
    const acted = store.write(() => {
      const user = find();
      return user?.passwordHash === checked.passwordHash ? { answer: act(user) } : null;
    });
    if (acted) return acted.answer;
  }
}

const notYourPassword = () => wrongFields({ password: "This is not your password." });

/** Whoever changes what lets people in types the password first: a phone left open is not enough. */
export const confirmPassword = <T>(
  parts: AccountParts,
  userId: string,
  password: string,
  act: (user: UserRow) => T,
): Promise<T> => {
  const find = () => findUser(parts, userId);
  return actWithPassword(parts, { password, find, refusal: notYourPassword }, act);
};

const EASILY_GUESSED =
  "This is among the first that somebody would try. A few words in a row are better.";

/** The hash to keep of a password chosen for `user`, typed into the form's `field`. */
export async function hashChosen(
  { passwords }: AccountParts,
  { email, name }: Pick<UserRow, "email" | "name">,
  password: string,
  field = "password",
): Promise<string> {
  if (await isEasilyGuessed(password, [email, name]))
    throw wrongFields({ [field]: EASILY_GUESSED });
  return passwords.hashPassword(password);
}

/** After this, news of an account is none. */
const NEWS_DAYS = 3;

/** Tells an account's owner what was changed. Of the present transaction. */
export function mailNews(
  { mailer }: AccountParts,
  { id: userId, email: to }: Pick<UserRow, "id" | "email">,
  message: Message,
): void {
  const goodUntil = addDays(new Date(), NEWS_DAYS).getTime();
  mailer.queue({ topic: "account-news", userId, to, message, goodUntil });
}
