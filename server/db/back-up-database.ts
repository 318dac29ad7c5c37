import SQLite from "better-sqlite3";
import { mkdirSync, renameSync } from "node:fs";
import path from "node:path";

/** Throws unless SQLite finds every page, index and reference of the file in order. */
export function assertIntegrity(file: string): void {
  const copy = new SQLite(file, { readonly: true, fileMustExist: true });
  try {
    const found: unknown = copy.pragma("integrity_check", { simple: true });
    if (found !== "ok") throw new Error(`${file} is damaged: ${String(found)}`);
    const orphans = copy.pragma("foreign_key_check") as unknown[];
    if (orphans.length > 0) throw new Error(`${file} holds ${orphans.length} rows of no parent.`);
  } finally {
    copy.close();
  }
}

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
