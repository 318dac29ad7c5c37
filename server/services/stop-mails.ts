import { addDays, differenceInDays } from "date-fns";
import { lastSession } from "../../shared/logbook/last-session.ts";
import type { Summary } from "../../shared/schemas/summary.ts";
import type { Store } from "../db/store.ts";
import { stopMessage } from "../mail/bike-messages.ts";
import { aboutBike } from "./about-bike.ts";
import type { MailParts } from "./mail-parts.ts";

/** A check copied from an old book is no news; nor is a mail that could not be sent for so long. */
const NEWS_DAYS = 7;

/** Owner and mechanics who want such mails, but for the author of the entry that caused this one. */
function readersOf(store: Store, bikeId: string, authorId: string) {
  const ownerId = store.bikes.ownerOf(bikeId);
  const userIds = new Set([ownerId ?? "", ...store.bikeShares.mechanicsOf(bikeId)]);
  userIds.delete(authorId);
  return [...userIds].flatMap((userId) => {
    const user = store.users.find(userId);
    return user?.verified && store.reminders.of(userId).stopMails ? [user] : [];
  });
}

/**
 * Tells owner and mechanics that a bike's delivery is judged *stop*, once for each session so
 * judged. To be called in the transaction that stores the entry which made it so.
 */
export function mailStop(parts: MailParts, summary: Summary, authorId: string): void {
  const { bikeId } = summary;
  const session = lastSession(summary);
  const [first, last] = [session[0], session.at(-1)];
  if (summary.action !== "stop" || !first || !last) return;
  const now = new Date();
  if (differenceInDays(now, last.at) > NEWS_DAYS) return;

  const { store, mailer } = parts;
  const ownerId = store.bikes.ownerOf(bikeId);
  const ownerName = store.users.find(ownerId ?? "")?.name ?? null;
  const authorName = store.users.find(authorId)?.name ?? "";
  for (const { id: userId, email } of readersOf(store, bikeId, authorId)) {
    mailer.queue({
      ...{ topic: "stop", userId, bikeId, to: email, occasion: first.entryId },
      goodUntil: addDays(now, NEWS_DAYS).getTime(),
      message: stopMessage({
        ...aboutBike(parts, { bikeId, bikeName: summary.name, userId }, "stopMails"),
        ownerName: userId === ownerId ? null : ownerName,
        authorName,
        ratio: last.ratio,
      }),
    });
  }
}
