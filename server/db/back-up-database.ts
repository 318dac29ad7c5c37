import SQLite from "better-sqlite3";
import { mkdirSync, renameSync } from "node:fs";
import path from "node:path";

function lookInto(file: string, look: (copy: SQLite.Database) => void): void {
  const copy = new SQLite(file, { readonly: true, fileMustExist: true });
  try {
    look(copy);
  } finally {
    copy.close();
  }
}

/** Throws unless SQLite finds every page, index and reference of the file in order. */
export const assertIntegrity = (file: string): void =>
  lookInto(file, (copy) => {
    const found: unknown = copy.pragma("integrity_check", { simple: true });
    if (found !== "ok") throw new Error(`${file} is damaged: ${String(found)}`);
    const orphans = copy.pragma("foreign_key_check") as unknown[];
    if (orphans.length > 0) throw new Error(`${file} holds ${orphans.length} rows of no parent.`);
  });

/** There from the first version on. */
const ownTables = ["__drizzle_migrations", "users", "bikes", "entries"];

/** Throws unless the file is a database of ours: to SQLite an empty file is a sound one too. */
export const assertOurs = (file: string): void =>
  lookInto(file, (copy) => {
    const tables = copy.prepare<[], string>("SELECT name FROM sqlite_schema").pluck().all();
    if (!ownTables.every((name) => tables.includes(name)))
      throw new Error(`${file} is no backup of Sumpless: it holds no accounts and logbooks.`);
  });

/** Out of WAL mode a database is one file, and stays one however it is looked at. */
function intoOneFile(file: string): void {
  const copy = new SQLite(file, { fileMustExist: true });
  copy.pragma("journal_mode=DELETE");
  copy.close();
}

/** Copies a database that may be in use. The copy bears its name only once it is found sound. */
export async function backUpDatabase(client: SQLite.Database, file: string): Promise<void> {
  mkdirSync(path.dirname(file), { recursive: true });
  const unchecked = `${file}.unchecked`;
  await client.backup(unchecked);
  intoOneFile(unchecked);
  assertIntegrity(unchecked);
  renameSync(unchecked, file);
}

export const backupsDir = (dataDir: string) => path.join(dataDir, "backups");

/** A name for a backup made now: sorts by time, holds no character that a file system refuses. */
export const backupName = (why: string) =>
  `${new Date().toISOString().replaceAll(":", "-")}-${why}.sqlite`;
