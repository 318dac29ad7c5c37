/** `npm run restore -- file`: puts a backup in the database's place. The server must be stopped. */
import { readConfig } from "./config.ts";
import { restoreDatabase } from "./services/restore-database.ts";

const [file] = process.argv.slice(2);
try {
  if (file === undefined)
    throw new Error("Say which backup to restore: npm run restore -- data/backups/<name>.sqlite");
  const { setAside, erasures, signedOut } = await restoreDatabase(
    readConfig(process.env).dataDir,
    file,
  );
  if (setAside) console.log(`The database that was there is now ${setAside}`);
  if (erasures > 0) console.log(`Done again what erased.jsonl tells of: ${erasures}`);
  if (signedOut)
    console.log("Everyone is signed out, and mails may go out twice: no sound database was there.");
  console.log(
    "Passwords and addresses are the backup's; links mailed to accounts before are void.",
  );
  console.log("Restored. The phones will send what is missing.");
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
