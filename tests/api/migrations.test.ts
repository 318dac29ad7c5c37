import { migrate } from "drizzle-orm/better-sqlite3/migrator";
import SQLite from "better-sqlite3";
import { cpSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { backupsDir } from "../../server/db/back-up-database.ts";
import { migrateDatabase, migrationsFolder } from "../../server/db/migrate-database.ts";
import { databaseFile, openDatabase } from "../../server/db/open-database.ts";
import { createStore } from "../../server/db/store.ts";
import { newId, smallLog } from "../helpers/make-entry.ts";
import { pushEntries } from "../../server/services/push-entries.ts";
import { temporaryDir } from "../helpers/start-test-server.ts";

interface Journal {
  entries: { idx: number; version: string; when: number; tag: string; breakpoints: boolean }[];
}

/** Adds a migration to a folder of them, as drizzle-kit writes it. */
function addMigration(folder: string, statements: string[]): void {
  const journalFile = path.join(folder, "meta/_journal.json");
  const journal = JSON.parse(readFileSync(journalFile, "utf8")) as Journal;
  const idx = journal.entries.length;
  const tag = `000${idx}_added`;
  const when = (journal.entries.at(-1)?.when ?? 0) + 1;
  journal.entries.push({ idx, version: "6", when, tag, breakpoints: true });
  writeFileSync(journalFile, JSON.stringify(journal));
  writeFileSync(path.join(folder, `${tag}.sql`), statements.join("\n--> statement-breakpoint\n"));
}

function emptyFolder(): string {
  const folder = path.join(temporaryDir(), "drizzle");
  mkdirSync(path.join(folder, "meta"), { recursive: true });
  const journal = { version: "7", dialect: "sqlite", entries: [] };
  writeFileSync(path.join(folder, "meta/_journal.json"), JSON.stringify(journal));
  return folder;
}

/** A rebuild as drizzle-kit writes it, its switch for foreign keys included. */
const rebuild = (table: string, columns: string) => [
  "PRAGMA foreign_keys=OFF;",
  `CREATE TABLE \`__new_${table}\` (${columns});`,
  `INSERT INTO \`__new_${table}\` SELECT * FROM \`${table}\`;`,
  `DROP TABLE \`${table}\`;`,
  `ALTER TABLE \`__new_${table}\` RENAME TO \`${table}\`;`,
  "PRAGMA foreign_keys=ON;",
];

const families = [
  "CREATE TABLE `parents` (`id` integer PRIMARY KEY);",
  "CREATE TABLE `children` (`id` integer PRIMARY KEY, `parent_id` integer NOT NULL REFERENCES `parents`(`id`) ON DELETE CASCADE);",
];

async function databaseWithFamilies() {
  const dataDir = temporaryDir();
  const folder = emptyFolder();
  addMigration(folder, families);
  const database = openDatabase(databaseFile(dataDir));
  await migrateDatabase(database, backupsDir(dataDir), folder);
  database.$client.exec("INSERT INTO parents VALUES (1), (2)");
  database.$client.exec("INSERT INTO children VALUES (1, 1), (2, 1), (3, 2)");
  const children = () =>
    database.$client.prepare("SELECT count(*) FROM children").pluck().get() as number;
  return { database, folder, backups: backupsDir(dataDir), children };
}

describe("a migration that rebuilds a table", () => {
  it("run without care takes the child rows along", async () => {
    const { database, folder, children } = await databaseWithFamilies();
    addMigration(folder, rebuild("parents", "`id` integer PRIMARY KEY NOT NULL"));
    migrate(database, { migrationsFolder: folder });
    expect(children()).toBe(0);
    database.$client.close();
  });

  it("loses no child row", async () => {
    const { database, folder, backups, children } = await databaseWithFamilies();
    addMigration(folder, rebuild("parents", "`id` integer PRIMARY KEY NOT NULL"));
    await migrateDatabase(database, backups, folder);
    expect(children()).toBe(3);
    expect(database.$client.pragma("foreign_keys", { simple: true })).toBe(1);
    expect(database.$client.pragma("foreign_key_check")).toEqual([]);
    database.$client.close();
  });

  it("of our own bikes keeps every entry, rev and summary", async () => {
    const dataDir = temporaryDir();
    const folder = path.join(temporaryDir(), "drizzle");
    cpSync(migrationsFolder, folder, { recursive: true });
    const database = openDatabase(databaseFile(dataDir));
    await migrateDatabase(database, backupsDir(dataDir), folder);
    const store = createStore(database, dataDir);
    const [accountId, bikeId] = [newId(), newId()];
    store.users.add({
      id: accountId,
      email: "ann@club.example",
      name: "Ann",
      passwordHash: "none",
      verified: false,
      createdAt: "2026-03-01T09:00:00.000Z",
    });
    pushEntries(store, accountId, smallLog(bikeId));
    const kept = () => [store.entries.ofBike(bikeId), store.bikeSummaries.jsonOf(bikeId)];
    const before = kept();

    addMigration(
      folder,
      rebuild(
        "bikes",
        "`id` text PRIMARY KEY NOT NULL, `owner_id` text NOT NULL REFERENCES `users`(`id`)",
      ),
    );
    addMigration(
      folder,
      rebuild(
        "users",
        "`id` text PRIMARY KEY NOT NULL, `email` text NOT NULL, `name` text NOT NULL, `password_hash` text NOT NULL, `verified` integer NOT NULL, `created_at` text NOT NULL",
      ),
    );
    await migrateDatabase(database, backupsDir(dataDir), folder);
    expect(kept()).toEqual(before);
    database.$client.close();
  });
});

describe("migrating", () => {
  it("backs up a database that holds rows, and only then", async () => {
    const { database, folder, backups } = await databaseWithFamilies();
    expect(() => readdirSync(backups)).toThrow("ENOENT");
    addMigration(folder, ["ALTER TABLE `parents` ADD `name` text;"]);
    await migrateDatabase(database, backups, folder);
    await migrateDatabase(database, backups, folder);
    const files = readdirSync(backups);
    expect(files).toEqual([expect.stringMatching(/-before-migration\.sqlite$/)]);
    const copy = new SQLite(path.join(backups, files[0]!));
    expect(copy.prepare("SELECT count(*) FROM children").pluck().get()).toBe(3);
    copy.close();
    database.$client.close();
  });

  it("that loses a row, or leaves one without its parent, changes nothing", async () => {
    for (const loss of ["DELETE FROM `children`;", "DELETE FROM `parents` WHERE `id` = 1;"]) {
      const { database, folder, backups, children } = await databaseWithFamilies();
      addMigration(folder, [loss]);
      for (const start of ["first", "second"]) {
        const migrating = migrateDatabase(database, backups, folder);
        await expect(migrating, start).rejects.toThrow(/left/);
      }
      expect(children()).toBe(3);
      expect(readdirSync(backups)).toHaveLength(2);
      database.$client.close();
    }
  });

  it("that fails leaves the database as it was", async () => {
    const { database, folder, backups, children } = await databaseWithFamilies();
    addMigration(folder, ["DELETE FROM `children`;", "CREATE TABLE `parents` (`id` integer);"]);
    await expect(migrateDatabase(database, backups, folder)).rejects.toThrow();
    expect(children()).toBe(3);
    expect(database.$client.pragma("foreign_keys", { simple: true })).toBe(1);
    database.$client.close();
  });
});
