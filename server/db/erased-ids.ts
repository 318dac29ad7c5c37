import { eq, sql } from "drizzle-orm";
import type { Database } from "./open-database.ts";
import { erasedIds } from "./schema.ts";

export function createErasedIds(db: Database) {
  const byId = db
    .select()
    .from(erasedIds)
    .where(eq(erasedIds.id, sql.placeholder("id")))
    .prepare();
  const insert = db
    .insert(erasedIds)
    .values({ id: sql.placeholder("id") })
    .onConflictDoNothing()
    .prepare();

  return {
    has: (id: string): boolean => byId.get({ id }) !== undefined,
    add: (ids: readonly string[]) => ids.forEach((id) => insert.run({ id })),
  };
}
