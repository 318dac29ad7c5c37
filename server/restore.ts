/** `npm run restore -- file`: puts a backup in the database's place. The server must be stopped. */
import { readConfig } from "./config.ts";
import { restoreDatabase } from "./services/restore-database.ts";

const [file] = process.argv.slice(2);
if (file === undefined) {
  console.error("Say which backup to restore: npm run restore -- data/backups/<name>.sqlite");
  process.exit(2);
}
const { dataDir } = readConfig(process.env);
const { setAside, erasures } = await restoreDatabase(dataDir, file);
if (setAside) console.log(`The database that was there is now ${setAside}.`);
console.log(`Restored. ${erasures} erasures were carried out again. Phones send what is missing.`);
