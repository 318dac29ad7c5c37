import type { Reminders } from "../../shared/schemas/reminders.ts";
import { readUnsubscribeToken } from "../auth/unsubscribe-token.ts";
import type { Store } from "../db/store.ts";
import { goneLink } from "../problems.ts";

/** Which mails an account gets. */
export function createReminderService({ reminders, users, secret, write }: Store) {
  return {
    of: (accountId: string): Reminders => reminders.of(accountId),

    set(accountId: string, wanted: Reminders): Reminders {
      reminders.put(accountId, wanted);
      return wanted;
    },

    /** By a link from a mail: ends that kind of mail, as often as it is followed. */
    unsubscribe(token: string): void {
      write(() => {
        const read = readUnsubscribeToken(secret, token);
        if (!read || !users.find(read.userId)) throw goneLink();
        reminders.put(read.userId, { ...reminders.of(read.userId), [read.kind]: false });
      });
    },
  };
}
