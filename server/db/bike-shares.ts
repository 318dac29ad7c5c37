import { and, asc, eq, inArray, sql } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { bikes, bikeShares, lineUpFacts, clubMembers, clubs, users } from "./schema.ts";

/** Where a bike stands on its boards. */
export interface BoardPlace {
  rank: number;
  dueInHours: number;
}

/** A bike's row of a board as JSON, with where it stands. */
export type BoardRow = BoardPlace & { bikeId: string; json: string };

export function createBikeShares(db: Database) {
  const { placeholder } = sql;
  const mechanicOf = db
    .select({ clubId: clubMembers.clubId })
    .from(bikeShares)
    .innerJoin(clubMembers, eq(clubMembers.clubId, bikeShares.clubId))
    .where(
      and(
        eq(bikeShares.bikeId, placeholder("bikeId")),
        eq(clubMembers.userId, placeholder("userId")),
        eq(clubMembers.mechanic, true),
      ),
    )
    .limit(1)
    .prepare();
  // The order's columns are those of the index: a page costs what it holds, however long the board.
  const board = db
    .select({
      rank: bikeShares.rank,
      dueInHours: bikeShares.dueInHours,
      bikeId: bikeShares.bikeId,
      json: sql<string>`json_insert(${lineUpFacts.facts}, '$.owner',
        json_object('id', ${users.id}, 'name', ${users.name}))`,
    })
    .from(bikeShares)
    .innerJoin(lineUpFacts, eq(lineUpFacts.bikeId, bikeShares.bikeId))
    .innerJoin(bikes, eq(bikes.id, bikeShares.bikeId))
    .innerJoin(users, eq(users.id, bikes.ownerId))
    .where(
      and(
        eq(bikeShares.clubId, placeholder("clubId")),
        sql`(${bikeShares.rank}, ${bikeShares.dueInHours}, ${bikeShares.bikeId})
          > (${placeholder("rank")}, ${placeholder("dueInHours")}, ${placeholder("bikeId")})`,
      ),
    )
    .orderBy(asc(bikeShares.rank), asc(bikeShares.dueInHours), asc(bikeShares.bikeId))
    .limit(placeholder("limit"));
  const boardPage = board.prepare();
  const ownedBy = (userId: string) =>
    db.select({ id: bikes.id }).from(bikes).where(eq(bikes.ownerId, userId));

  return {
    /** Whether the account is mechanic of a club that the bike is shared with. */
    isSeenByMechanic: (bikeId: string, userId: string): boolean =>
      mechanicOf.get({ bikeId, userId }) !== undefined,
    /** The clubs that a bike is shared with. */
    clubsOf: (bikeId: string) =>
      db
        .select({ id: clubs.id, name: clubs.name, since: bikeShares.sharedAt })
        .from(bikeShares)
        .innerJoin(clubs, eq(clubs.id, bikeShares.clubId))
        .where(eq(bikeShares.bikeId, bikeId))
        .orderBy(asc(clubs.name), asc(clubs.id))
        .all(),
    /** The mechanics of all those clubs, each once. */
    mechanicsOf: (bikeId: string): string[] =>
      db
        .selectDistinct({ userId: clubMembers.userId })
        .from(bikeShares)
        .innerJoin(clubMembers, eq(clubMembers.clubId, bikeShares.clubId))
        .where(and(eq(bikeShares.bikeId, bikeId), eq(clubMembers.mechanic, true)))
        .all()
        .map(({ userId }) => userId),
    /** A share that is there already stays as it is. */
    add: (share: { bikeId: string; clubId: string; sharedAt: string } & BoardPlace) =>
      db.insert(bikeShares).values(share).onConflictDoNothing().run(),
    place: (bikeId: string, place: BoardPlace) =>
      db.update(bikeShares).set(place).where(eq(bikeShares.bikeId, bikeId)).run(),
    remove: (bikeId: string, clubId: string) =>
      db
        .delete(bikeShares)
        .where(and(eq(bikeShares.bikeId, bikeId), eq(bikeShares.clubId, clubId)))
        .run(),
    removeAllOf: (bikeId: string) =>
      db.delete(bikeShares).where(eq(bikeShares.bikeId, bikeId)).run(),
    /** What a member shared with a club. */
    removeOfMember: (clubId: string, userId: string) =>
      db
        .delete(bikeShares)
        .where(and(eq(bikeShares.clubId, clubId), inArray(bikeShares.bikeId, ownedBy(userId))))
        .run(),
    /** The rows of a club's board that come after a place, worst first. */
    board: (clubId: string, after: Omit<BoardRow, "json">, limit: number): BoardRow[] =>
      boardPage.all({ clubId, ...after, limit }),
    /** How a board is read, for those who watch over its cost. */
    boardQuery: () => board.toSQL(),
  };
}
