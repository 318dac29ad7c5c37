import { eq, sql } from "drizzle-orm";
import type { Reminders } from "../../shared/schemas/reminders.ts";
import type { Database } from "./open-database.ts";
import { reminders } from "./schema.ts";
import { accountIds } from "./users.ts";

type ReminderRow = typeof reminders.$inferSelect;

const all: Reminders = { dueMails: true, stopMails: true };

export function createReminders(db: Database) {
  const byUser = db
    .select({ dueMails: reminders.dueMails, stopMails: reminders.stopMails })
    .from(reminders)
    .where(eq(reminders.userId, sql.placeholder("userId")))
    .prepare();

  return {
    of: (userId: string): Reminders => byUser.get({ userId }) ?? all,
    put: (userId: string, wanted: Reminders) =>
      db
        .insert(reminders)
        .values({ userId, ...wanted })
        .onConflictDoUpdate({ target: reminders.userId, set: wanted })
        .run(),
    all: (): ReminderRow[] => db.select().from(reminders).all(),
    /** Those and no others, of accounts that there are. */
    replaceAll(rows: ReminderRow[]): void {
      const accounts = accountIds(db);
      db.delete(reminders).run();
      for (const row of rows) if (accounts.has(row.userId)) db.insert(reminders).values(row).run();
    },
    removeOf: (userId: string) => db.delete(reminders).where(eq(reminders.userId, userId)).run(),
  };
}
