import { and, eq, gt, lte, ne, notExists, or, sql } from "drizzle-orm";
import { lineUpOrder, type LineUpFacts } from "../../shared/schemas/club.ts";
import type { Database } from "./open-database.ts";
import { bikes, lineUpFacts, mails, reminders, users } from "./schema.ts";

/** A bike whose check is due, and who is to be told. */
export interface DueBike {
  facts: LineUpFacts;
  userId: string;
  email: string;
}

export function createDueBikes(db: Database) {
  const { placeholder } = sql;
  const remindedSince = db
    .select({ id: mails.id })
    .from(mails)
    .where(
      and(
        eq(mails.bikeId, lineUpFacts.bikeId),
        eq(mails.topic, "due"),
        // One that waited for the mail server is news from when it was sent.
        gt(sql`coalesce(${mails.sentAt}, ${mails.queuedAt})`, placeholder("remindedSince")),
      ),
    );
  const found = db
    .select({ facts: lineUpFacts.facts, userId: users.id, email: users.email })
    .from(lineUpFacts)
    .innerJoin(bikes, eq(bikes.id, lineUpFacts.bikeId))
    .innerJoin(users, eq(users.id, bikes.ownerId))
    .leftJoin(reminders, eq(reminders.userId, users.id))
    .where(
      and(
        or(
          lte(lineUpFacts.dueInHours, placeholder("inHours")),
          lte(lineUpFacts.dueOn, placeholder("onDate")),
        ),
        ne(lineUpFacts.rank, lineUpOrder.indexOf("retired")),
        // A bike that was never checked is not late for anything.
        sql`json_extract(${lineUpFacts.facts}, '$.lastCheckAt') IS NOT NULL`,
        eq(users.verified, true),
        sql`coalesce(${reminders.dueMails}, 1) = 1`,
        notExists(remindedSince),
      ),
    )
    .prepare();

  return {
    /** Due within so many hours or by a date, with nothing sent about the bike since an instant. */
    find: (limits: { inHours: number; onDate: string; remindedSince: string }): DueBike[] =>
      found.all(limits),
  };
}
