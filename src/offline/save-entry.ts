import type { Summary } from "../../shared/schemas/summary.ts";
import { rememberedAccount } from "./account.ts";
import { announce } from "./announcements.ts";
import { NotSavedError } from "./errors.ts";
import { phoneOf, type Phone } from "./logbook/phone.ts";
import { requestSync } from "./start-syncing.ts";
import { askToKeepStorage } from "./storage-health.ts";
import type { KeptEntry, NewEntry } from "./types.ts";

const SAVE_TIMEOUT_MS = 2_000;

function signedInPhone(): Phone {
  const account = rememberedAccount();
  if (!account) throw new NotSavedError();
  return phoneOf(account);
}

/** A chunk that cannot be had is one more reason why nothing was saved. */
const notSaved = (cause: unknown): never => {
  throw new NotSavedError({ cause });
};

export interface SaveOptions {
  /** The draft this entry was made from: it goes in the same transaction. */
  draft?: { bikeId: string; form: string };
}

/**
 * Saves an entry on this phone. Resolves once the write has completed: only then may the screen
 * say *Saved on this phone*. Throws `InvalidEntryError`, `NotSavedError` (also after 2 seconds:
 * home-screen apps on iOS have been seen to hang) or `StoreUnavailableError`; the form keeps its text.
 */
export async function saveEntry(entry: NewEntry, options: SaveOptions = {}): Promise<KeptEntry> {
  const phone = signedInPhone();
  const signal = AbortSignal.timeout(SAVE_TIMEOUT_MS);
  const { keepEntry } = await import("./logbook/keep-entry.ts").catch(notSaved);
  const kept = await keepEntry(phone, entry, { ...options, signal });
  announce({ accountId: phone.account.id, about: "entries" });
  if (options.draft) announce({ accountId: phone.account.id, about: "drafts" });
  requestSync();
  void askToKeepStorage();
  return kept;
}

/** What the bike's summary would be with this entry; nothing is saved. Throws `InvalidEntryError`. */
export async function previewSummary(bikeId: string, entry: NewEntry): Promise<Summary> {
  const { previewSummary } = await import("./logbook/preview-summary.ts");
  return previewSummary(signedInPhone(), bikeId, entry);
}
