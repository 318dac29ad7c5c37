import { createBikeShares } from "./bike-shares.ts";
import { createBikeSummaries } from "./bike-summaries.ts";
import { createBikes } from "./bikes.ts";
import { createClubInvites } from "./club-invites.ts";
import { createClubMembers } from "./club-members.ts";
import { createClubs } from "./clubs.ts";
import { createDueBikes } from "./due-bikes.ts";
import { createEntries } from "./entries.ts";
import { createEpoch } from "./epoch.ts";
import { createErasedIds } from "./erased-ids.ts";
import { createErasureRecord } from "./erasure-record.ts";
import { createLineUpFacts } from "./line-up-facts.ts";
import { createMailedTokens } from "./mailed-tokens.ts";
import { createMails } from "./mails.ts";
import type { Database } from "./open-database.ts";
import { createReminders } from "./reminders.ts";
import { readSecret } from "./secret.ts";
import { createUsers } from "./users.ts";

/** All that the server keeps, its statements prepared once. */
export function createStore(db: Database, dataDir: string) {
  return {
    users: createUsers(db),
    mailedTokens: createMailedTokens(db),
    bikes: createBikes(db),
    entries: createEntries(db),
    bikeSummaries: createBikeSummaries(db),
    lineUpFacts: createLineUpFacts(db),
    dueBikes: createDueBikes(db),
    clubs: createClubs(db),
    clubMembers: createClubMembers(db),
    clubInvites: createClubInvites(db),
    bikeShares: createBikeShares(db),
    reminders: createReminders(db),
    mails: createMails(db),
    secret: readSecret(db),
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
