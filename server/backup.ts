/** `npm run backup [-- file]`: copies the database, whole and checked. The server may be running. */
import path from "node:path";
import { readConfig } from "./config.ts";
import { backUpDatabase, backupName, backupsDir } from "./db/back-up-database.ts";
import { databaseFile, openDatabase } from "./db/open-database.ts";

const { dataDir } = readConfig(process.env);
const file = path.resolve(process.argv[2] ?? path.join(backupsDir(dataDir), backupName("backup")));
const database = openDatabase(databaseFile(dataDir));
await backUpDatabase(database.$client, file);
database.$client.close();
console.log(file);
