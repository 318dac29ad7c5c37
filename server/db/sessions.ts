import { and, desc, eq, gt, lte, ne } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { sessions } from "./schema.ts";
import { accountIds } from "./users.ts";

export type SessionRow = typeof sessions.$inferSelect;

/** What is kept of a session for its account to see; the session itself is Lucia's. */
export function createSessionRows(db: Database) {
  const { id, signedInAt, seenAt, device: name } = sessions;
  const mine = (userId: string) => eq(sessions.userId, userId);

  return {
    add: (session: SessionRow) => db.insert(sessions).values(session).run(),
    /** Those that have not run out; the last one seen comes first. */
    of: (userId: string, nowSeconds: number) =>
      db
        .select({ id, name, signedInAt, seenAt })
        .from(sessions)
        .where(and(mine(userId), gt(sessions.expiresAt, nowSeconds)))
        .orderBy(desc(seenAt), id)
        .all(),
    markSeen: (sessionId: string, at: string) =>
      db.update(sessions).set({ seenAt: at }).where(eq(id, sessionId)).run(),
    /** False where the account has no such session. */
    remove: (userId: string, sessionId: string): boolean =>
      db
        .delete(sessions)
        .where(and(mine(userId), eq(id, sessionId)))
        .run().changes === 1,
    removeAnyones: (sessionId: string) => db.delete(sessions).where(eq(id, sessionId)).run(),
    removeExpired: (nowSeconds: number) =>
      db.delete(sessions).where(lte(sessions.expiresAt, nowSeconds)).run(),
    removeOthers: (userId: string, keptId: string) =>
      db
        .delete(sessions)
        .where(and(mine(userId), ne(id, keptId)))
        .run(),
    removeOf: (userId: string) => db.delete(sessions).where(mine(userId)).run(),
    removeAll: () => db.delete(sessions).run(),
    all: (): SessionRow[] => db.select().from(sessions).all(),
    /** Those and no others, of accounts that there are. */
    replaceAll(rows: SessionRow[]): void {
      const accounts = accountIds(db);
      db.delete(sessions).run();
      for (const row of rows) if (accounts.has(row.userId)) db.insert(sessions).values(row).run();
    },
  };
}
