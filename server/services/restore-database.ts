import { copyFileSync, existsSync, mkdirSync, renameSync, rmSync } from "node:fs";
import path from "node:path";
import { assertIntegrity, assertOurs, backupName, backupsDir } from "../db/back-up-database.ts";
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

/** A database in WAL mode, or one that is damaged, is up to three files. */
const filesOf = (file: string) => ["", "-wal", "-shm"].map((part) => file + part);

/** Copies the present database aside; null where there is none. */
function setAsideDatabase(dataDir: string): string | null {
  const file = databaseFile(dataDir);
  if (!existsSync(file)) return null;
  gather(file);
  const aside = path.join(backupsDir(dataDir), backupName("before-restore"));
  mkdirSync(path.dirname(aside), { recursive: true });
  const copies = filesOf(aside);
  for (const [index, part] of filesOf(file).entries())
    if (existsSync(part)) copyFileSync(part, copies[index]!);
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
 * have ended, and the mails are the backup's. All this is done to a copy, which then takes the
 * database's place at once: a restore cut short has changed nothing.
 */
export async function restoreDatabase(dataDir: string, backup: string) {
  assertIntegrity(backup);
  assertOurs(backup);
  const setAside = setAsideDatabase(dataDir);
  const file = databaseFile(dataDir);
  const readied = `${file}.restoring`;
  mkdirSync(dataDir, { recursive: true });
  for (const left of filesOf(readied)) rmSync(left, { force: true });
  copyFileSync(backup, readied);

  const database = openDatabase(readied);
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
  gather(readied);
  const [, ...journals] = filesOf(file);
  for (const journal of journals) rmSync(journal, { force: true });
  renameSync(readied, file);
  return { setAside, erasures, signedOut: kept === null };
}
