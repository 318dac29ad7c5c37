import { eq, sql } from "drizzle-orm";
import type { Reminders } from "../../shared/schemas/reminders.ts";
import type { Database } from "./open-database.ts";
import { reminders } from "./schema.ts";

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
    removeOf: (userId: string) => db.delete(reminders).where(eq(reminders.userId, userId)).run(),
  };
}
