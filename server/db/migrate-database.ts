import type SQLite from "better-sqlite3";
import { migrate } from "drizzle-orm/better-sqlite3/migrator";
import { readMigrationFiles } from "drizzle-orm/migrator";
import path from "node:path";
import { projectRoot } from "../project-root.ts";
import { backUpDatabase, backupName } from "./back-up-database.ts";
import type { Database } from "./open-database.ts";

const MIGRATIONS_TABLE = "__drizzle_migrations";
export const migrationsFolder = path.join(projectRoot, "drizzle");

const quoted = (table: string) => `"${table.replaceAll('"', '""')}"`;

function countRows(client: SQLite.Database): Map<string, number> {
  const tables = client
    .prepare<[], string>(
      "SELECT name FROM sqlite_schema WHERE type='table' AND name NOT LIKE 'sqlite_%'",
    )
    .pluck()
    .all()
    .filter((table) => table !== MIGRATIONS_TABLE);
  const count = (table: string) =>
    client
      .prepare<[], number>(`SELECT count(*) FROM ${quoted(table)}`)
      .pluck()
      .get() ?? 0;
  return new Map(tables.map((table) => [table, count(table)]));
}

function appliedUntil(client: SQLite.Database): number {
  const known = client.prepare("SELECT 1 FROM sqlite_schema WHERE name=?").get(MIGRATIONS_TABLE);
  if (!known) return 0;
  const last = client.prepare(`SELECT max(created_at) FROM ${MIGRATIONS_TABLE}`).pluck().get();
  return Number(last ?? 0);
}

/** Tables may come and go in a migration; one that stays never holds fewer rows afterwards. */
function assertNothingLost(before: Map<string, number>, client: SQLite.Database): void {
  const after = countRows(client);
  for (const [table, rows] of before) {
    const left = after.get(table) ?? rows;
    if (left < rows) throw new Error(`Of ${rows} rows of ${table}, a migration left ${left}.`);
  }
  const orphans = client.pragma("foreign_key_check") as unknown[];
  if (orphans.length > 0) throw new Error(`A migration left ${orphans.length} rows of no parent.`);
}

/**
 * Brings the database up to date. Foreign keys are off meanwhile: with them on, the rebuild of a
 * table cascades to its child rows, and the switch inside the generated SQL does nothing in its
 * transaction. A database that already holds rows is backed up into `backupsDir` first.
 */
export async function migrateDatabase(
  database: Database,
  backupsDir: string,
  folder = migrationsFolder,
): Promise<void> {
  const client = database.$client;
  const applied = appliedUntil(client);
  if (readMigrationFiles({ migrationsFolder: folder }).every((m) => m.folderMillis <= applied))
    return;

  const before = countRows(client);
  if ([...before.values()].some((rows) => rows > 0))
    await backUpDatabase(client, path.join(backupsDir, backupName("before-migration")));
  client.pragma("foreign_keys=OFF");
  try {
    migrate(database, { migrationsFolder: folder });
    assertNothingLost(before, client);
  } finally {
    client.pragma("foreign_keys=ON");
  }
}
