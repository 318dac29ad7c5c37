import { addDays, differenceInDays } from "date-fns";
import { lastSession } from "../../shared/logbook/last-session.ts";
import type { AdviceNote } from "../../shared/logbook/standing-advice.ts";
import type { Summary } from "../../shared/schemas/summary.ts";
import type { MailTopic } from "../db/mails.ts";
import type { Store } from "../db/store.ts";
import { stopAdviceMessage, stopMessage, type AboutStop } from "../mail/bike-messages.ts";
import type { Message } from "../mail/letter.ts";
import { aboutBike } from "./about-bike.ts";
import type { MailParts } from "./mail-parts.ts";

/** After this it is no news what an owner wrote, copied from an old book, nor what could not be sent. */
const NEWS_DAYS = 7;

interface StopNews {
  bikeId: string;
  bikeName: string;
  topic: MailTopic;
  /** The id of the note, or those of the session's checks. */
  occasion: string;
  /** Of the last check, or of the note. */
  at: string;
  /** Knows already, and is not written to. */
  authorId: string;
}

/** Owner and mechanics who want such mails: those who may read the log, and its authors' names. */
function readersOf(store: Store, { bikeId, authorId }: StopNews) {
  const ownerId = store.bikes.ownerOf(bikeId);
  const userIds = new Set([ownerId ?? "", ...store.bikeShares.mechanicsOf(bikeId)]);
  userIds.delete(authorId);
  return [...userIds].flatMap((userId) => {
    const user = store.users.find(userId);
    return user?.verified && store.reminders.of(userId).stopMails ? [user] : [];
  });
}

function tell(parts: MailParts, news: StopNews, compose: (about: AboutStop) => Message): void {
  const now = new Date();
  const { store, mailer } = parts;
  const { bikeId, bikeName, topic, occasion, at, authorId } = news;
  const ownerId = store.bikes.ownerOf(bikeId);
  // A mechanic's may be late, or of a phone whose clock is wrong: it is told all the same.
  if (authorId === ownerId && differenceInDays(now, at) > NEWS_DAYS) return;
  const ownerName = store.users.find(ownerId ?? "")?.name ?? null;
  for (const { id: userId, email } of readersOf(store, news)) {
    mailer.queue({
      ...{ topic, userId, bikeId, to: email, occasion },
      goodUntil: addDays(now, NEWS_DAYS).getTime(),
      message: compose({
        ...aboutBike(parts, { bikeId, bikeName, userId }, "stopMails"),
        ownerName: userId === ownerId ? null : ownerName,
      }),
    });
  }
}

/**
 * Whether a mail was written of one of these checks, which are a session. All of them are then known,
 * so that the session is, whichever of them is struck.
 */
function isTold({ mails }: Store, bikeId: string, checkIds: string[]): boolean {
  const told = mails
    .occasionsAbout(bikeId, "stop")
    .filter(({ occasion }) => checkIds.some((id) => occasion.includes(id)));
  for (const { id, occasion } of told) {
    const further = checkIds.filter((checkId) => !occasion.includes(checkId));
    mails.setOccasion({ id, occasion: [occasion, ...further].join(" ") });
  }
  return told.length > 0;
}

/**
 * Tells owner and mechanics that a bike's delivery is judged *stop*, once for each session so
 * judged; what still waits to be sent of one that is so judged no more is not sent. Its author is
 * who wrote the lowest of the session's checks, which is low by itself. To be called in the
 * transaction that stores the entry which made it so.
 */
export function mailStop(parts: MailParts, summary: Summary): void {
  const { store } = parts;
  const { bikeId, name: bikeName, action } = summary;
  const session = action === "stop" ? lastSession(summary) : [];
  const checkIds = session.map(({ entryId }) => entryId);
  store.mails.withdrawAbout(bikeId, "stop", (told) => checkIds.some((id) => told.includes(id)));
  const last = session.at(-1);
  if (!last || isTold(store, bikeId, checkIds)) return;
  const lowest = session.reduce((low, check) => (check.perRunMl < low.perRunMl ? check : low));
  const authorId = store.entries.find(lowest.entryId)?.authorId ?? "";
  const authorName = store.users.find(authorId)?.name ?? "a former member";
  const news = { topic: "stop", occasion: checkIds.join(" "), at: last.at } as const;
  tell(parts, { bikeId, bikeName, authorId, ...news }, (about) =>
    stopMessage({ ...about, authorName, ratio: last.ratio }),
  );
}

/**
 * Tells owner and mechanics of a *stop* that somebody wrote, once for each note. What still waits to
 * be sent of one that was struck or lifted is not sent. To be called as `mailStop` is.
 */
export function mailStopAdvice(
  parts: MailParts,
  { bikeId, name: bikeName }: Summary,
  advice: AdviceNote | null,
): void {
  const topic = "stop-advice";
  const stop = advice?.body.advice === "stop" ? advice : null;
  parts.store.mails.withdrawAbout(bikeId, topic, (told) => told === stop?.id);
  if (!stop?.author) return;
  const { id: occasion, at, author, body } = stop;
  const note = { topic, occasion, at, authorId: author.id } as const;
  tell(parts, { bikeId, bikeName, ...note }, (about) =>
    stopAdviceMessage({ ...about, authorName: author.name, text: body.text }),
  );
}
