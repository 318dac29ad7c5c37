import { and, asc, eq, gt, lte, sql } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { clubInvites } from "./schema.ts";

export type InviteRow = typeof clubInvites.$inferSelect;

export function createClubInvites(db: Database) {
  return {
    add: (invite: InviteRow) => db.insert(clubInvites).values(invite).run(),
    findByHash: (hash: string): InviteRow | undefined =>
      db.select().from(clubInvites).where(eq(clubInvites.hash, hash)).get(),
    /** Those that someone may still join by, the oldest first. */
    liveOf: (clubId: string, now: string): InviteRow[] =>
      db
        .select()
        .from(clubInvites)
        .where(
          and(
            eq(clubInvites.clubId, clubId),
            gt(clubInvites.usesLeft, 0),
            gt(clubInvites.expiresAt, now),
          ),
        )
        .orderBy(asc(clubInvites.createdAt), asc(clubInvites.id))
        .all(),
    idsOf: (clubId: string): string[] =>
      db
        .select({ id: clubInvites.id })
        .from(clubInvites)
        .where(eq(clubInvites.clubId, clubId))
        .all()
        .map(({ id }) => id),
    takeUse: (id: string) =>
      db
        .update(clubInvites)
        .set({ usesLeft: sql`${clubInvites.usesLeft} - 1` })
        .where(eq(clubInvites.id, id))
        .run(),
    /** False where the club has no such invite. */
    remove: (clubId: string, id: string): boolean =>
      db
        .delete(clubInvites)
        .where(and(eq(clubInvites.clubId, clubId), eq(clubInvites.id, id)))
        .run().changes === 1,
    removeExpired: (clubId: string, now: string) =>
      db
        .delete(clubInvites)
        .where(and(eq(clubInvites.clubId, clubId), lte(clubInvites.expiresAt, now)))
        .run(),
  };
}
