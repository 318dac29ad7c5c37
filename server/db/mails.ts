import {
  and,
  asc,
  eq,
  inArray,
  isNotNull,
  isNull,
  lt,
  lte,
  notInArray,
  or,
  sql,
} from "drizzle-orm";
import type { Letter } from "../mail/letter.ts";
import type { Database } from "./open-database.ts";
import { bikes, clubInvites, mails, tokenPurposes, type mailTopics } from "./schema.ts";
import { accountIds } from "./users.ts";

export type MailTopic = (typeof mailTopics)[number];
export type MailRow = typeof mails.$inferSelect;
export type WaitingMail = Pick<
  MailRow,
  "id" | "topic" | "userId" | "bikeId" | "attempts" | "goodUntil"
> & { letter: Letter };

/** What a mail is about. */
export interface Occasion {
  id: number;
  occasion: string;
}

/** Nothing left to try, and nothing kept that could be read. */
const settled = { letter: null, nextAttemptAt: null };

export function createMails(db: Database) {
  const { placeholder } = sql;
  const waiting = db
    .select({
      id: mails.id,
      topic: mails.topic,
      userId: mails.userId,
      bikeId: mails.bikeId,
      attempts: mails.attempts,
      goodUntil: mails.goodUntil,
      letter: mails.letter,
    })
    .from(mails)
    .where(lte(mails.nextAttemptAt, placeholder("now")))
    .orderBy(asc(mails.nextAttemptAt))
    .limit(placeholder("limit"))
    .prepare();
  const about = db
    .select({ id: mails.id })
    .from(mails)
    .where(
      and(
        eq(mails.userId, placeholder("userId")),
        eq(mails.topic, placeholder("topic")),
        eq(mails.occasion, placeholder("occasion")),
      ),
    )
    .prepare();
  const change = (id: number, values: Partial<MailRow>) =>
    db.update(mails).set(values).where(eq(mails.id, id)).run();

  return {
    /** Nothing where the account was written to about this occasion before. */
    add: (mail: typeof mails.$inferInsert) =>
      db.insert(mails).values(mail).onConflictDoNothing().run(),
    isKnown: (userId: string, topic: MailTopic, occasion: string): boolean =>
      about.get({ userId, topic, occasion }) !== undefined,
    /** Those whose time has come, the longest waiting first. */
    waiting: (now: number, limit: number): WaitingMail[] =>
      waiting
        .all({ now, limit })
        .flatMap(({ letter, ...mail }) => (letter ? [{ ...mail, letter }] : [])),
    markSent: (id: number, sentAt: string) => change(id, { ...settled, sentAt }),
    postpone: (id: number, attempts: number, nextAttemptAt: number) =>
      change(id, { attempts, nextAttemptAt }),
    giveUp: (id: number) => change(id, settled),
    removeInvitation: (inviteId: string) =>
      db
        .delete(mails)
        .where(
          and(isNull(mails.userId), eq(mails.topic, "invitation"), eq(mails.occasion, inviteId)),
        )
        .run(),
    /** What a bike's readers were, or are to be, told of; what a restore left unnamed may be of it too. */
    occasionsAbout: (bikeId: string, topic: MailTopic): Occasion[] =>
      db
        .select({ id: mails.id, occasion: mails.occasion })
        .from(mails)
        .where(and(or(eq(mails.bikeId, bikeId), isNull(mails.bikeId)), eq(mails.topic, topic)))
        .all()
        .map(({ id, occasion }) => ({ id, occasion: occasion ?? "" })),
    setOccasion: ({ id, occasion }: Occasion) => change(id, { occasion }),
    /** Forgets what still waits to be sent about a bike, but for what holds as before. */
    withdrawAbout(bikeId: string, topic: MailTopic, holds: (occasion: string) => boolean): void {
      const waitingAbout = db
        .select({ id: mails.id, occasion: mails.occasion })
        .from(mails)
        .where(
          and(eq(mails.bikeId, bikeId), eq(mails.topic, topic), isNotNull(mails.nextAttemptAt)),
        )
        .all();
      for (const { id, occasion } of waitingAbout)
        if (!holds(occasion ?? "")) db.delete(mails).where(eq(mails.id, id)).run();
    },
    removeAbout: (bikeId: string) => db.delete(mails).where(eq(mails.bikeId, bikeId)).run(),
    removeTo: (userId: string) => db.delete(mails).where(eq(mails.userId, userId)).run(),
    all: (): MailRow[] => db.select().from(mails).all(),
    /**
     * Those and no others, of accounts that there are. A bike that is not there yet is left unnamed:
     * what was sent about it is remembered all the same, for when its phone brings it; what was not
     * is written again then.
     */
    replaceAll(rows: MailRow[]): void {
      const accounts = accountIds(db);
      const there = new Set(
        db
          .select({ id: bikes.id })
          .from(bikes)
          .all()
          .map(({ id }) => id),
      );
      db.delete(mails).run();
      for (const row of rows) {
        if (row.userId !== null && !accounts.has(row.userId)) continue;
        const bikeId = row.bikeId !== null && there.has(row.bikeId) ? row.bikeId : null;
        if (bikeId !== row.bikeId && row.nextAttemptAt !== null) continue;
        db.insert(mails)
          .values({ ...row, bikeId })
          .run();
      }
    },
    /** What still waits though its link leads nowhere any more, all accounts' links being void. */
    withdrawDeadLinks: () =>
      db
        .delete(mails)
        .where(
          and(
            isNotNull(mails.nextAttemptAt),
            or(
              inArray(mails.topic, [...tokenPurposes]),
              and(
                eq(mails.topic, "invitation"),
                notInArray(mails.occasion, db.select({ id: clubInvites.id }).from(clubInvites)),
              ),
            ),
          ),
        )
        .run(),
    removeBefore: (queuedAt: string) =>
      db
        .delete(mails)
        .where(and(isNull(mails.nextAttemptAt), lt(mails.queuedAt, queuedAt)))
        .run(),
  };
}
