/**
 * The lasting copy of who this phone is used by. Browsers write localStorage out late, and lose the
 * last seconds of it with a flat battery; this is on disk before the next screen is read.
 */
import { openDB, type DBSchema } from "idb";

interface AccountCopySchema extends DBSchema {
  account: { key: string; value: string | null };
}

const KEY = "in-use";

/** Opened for each call and closed after it: no other tab ever waits for it. */
const open = () =>
  openDB<AccountCopySchema>("sumpless-account", 1, {
    upgrade(database) {
      database.createObjectStore("account");
    },
  });

/** What was written last; undefined where nothing ever was. */
export async function readAccountCopy(): Promise<string | null | undefined> {
  const database = await open();
  return database.get("account", KEY).finally(() => database.close());
}

/** Null says that nobody uses the phone, which is not the same as not knowing. */
export async function writeAccountCopy(text: string | null): Promise<void> {
  const database = await open();
  const { store, done } = database.transaction("account", "readwrite", { durability: "strict" });
  await Promise.all([store.put(text, KEY), done]).finally(() => database.close());
}
