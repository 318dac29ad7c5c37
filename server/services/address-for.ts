import type { Reminders } from "../../shared/schemas/reminders.ts";
import type { MailTopic, WaitingMail } from "../db/mails.ts";
import type { Store } from "../db/store.ts";
import { accessTo } from "./permissions.ts";

/** The mails about bikes, each with the setting that turns it off. */
const settings: Partial<Record<MailTopic, keyof Reminders>> = {
  due: "dueMails",
  stop: "stopMails",
  "stop-advice": "stopMails",
};

/**
 * Where a waiting mail is to go, asked again whenever it is to be sent, which may be days after it
 * was written: one about a bike to the account's present address, or nowhere (null) where the account
 * has turned such mails off or may no longer read the bike. One about the account itself goes where
 * it was written to: what it says, and its link, are for that address.
 */
export function addressFor(
  store: Store,
  { topic, userId, bikeId, letter }: Pick<WaitingMail, "topic" | "userId" | "bikeId" | "letter">,
): string | null {
  const setting = settings[topic];
  if (!setting || userId === null) return letter.to;
  const user = store.users.find(userId);
  if (!user?.verified || !store.reminders.of(userId)[setting]) return null;
  // A restored database may lack the bike, until its phone brings it.
  return bikeId === null || accessTo(store, userId, bikeId) ? user.email : null;
}
