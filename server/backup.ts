/** `npm run backup [-- file]`: copies the database, whole and checked. The server may be running. */
import { existsSync } from "node:fs";
import path from "node:path";
import { readConfig } from "./config.ts";
import { backUpDatabase, backupName, backupsDir } from "./db/back-up-database.ts";
import { databaseFile, openDatabase } from "./db/open-database.ts";

try {
  const { dataDir } = readConfig(process.env);
  if (!existsSync(databaseFile(dataDir))) throw new Error(`There is no database in ${dataDir}`);
  const file = path.resolve(
    process.argv[2] ?? path.join(backupsDir(dataDir), backupName("backup")),
  );
  const database = openDatabase(databaseFile(dataDir));
  await backUpDatabase(database.$client, file);
  database.$client.close();
  console.log(file);
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
