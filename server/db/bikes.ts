import { eq, sql } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { bikes } from "./schema.ts";

export function createBikes(db: Database) {
  const ownerById = db
    .select({ ownerId: bikes.ownerId })
    .from(bikes)
    .where(eq(bikes.id, sql.placeholder("id")))
    .prepare();
  const idsByOwner = db
    .select({ id: bikes.id })
    .from(bikes)
    .where(eq(bikes.ownerId, sql.placeholder("ownerId")))
    .orderBy(bikes.id)
    .prepare();

  return {
    ownerOf: (id: string): string | undefined => ownerById.get({ id })?.ownerId,
    idsOf: (ownerId: string): string[] => idsByOwner.all({ ownerId }).map((bike) => bike.id),
    allIds: (): string[] =>
      db
        .select({ id: bikes.id })
        .from(bikes)
        .all()
        .map((bike) => bike.id),
    add: (id: string, ownerId: string) => db.insert(bikes).values({ id, ownerId }).run(),
    remove: (id: string) => db.delete(bikes).where(eq(bikes.id, id)).run(),
  };
}
