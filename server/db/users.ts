import { and, eq, sql } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { mailedTokens, sessions, users } from "./schema.ts";

export type UserRow = typeof users.$inferSelect;

/** Two spellings of an address that differ by case alone are one address. */
const sameEmail = sql`lower(${users.email}) = lower(${sql.placeholder("email")})`;

export const accountIds = (db: Database): Set<string> => {
  const rows = db.select({ id: users.id }).from(users).all();
  return new Set(rows.map(({ id }) => id));
};

export function createUsers(db: Database) {
  const byId = db
    .select()
    .from(users)
    .where(eq(users.id, sql.placeholder("id")))
    .prepare();
  const byEmail = db.select().from(users).where(sameEmail).prepare();

  return {
    find: (id: string): UserRow | undefined => byId.get({ id }),
    findByEmail: (email: string): UserRow | undefined => byEmail.get({ email }),
    /** False where the address is taken. */
    add: (user: UserRow): boolean =>
      db.insert(users).values(user).onConflictDoNothing().run().changes === 1,
    markVerified: (id: string) =>
      db.update(users).set({ verified: true }).where(eq(users.id, id)).run(),
    setEmail: (id: string, email: string) =>
      db.update(users).set({ email }).where(eq(users.id, id)).run(),
    setPasswordHash: (id: string, passwordHash: string) =>
      db.update(users).set({ passwordHash }).where(eq(users.id, id)).run(),
    /** Of the same password: one that was chosen meanwhile stays. */
    replacePasswordHash: (id: string, last: string, passwordHash: string) =>
      db
        .update(users)
        .set({ passwordHash })
        .where(and(eq(users.id, id), eq(users.passwordHash, last)))
        .run(),
    /** The account with its sessions and the links mailed to it. */
    remove(id: string): void {
      db.delete(sessions).where(eq(sessions.userId, id)).run();
      db.delete(mailedTokens).where(eq(mailedTokens.userId, id)).run();
      db.delete(users).where(eq(users.id, id)).run();
    },
  };
}
