import { eq, sql } from "drizzle-orm";
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

  return {
    jsonOf: (bikeId: string): string | undefined => byBike.get({ bikeId })?.json,
    jsonsOfOwner: (ownerId: string): string[] => byOwner.all({ ownerId }).map((row) => row.json),
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
