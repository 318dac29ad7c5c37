import { eq, isNull, sql } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { bikes, lineUpFacts } from "./schema.ts";

export type LineUpFactsRow = typeof lineUpFacts.$inferInsert;

export function createLineUpFacts(db: Database) {
  const byBike = db
    .select({
      rank: lineUpFacts.rank,
      dueInHours: lineUpFacts.dueInHours,
      json: sql<string>`${lineUpFacts.facts}`,
    })
    .from(lineUpFacts)
    .where(eq(lineUpFacts.bikeId, sql.placeholder("bikeId")))
    .prepare();

  return {
    find: (bikeId: string) => byBike.get({ bikeId }),
    /** Bikes summarised before there were Line-ups. */
    missing: (): string[] =>
      db
        .select({ id: bikes.id })
        .from(bikes)
        .leftJoin(lineUpFacts, eq(lineUpFacts.bikeId, bikes.id))
        .where(isNull(lineUpFacts.bikeId))
        .all()
        .map(({ id }) => id),
    put: (row: LineUpFactsRow) =>
      db
        .insert(lineUpFacts)
        .values(row)
        .onConflictDoUpdate({ target: lineUpFacts.bikeId, set: row })
        .run(),
    remove: (bikeId: string) => db.delete(lineUpFacts).where(eq(lineUpFacts.bikeId, bikeId)).run(),
  };
}
