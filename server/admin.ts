/** `npm run admin -- …`: what an operator does for an account. The server may be running. */
import { existsSync } from "node:fs";
import { administer } from "./administer.ts";
import { createSessions } from "./auth/session.ts";
import { ConfigError, readConfig } from "./config.ts";
import { backupsDir } from "./db/back-up-database.ts";
import { migrateDatabase } from "./db/migrate-database.ts";
import { databaseFile, openDatabase } from "./db/open-database.ts";
import { createStore } from "./db/store.ts";
import { AdministrationError, createAdministration } from "./services/administration.ts";

const isExpected = (error: unknown) =>
  error instanceof AdministrationError ||
  error instanceof ConfigError ||
  (error as { code?: unknown }).code === "ERR_PARSE_ARGS_UNKNOWN_OPTION";

try {
  const { dataDir, publicOrigin } = readConfig(process.env);
  const file = databaseFile(dataDir);
  if (!existsSync(file)) throw new AdministrationError(`There is no database in ${dataDir}`);
  const database = openDatabase(file);
  await migrateDatabase(database, backupsDir(dataDir));
  const store = createStore(database, dataDir);
  const sessions = createSessions(database, publicOrigin);
  const administration = createAdministration({ store, sessions, publicOrigin });
  console.log(administer(administration, process.argv.slice(2)));
  database.$client.close();
} catch (error) {
  console.error(isExpected(error) ? (error as Error).message : error);
  process.exitCode = 1;
}
