import { and, count, eq, gt, inArray, lte } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { mailedTokens, tokenPurposes } from "./schema.ts";

export type TokenPurpose = (typeof tokenPurposes)[number];
export type TokenRow = typeof mailedTokens.$inferSelect;

export function createMailedTokens(db: Database) {
  const of = (userId: string, purposes: readonly TokenPurpose[]) =>
    and(eq(mailedTokens.userId, userId), inArray(mailedTokens.purpose, [...purposes]));

  return {
    add: (token: TokenRow) => db.insert(mailedTokens).values(token).run(),
    find: (hash: string): TokenRow | undefined =>
      db.select().from(mailedTokens).where(eq(mailedTokens.hash, hash)).get(),
    countLive: (userId: string, purpose: TokenPurpose, now: number): number =>
      db
        .select({ live: count() })
        .from(mailedTokens)
        .where(and(of(userId, [purpose]), gt(mailedTokens.expiresAt, now)))
        .get()?.live ?? 0,
    removeOf: (userId: string, purposes: readonly TokenPurpose[] = tokenPurposes) =>
      db.delete(mailedTokens).where(of(userId, purposes)).run(),
    removeAll: () => db.delete(mailedTokens).run(),
    removeExpired: (now: number) =>
      db.delete(mailedTokens).where(lte(mailedTokens.expiresAt, now)).run(),
  };
}
