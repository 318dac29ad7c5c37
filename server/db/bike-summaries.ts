import { eq, isNull, sql } from "drizzle-orm";
import type { BoardPlace } from "./bike-shares.ts";
import type { Database } from "./open-database.ts";
import { bikes, bikeSummaries } from "./schema.ts";

export type BikeSummaryRow = typeof bikeSummaries.$inferInsert;

/** Summaries leave as the JSON text they are kept as: nothing is parsed to be written again. */
const asText = { json: sql<string>`${bikeSummaries.summary}` };

export function createBikeSummaries(db: Database) {
  const byBike = db
    .select(asText)
    .from(bikeSummaries)
    .where(eq(bikeSummaries.bikeId, sql.placeholder("bikeId")))
    .prepare();
  const byOwner = db
    .select(asText)
    .from(bikeSummaries)
    .innerJoin(bikes, eq(bikes.id, bikeSummaries.bikeId))
    .where(eq(bikes.ownerId, sql.placeholder("ownerId")))
    .orderBy(bikeSummaries.name, bikeSummaries.bikeId)
    .prepare();

  const lineUpByBike = db
    .select({ json: sql<string | null>`${bikeSummaries.lineUp}` })
    .from(bikeSummaries)
    .where(eq(bikeSummaries.bikeId, sql.placeholder("bikeId")))
    .prepare();

  return {
    jsonOf: (bikeId: string): string | undefined => byBike.get({ bikeId })?.json,
    jsonsOfOwner: (ownerId: string): string[] => byOwner.all({ ownerId }).map((row) => row.json),
    /** What a Line-up shows of the bike, as it is kept. */
    lineUpJsonOf: (bikeId: string): string | undefined =>
      lineUpByBike.get({ bikeId })?.json ?? undefined,
    placeOf(bikeId: string): BoardPlace | undefined {
      const { rank, dueInHours } = bikeSummaries;
      const place = db.select({ rank, dueInHours }).from(bikeSummaries);
      const row = place.where(eq(bikeSummaries.bikeId, bikeId)).get();
      return row && { ...row, dueInHours: row.dueInHours ?? 0 };
    },
    /** Bikes summarised before there were Line-ups. */
    withoutLineUp: (): string[] =>
      db
        .select({ bikeId: bikeSummaries.bikeId })
        .from(bikeSummaries)
        .where(isNull(bikeSummaries.lineUp))
        .all()
        .map((row) => row.bikeId),
    put: (row: BikeSummaryRow) =>
      db
        .insert(bikeSummaries)
        .values(row)
        .onConflictDoUpdate({ target: bikeSummaries.bikeId, set: row })
        .run(),
    remove: (bikeId: string) =>
      db.delete(bikeSummaries).where(eq(bikeSummaries.bikeId, bikeId)).run(),
  };
}
