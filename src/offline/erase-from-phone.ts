import { deleteDB } from "idb";
import { forgetAccount, rememberedAccount } from "./account.ts";
import { writeAccountCopy } from "./account-copy.ts";
import { databaseNameOf } from "./logbook/phone.ts";

const PATIENCE_MS = 5_000;

function forgetSettingsOf(accountId: string): void {
  try {
    const keys = Object.keys(localStorage).filter((key) => key.includes(accountId));
    for (const key of keys) localStorage.removeItem(key);
  } catch {
    // Nothing was kept.
  }
}

/** This page and other tabs close their connections when they hear of it; one that sleeps may not. */
async function eraseLogbook(accountId: string): Promise<void> {
  const erased = deleteDB(databaseNameOf(accountId)).catch(() => undefined);
  await Promise.race([erased, new Promise((resolve) => setTimeout(resolve, PATIENCE_MS))]);
}

/**
 * Takes everything of the account off this phone, unsent entries included. The page must be left
 * afterwards: what it still holds in memory it would write down again.
 */
export async function eraseFromPhone(): Promise<void> {
  const account = rememberedAccount();
  if (!account) return;
  await eraseLogbook(account.id);
  forgetSettingsOf(account.id);
  forgetAccount();
  // Not left to itself, as it is elsewhere: the page may be gone before it is written.
  await writeAccountCopy(null).catch(() => undefined);
  // A sync under way may have opened it anew; now that nobody is signed in, none does.
  await eraseLogbook(account.id);
}
