import { and, eq, gt, isNotNull, lte, notExists, or, sql } from "drizzle-orm";
import type { Due } from "../../shared/schemas/summary.ts";
import type { Database } from "./open-database.ts";
import { bikes, bikeSummaries, mails, reminders, users } from "./schema.ts";

/** A bike whose check is due, and who is to be told. */
export interface DueBike {
  bikeId: string;
  name: string;
  due: Due;
  readAt: string | null;
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
        eq(mails.bikeId, bikeSummaries.bikeId),
        eq(mails.topic, "due"),
        gt(mails.queuedAt, placeholder("remindedSince")),
      ),
    );
  const found = db
    .select({
      bikeId: bikeSummaries.bikeId,
      name: bikeSummaries.name,
      due: sql<string>`json_extract(${bikeSummaries.summary}, '$.due')`,
      readAt: sql<string | null>`json_extract(${bikeSummaries.summary}, '$.hours.readAt')`,
      userId: users.id,
      email: users.email,
    })
    .from(bikeSummaries)
    .innerJoin(bikes, eq(bikes.id, bikeSummaries.bikeId))
    .innerJoin(users, eq(users.id, bikes.ownerId))
    .leftJoin(reminders, eq(reminders.userId, users.id))
    .where(
      and(
        or(
          lte(bikeSummaries.dueInHours, placeholder("inHours")),
          lte(bikeSummaries.dueOn, placeholder("onDate")),
        ),
        eq(bikeSummaries.retired, false),
        // A bike that was never checked is not late for anything.
        isNotNull(bikeSummaries.lastCheckAt),
        eq(users.verified, true),
        sql`coalesce(${reminders.dueMails}, 1) = 1`,
        notExists(remindedSince),
      ),
    )
    .prepare();

  return {
    /** Due within so many hours or by a date, with nothing sent about the bike since an instant. */
    find: (limits: { inHours: number; onDate: string; remindedSince: string }): DueBike[] =>
      found.all(limits).map(({ due, ...bike }) => ({ ...bike, due: JSON.parse(due) as Due })),
  };
}
