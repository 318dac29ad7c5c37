import { copyFileSync, existsSync, mkdirSync, realpathSync, renameSync, rmSync } from "node:fs";
import path from "node:path";
import { assertIntegrity, assertOurs, backupName, backupsDir } from "../db/back-up-database.ts";
import { migrateDatabase } from "../db/migrate-database.ts";
import { databaseFile, openDatabase, openReadOnly, type Database } from "../db/open-database.ts";
import { createMails } from "../db/mails.ts";
import { createReminders } from "../db/reminders.ts";
import { createSessionRows } from "../db/sessions.ts";
import { createStore } from "../db/store.ts";
import { replayErasures } from "./erase.ts";
import { rebuildSummaries } from "./summarise-bike.ts";

/**
 * Gathers a database into its one file, and keeps it from everyone else until it is closed: a server
 * that is started meanwhile finds it locked. Fails while a server uses it; null where it is damaged.
 */
function hold(file: string): Database["$client"] | null {
  let client: Database["$client"] | undefined;
  try {
    client = openDatabase(file).$client;
    client.pragma("locking_mode=EXCLUSIVE");
    // Leaving WAL needs the database to itself.
    client.pragma("journal_mode=DELETE");
    client.exec("BEGIN EXCLUSIVE; COMMIT");
    return client;
  } catch (error) {
    client?.close();
    if (String((error as { code?: unknown }).code).startsWith("SQLITE_BUSY"))
      throw new Error("The database is in use: stop the server first.", { cause: error });
    return null;
  }
}

/** What a database may leave beside it while it is in use, or once it is damaged. */
const journalsOf = (file: string) => ["-wal", "-shm", "-journal"].map((part) => file + part);

function remove(files: string[]): void {
  for (const file of files) rmSync(file, { force: true });
}

/**
 * Copies the database that was there aside: a held one by the connection that holds it, since POSIX
 * frees a file as soon as its process has closed it anywhere.
 */
async function copyAside(dataDir: string, held: Database["$client"] | null): Promise<string> {
  const file = databaseFile(dataDir);
  const aside = path.join(backupsDir(dataDir), backupName("before-restore"));
  mkdirSync(path.dirname(aside), { recursive: true });
  if (held) await held.backup(aside);
  else {
    const copies = [aside, ...journalsOf(aside)];
    for (const [index, part] of [file, ...journalsOf(file)].entries())
      if (existsSync(part)) copyFileSync(part, copies[index]!);
  }
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

/** With what its WAL holds, where it was copied from a running server by other means than ours. */
async function copyBackup(backup: string, copy: string): Promise<void> {
  const { $client } = openReadOnly(backup);
  try {
    await $client.backup(copy);
  } finally {
    $client.close();
  }
}

/** A copy of the backup, healed of what it does not know; how it went. */
async function ready(dataDir: string, readied: string, setAside: string | null) {
  const database = openDatabase(readied);
  await migrateDatabase(database, backupsDir(dataDir));
  const store = createStore(database, dataDir);
  const kept = askSetAside(setAside, (before) => ({
    sessions: createSessionRows(before).all(),
    reminders: createReminders(before).all(),
    mails: createMails(before).all(),
  }));
  store.write(() => {
    createSessionRows(database).replaceAll(kept?.sessions ?? []);
    store.mailedTokens.removeAll();
    if (kept) {
      store.reminders.replaceAll(kept.reminders);
      store.mails.replaceAll(kept.mails);
    }
    store.mails.withdrawDeadLinks();
  });
  store.epoch.renew();
  const erasures = replayErasures(store);
  rebuildSummaries(store);
  database.$client.pragma("journal_mode=DELETE");
  database.$client.close();
  return { erasures, signedOut: kept === null };
}

function assertOther(backup: string, file: string): void {
  if (existsSync(file) && realpathSync(backup) === realpathSync(file))
    throw new Error(`${backup} is the database itself: say which backup to restore.`);
}

/**
 * Puts a backup in the database's place and readies it to be healed by the phones: a new epoch, so
 * that they send their entries again; and what was erased since the backup, erased again. Sessions,
 * mails and who wants them stay those of the database that was there: by the backup's, a session
 * ended since would be back, a mail sent since would go out again, and one unsubscribed from too.
 * Where that database tells nothing, all sessions have ended, and the rest is the backup's. Links
 * mailed before are void: one of the backup's may have been used since.
 *
 * All this is done to a copy, which then takes the database's place at once: a restore cut short has
 * changed nothing. The database that was there is held until then, so that no server takes entries
 * into it that would be gone. One that waited for it cannot go on: SQLite writes to no file that was
 * moved away.
 */
export async function restoreDatabase(dataDir: string, backup: string) {
  const file = databaseFile(dataDir);
  const readied = `${file}.restoring`;
  assertIntegrity(backup);
  assertOurs(backup);
  assertOther(backup, file);
  const wasThere = existsSync(file);
  const held = hold(file);
  try {
    const setAside = wasThere ? await copyAside(dataDir, held) : null;
    remove([readied, ...journalsOf(readied)]);
    await copyBackup(backup, readied);
    const outcome = await ready(dataDir, readied, setAside);
    remove(journalsOf(file));
    renameSync(readied, file);
    return { setAside, ...outcome };
  } finally {
    held?.close();
  }
}
