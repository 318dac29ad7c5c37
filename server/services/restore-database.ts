import { copyFileSync, existsSync, mkdirSync, renameSync } from "node:fs";
import path from "node:path";
import { assertIntegrity, backupName, backupsDir } from "../db/back-up-database.ts";
import { migrateDatabase } from "../db/migrate-database.ts";
import { databaseFile, openDatabase, openReadOnly, type Database } from "../db/open-database.ts";
import { createMails } from "../db/mails.ts";
import { createSessionRows } from "../db/sessions.ts";
import { createStore } from "../db/store.ts";
import { replayErasures } from "./erase.ts";
import { rebuildSummaries } from "./summarise-bike.ts";

/** Gathers a database into its one file; fails while a server uses it. A damaged one stays as it is. */
function gather(file: string): void {
  try {
    const { $client } = openDatabase(file);
    // Leaving WAL needs the database to itself.
    $client.pragma("journal_mode=DELETE");
    $client.close();
  } catch (error) {
    if (String((error as { code?: unknown }).code).startsWith("SQLITE_BUSY"))
      throw new Error("The database is in use: stop the server first.", { cause: error });
  }
}

/** Moves the present database out of the way; null where there is none. */
function setAsideDatabase(dataDir: string): string | null {
  const file = databaseFile(dataDir);
  if (!existsSync(file)) return null;
  gather(file);
  const aside = path.join(backupsDir(dataDir), backupName("before-restore"));
  mkdirSync(path.dirname(aside), { recursive: true });
  for (const part of ["", "-wal", "-shm"])
    if (existsSync(file + part)) renameSync(file + part, aside + part);
  return aside;
}

/** What the database that was there says; null where there is none, or none that is sound. */
function askSetAside<T>(setAside: string | null, ask: (database: Database) => T): T | null {
  if (setAside === null) return null;
  try {
    assertIntegrity(setAside);
    const database = openReadOnly(setAside);
    try {
      return ask(database);
    } finally {
      database.$client.close();
    }
  } catch {
    return null;
  }
}

/**
 * Puts a backup in the database's place and readies it to be healed by the phones: a new epoch, so
 * that they send their entries again; and what was erased since the backup, erased again. Sessions
 * and mails stay those of the database that was there: by the backup's, a session ended since would
 * be back, and a mail sent since would go out again. Where that database tells nothing, all sessions
 * have ended, and the mails are the backup's.
 */
export async function restoreDatabase(dataDir: string, backup: string) {
  assertIntegrity(backup);
  const setAside = setAsideDatabase(dataDir);
  const file = databaseFile(dataDir);
  mkdirSync(dataDir, { recursive: true });
  copyFileSync(backup, `${file}.restoring`);
  renameSync(`${file}.restoring`, file);

  const database = openDatabase(file);
  await migrateDatabase(database, backupsDir(dataDir));
  const store = createStore(database, dataDir);
  const kept = askSetAside(setAside, (before) => ({
    sessions: createSessionRows(before).all(),
    mails: createMails(before).all(),
  }));
  store.write(() => {
    createSessionRows(database).replaceAll(kept?.sessions ?? []);
    if (kept) store.mails.replaceAll(kept.mails);
  });
  store.epoch.renew();
  const erasures = replayErasures(store);
  rebuildSummaries(store);
  database.$client.close();
  return { setAside, erasures, signedOut: kept === null };
}
