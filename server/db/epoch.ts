import { eq } from "drizzle-orm";
import { randomUUID } from "node:crypto";
import type { Database } from "./open-database.ts";
import { meta } from "./schema.ts";

const KEY = "epoch";

/** Which life of the database this is: phones that see another one send their entries again. */
export function createEpoch(db: Database) {
  const read = db.select().from(meta).where(eq(meta.key, KEY)).prepare();
  const renew = (): string => {
    const value = randomUUID();
    db.insert(meta)
      .values({ key: KEY, value })
      .onConflictDoUpdate({ target: meta.key, set: { value } })
      .run();
    return value;
  };
  if (!read.get()) renew();
  return { current: () => read.get()!.value, renew };
}
