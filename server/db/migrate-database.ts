import type SQLite from "better-sqlite3";
import { sql } from "drizzle-orm";
import { readMigrationFiles, type MigrationMeta } from "drizzle-orm/migrator";
import path from "node:path";
import { projectRoot } from "../project-root.ts";
import { backUpDatabase, backupName } from "./back-up-database.ts";
import type { Database } from "./open-database.ts";

export const migrationsFolder = path.join(projectRoot, "drizzle");

/** Where Drizzle keeps what was applied, in its own shape, so that its tools agree with us. */
const applied = sql.identifier("__drizzle_migrations");
const createApplied = sql`CREATE TABLE IF NOT EXISTS ${applied} (
  id SERIAL PRIMARY KEY, hash text NOT NULL, created_at numeric)`;

function pendingMigrations(database: Database, migrationsFolder: string): MigrationMeta[] {
  database.run(createApplied);
  const query = sql`SELECT coalesce(max(created_at), 0) AS until FROM ${applied}`;
  const { until } = database.get<{ until: number }>(query);
  return readMigrationFiles({ migrationsFolder }).filter(
    ({ folderMillis }) => folderMillis > until,
  );
}

function countRows(client: SQLite.Database): Map<string, number> {
  const tables = client
    .prepare<[], string>(
      "SELECT name FROM sqlite_schema WHERE type='table' AND name NOT GLOB 'sqlite_*' AND name NOT GLOB '__*'",
    )
    .pluck()
    .all();
  const count = (table: string) =>
    client.prepare<[], number>(`SELECT count(*) FROM "${table}"`).pluck().get() ?? 0;
  return new Map(tables.map((table) => [table, count(table)]));
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

/** All of the migrations, nothing lost by them, or none of them: Drizzle's own `migrate` commits unseen. */
function apply(database: Database, migrations: MigrationMeta[], before: Map<string, number>): void {
  const work = () => {
    for (const { sql: statements, hash, folderMillis } of migrations) {
      for (const statement of statements) database.run(sql.raw(statement));
      database.run(
        sql`INSERT INTO ${applied} (hash, created_at) VALUES (${hash}, ${folderMillis})`,
      );
    }
    assertNothingLost(before, database.$client);
  };
  database.transaction(work, { behavior: "immediate" });
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
  const pending = pendingMigrations(database, folder);
  if (pending.length === 0) return;

  const before = countRows(client);
  if ([...before.values()].some((rows) => rows > 0))
    await backUpDatabase(client, path.join(backupsDir, backupName("before-migration")));
  client.pragma("foreign_keys=OFF");
  try {
    apply(database, pending, before);
  } finally {
    client.pragma("foreign_keys=ON");
  }
}
