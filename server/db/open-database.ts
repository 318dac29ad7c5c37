import SQLite from "better-sqlite3";
import { drizzle } from "drizzle-orm/better-sqlite3";
import { mkdirSync } from "node:fs";
import path from "node:path";

/** How long a statement waits for another process (a backup, a rebuild) before SQLITE_BUSY. */
const BUSY_TIMEOUT_MS = 5_000;

/**
 * What every connection must be set to, with what SQLite answers when it is. better-sqlite3 opens
 * a WAL file with synchronous=NORMAL, which may lose the last commits with the power.
 */
const pragmas = [
  { name: "journal_mode", set: "WAL", answers: "wal" },
  { name: "synchronous", set: "FULL", answers: 2 },
  { name: "foreign_keys", set: "ON", answers: 1 },
  { name: "busy_timeout", set: String(BUSY_TIMEOUT_MS), answers: BUSY_TIMEOUT_MS },
] as const;

export function assertPragmas(client: SQLite.Database): void {
  for (const { name, answers } of pragmas) {
    const answer: unknown = client.pragma(name, { simple: true });
    if (answer !== answers) throw new Error(`SQLite runs with ${name}=${String(answer)}.`);
  }
}

function connect(file: string): SQLite.Database {
  mkdirSync(path.dirname(file), { recursive: true });
  const client = new SQLite(file);
  for (const { name, set } of pragmas) client.pragma(`${name}=${set}`);
  assertPragmas(client);
  return client;
}

/** The only way to a connection. Column names are the schema's in snake_case. */
export const openDatabase = (file: string) => drizzle(connect(file), { casing: "snake_case" });

/** To look into a database that no server uses, and leave it as it is. */
export const openReadOnly = (file: string) =>
  drizzle(new SQLite(file, { readonly: true, fileMustExist: true }), { casing: "snake_case" });

export type Database = ReturnType<typeof openDatabase>;

export const databaseFile = (dataDir: string) => path.join(dataDir, "sumpless.sqlite");
