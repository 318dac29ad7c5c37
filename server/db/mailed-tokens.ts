import { and, count, eq, gt, lte } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { mailedTokens, type tokenPurposes } from "./schema.ts";

export type TokenPurpose = (typeof tokenPurposes)[number];
type TokenRow = typeof mailedTokens.$inferSelect;

export function createMailedTokens(db: Database) {
  const of = (userId: string, purpose: TokenPurpose) =>
    and(eq(mailedTokens.userId, userId), eq(mailedTokens.purpose, purpose));

  return {
    add: (token: TokenRow) => db.insert(mailedTokens).values(token).run(),
    find: (hash: string, purpose: TokenPurpose): TokenRow | undefined =>
      db
        .select()
        .from(mailedTokens)
        .where(and(eq(mailedTokens.hash, hash), eq(mailedTokens.purpose, purpose)))
        .get(),
    countLive: (userId: string, purpose: TokenPurpose, now: number): number =>
      db
        .select({ live: count() })
        .from(mailedTokens)
        .where(and(of(userId, purpose), gt(mailedTokens.expiresAt, now)))
        .get()?.live ?? 0,
    removeOf: (userId: string, purpose: TokenPurpose) =>
      db.delete(mailedTokens).where(of(userId, purpose)).run(),
    removeExpired: (now: number) =>
      db.delete(mailedTokens).where(lte(mailedTokens.expiresAt, now)).run(),
  };
}
