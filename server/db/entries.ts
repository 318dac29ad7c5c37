import { and, asc, count, eq, gt, ne, sql } from "drizzle-orm";
import type { StoredEntry } from "../../shared/schemas/entry.ts";
import type { Database } from "./open-database.ts";
import { bikes, entries, users } from "./schema.ts";

export type EntryRow = typeof entries.$inferSelect;

/** The author of an entry whose account is no more. */
const FORMER_MEMBER = "Former member";

const sentColumns = {
  rev: entries.rev,
  id: entries.id,
  bikeId: entries.bikeId,
  kind: entries.kind,
  v: entries.v,
  at: entries.at,
  hours: entries.hours,
  body: entries.body,
  authorId: entries.authorId,
  authorName: users.name,
  receivedAt: entries.receivedAt,
};
type SentRow = Omit<EntryRow, "rev"> & { rev: number; authorName: string | null };

/** An entry to the letter as its phone made it, with what the server adds. */
const sent = ({ authorId, authorName, receivedAt, rev, ...entry }: SentRow): StoredEntry => ({
  ...entry,
  author: { id: authorId, name: authorName ?? FORMER_MEMBER },
  receivedAt,
  rev,
});

export function createEntries(db: Database) {
  const { placeholder } = sql;
  const byId = db
    .select()
    .from(entries)
    .where(eq(entries.id, placeholder("id")))
    .prepare();
  const insert = db
    .insert(entries)
    .values({
      id: placeholder("id"),
      bikeId: placeholder("bikeId"),
      kind: placeholder("kind"),
      v: placeholder("v"),
      at: placeholder("at"),
      hours: placeholder("hours"),
      body: placeholder("body"),
      authorId: placeholder("authorId"),
      receivedAt: placeholder("receivedAt"),
    })
    .prepare();
  const ofBikeAfter = db
    .select(sentColumns)
    .from(entries)
    .leftJoin(users, eq(users.id, entries.authorId))
    .where(and(eq(entries.bikeId, placeholder("bikeId")), gt(entries.rev, placeholder("afterRev"))))
    .orderBy(asc(entries.rev))
    .limit(placeholder("limit"))
    .prepare();
  const countOfBike = db
    .select({ rows: count() })
    .from(entries)
    .where(eq(entries.bikeId, placeholder("bikeId")))
    .prepare();

  return {
    find: (id: string): EntryRow | undefined => byId.get({ id }),
    add: (entry: Omit<EntryRow, "rev">) => insert.run(entry),
    /**
     * Every phone that has an entry of this account is sent it again: each gets a new `rev`, of the
     * one counter, in the order they had.
     */
    sendAgain(authorId: string): void {
      const written = eq(entries.authorId, authorId);
      const rows = db.select().from(entries).where(written).orderBy(asc(entries.rev)).all();
      db.delete(entries).where(written).run();
      for (const { rev: _rev, ...entry } of rows) insert.run(entry);
    },
    countOf: (bikeId: string): number => countOfBike.get({ bikeId })?.rows ?? 0,
    /** Ascending by `rev`. */
    ofBike: (bikeId: string, afterRev = 0, limit = -1): StoredEntry[] =>
      ofBikeAfter.all({ bikeId, afterRev, limit }).map(sent),
    /** What an account wrote in the logs of other people's bikes. Reads every entry there is. */
    writtenElsewhere: (authorId: string): StoredEntry[] =>
      db
        .select(sentColumns)
        .from(entries)
        .innerJoin(bikes, eq(bikes.id, entries.bikeId))
        .leftJoin(users, eq(users.id, entries.authorId))
        .where(and(eq(entries.authorId, authorId), ne(bikes.ownerId, authorId)))
        .orderBy(asc(entries.rev))
        .all()
        .map(sent),
    removeOf: (bikeId: string) => db.delete(entries).where(eq(entries.bikeId, bikeId)).run(),
  };
}
