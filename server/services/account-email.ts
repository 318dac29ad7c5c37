import { hoursToSeconds } from "date-fns";
import type { ChangeEmail } from "../../shared/schemas/account.ts";
import type { User } from "../../shared/schemas/auth.ts";
import { createMailedTokenService } from "../auth/mailed-token.ts";
import type { UserRow } from "../db/users.ts";
import {
  emailChangeAskedMessage,
  emailChangedMessage,
  newEmailMessage,
  verificationMessage,
} from "../mail/messages.ts";
import { deadLink, emailTaken, tooMany, wrongFields } from "../problems.ts";
import { confirmPassword, findUser, mailNews, type AccountParts } from "./account-parts.ts";
import { shownUser } from "./shown-user.ts";

/** Five unused links are there: the first of them may be a day from its end. */
const LINKS_RETRY_SECONDS = hoursToSeconds(24);

/** The address of an account: it counts once a link that was sent there has been followed. */
export function createAccountEmail(parts: AccountParts) {
  const { store, mailer, publicOrigin } = parts;
  const { users, mailedTokens } = store;
  const tokens = createMailedTokenService(store);

  const isTaken = (email: string, userId: string) =>
    (users.findByEmail(email)?.id ?? userId) !== userId;

  /** False where enough are under way. Of the present transaction. */
  function sendVerification({ id: userId, email }: Pick<UserRow, "id" | "email">): boolean {
    const issued = tokens.issue(userId, "verify-email");
    if (!issued) return false;
    const { token, goodUntil } = issued;
    const message = verificationMessage(publicOrigin, token);
    mailer.queue({ topic: "verify-email", userId, to: email, message, goodUntil });
    return true;
  }

  function sendVerificationAgain(userId: string): void {
    store.write(() => {
      if (!sendVerification(findUser(parts, userId))) throw tooMany(LINKS_RETRY_SECONDS);
    });
  }

  /** Tells both addresses. Until the new one's link is followed, nothing has changed. */
  const askForEmailChange = (userId: string, { email, password }: ChangeEmail) =>
    confirmPassword(parts, userId, password, (user) => {
      if (email === user.email) throw wrongFields({ email: "This is your address already." });
      if (isTaken(email, userId)) throw emailTaken();
      const issued = tokens.issue(userId, "change-email", email);
      if (!issued) throw tooMany(LINKS_RETRY_SECONDS);
      const mail = { topic: "change-email", userId, goodUntil: issued.goodUntil } as const;
      const message = newEmailMessage(publicOrigin, issued.token);
      mailer.queue({ ...mail, to: email, message });
      mailer.queue({ ...mail, to: user.email, message: emailChangeAskedMessage(publicOrigin) });
    });

  /** Links that were sent to the last address are good for nothing any more, and it is told. */
  function moveTo(email: string, user: UserRow): void {
    if (isTaken(email, user.id)) throw emailTaken();
    users.setEmail(user.id, email);
    mailedTokens.removeOf(user.id);
    mailNews(parts, user, emailChangedMessage(publicOrigin));
  }

  /** Confirms the address that the link was sent to: the account's own, or the one it is to have. */
  const verifyEmail = (token: string): User =>
    store.write(() => {
      const redeemed = tokens.redeem(token, ["verify-email", "change-email"]);
      if (!redeemed) throw deadLink();
      const user = findUser(parts, redeemed.userId);
      if (redeemed.email !== null) moveTo(redeemed.email, user);
      users.markVerified(user.id);
      return shownUser(findUser(parts, user.id));
    });

  return { sendVerification, sendVerificationAgain, askForEmailChange, verifyEmail };
}
