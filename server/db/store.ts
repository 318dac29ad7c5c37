import { createBikeSummaries } from "./bike-summaries.ts";
import { createBikes } from "./bikes.ts";
import { createEntries } from "./entries.ts";
import { createEpoch } from "./epoch.ts";
import { createErasedIds } from "./erased-ids.ts";
import { createErasureRecord } from "./erasure-record.ts";
import { createMailedTokens } from "./mailed-tokens.ts";
import type { Database } from "./open-database.ts";
import { createUsers } from "./users.ts";

/** All that the server keeps, its statements prepared once. */
export function createStore(db: Database, dataDir: string) {
  return {
    users: createUsers(db),
    mailedTokens: createMailedTokens(db),
    bikes: createBikes(db),
    entries: createEntries(db),
    bikeSummaries: createBikeSummaries(db),
    erasedIds: createErasedIds(db),
    erasureRecord: createErasureRecord(dataDir),
    epoch: createEpoch(db),
    /** All of `work` or nothing of it. Never an async function: it would run after the commit. */
    write: <T>(work: () => T): T => db.transaction(work, { behavior: "immediate" }),
    /** `work` sees one state of the database. */
    read: <T>(work: () => T): T => db.transaction(work),
    /** Throws where the database cannot be read. */
    ping: () => db.$client.prepare("SELECT 1").get(),
  };
}

export type Store = ReturnType<typeof createStore>;
