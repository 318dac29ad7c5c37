/** `npm run rebuild`: makes all summaries anew from the entries. The server may be running. */
import { readConfig } from "./config.ts";
import { backupsDir } from "./db/back-up-database.ts";
import { migrateDatabase } from "./db/migrate-database.ts";
import { databaseFile, openDatabase } from "./db/open-database.ts";
import { createStore } from "./db/store.ts";
import { rebuildSummaries } from "./services/summarise-bike.ts";

const { dataDir } = readConfig(process.env);
const database = openDatabase(databaseFile(dataDir));
await migrateDatabase(database, backupsDir(dataDir));
const bikes = rebuildSummaries(createStore(database, dataDir));
database.$client.close();
console.log(`The summaries of ${bikes} bikes were made anew.`);
