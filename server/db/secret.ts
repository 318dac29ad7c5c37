import { eq } from "drizzle-orm";
import { randomBytes } from "node:crypto";
import type { Database } from "./open-database.ts";
import { meta } from "./schema.ts";

const KEY = "secret";

/** What the server signs with; made once, and kept by backups, so that links in old mails go on working. */
export function readSecret(db: Database): Buffer {
  const value = randomBytes(32).toString("base64url");
  db.insert(meta).values({ key: KEY, value }).onConflictDoNothing().run();
  const row = db.select().from(meta).where(eq(meta.key, KEY)).get();
  return Buffer.from(row!.value, "base64url");
}
