/** Saves an entry on this phone: the promise behind *Saved on this phone*. */
import { hashKey } from "@tanstack/react-query";
import { v7 as makeId } from "uuid";
import type { Entry } from "../../../shared/schemas/entry.ts";
import { InvalidEntryError, NotSavedError, StoreUnavailableError } from "../errors.ts";
import type { KeptEntry, NewEntry } from "../types.ts";
import { changeLogbook } from "./change-logbook.ts";
import type { EntryRow, LogbookChange } from "./database.ts";
import { asKeptEntry } from "./kept-entry.ts";
import { checkRegistered, parseNewEntry } from "./parse-new-entry.ts";
import type { Phone } from "./phone.ts";
import { rebuildBikes } from "./rebuild-bikes.ts";
import { refreshBike } from "./refresh-bike.ts";
import { rememberSyringe } from "./remember-syringe.ts";

export interface KeepOptions {
  /** Gives up when aborted. */
  signal: AbortSignal;
  draft?: { bikeId: string; form: string };
}

/**
 * Ids of entries whose saving was given up. The write may have completed all the same, unseen, so
 * saving the same again goes under the same id and cannot make two of it.
 */
const givenUp = new Map<string, string>();

function contentKey(phone: Phone, entry: NewEntry): string {
  return hashKey([phone.databaseName, { ...entry, at: undefined }]);
}

/**
 * A bike's first entry makes its record. A later one only marks it as not yet judged: a long log
 * takes its time, and saving must not wait for that. `rebuildBikes` judges it, next or, should the
 * app be closed in between, at the next start.
 */
async function markUnjudged(change: LogbookChange, entry: Entry, phone: Phone): Promise<void> {
  const { bikeId } = entry;
  const bikes = change.objectStore("bikes");
  const bike = await bikes.get(bikeId);
  checkRegistered(entry, bike);
  if (bike) await bikes.put({ ...bike, unsent: bike.unsent + 1, builtWith: "" });
  else await refreshBike(change, { bikeId, access: "owner", rev: 0 }, phone.account);
}

async function writeAll(
  change: LogbookChange,
  row: EntryRow,
  phone: Phone,
  draft: KeepOptions["draft"],
): Promise<void> {
  const entries = change.objectStore("entries");
  if (await entries.get(row.entry.id)) return;
  await entries.add(row);
  await markUnjudged(change, row.entry as Entry, phone);
  await rememberSyringe(change, row, phone.account);
  if (draft) await change.objectStore("drafts").delete([draft.bikeId, draft.form]);
}

async function write(row: EntryRow, phone: Phone, options: KeepOptions): Promise<EntryRow> {
  const { draft, signal } = options;
  await changeLogbook(phone, (change) => writeAll(change, row, phone, draft), signal);
  const written = await (await phone.open()).get("entries", row.entry.id);
  if (!written) throw new Error("The entry was not there when read back.");
  return written;
}

/** A hanging database neither answers nor fails. */
const orAborted = <T>(work: Promise<T>, signal: AbortSignal): Promise<T> =>
  new Promise((resolve, reject) => {
    signal.addEventListener("abort", () => reject(signal.reason as Error), { once: true });
    work.then(resolve, reject);
  });

const isTyped = (error: unknown) =>
  error instanceof InvalidEntryError || error instanceof StoreUnavailableError;

export async function keepEntry(
  phone: Phone,
  newEntry: NewEntry,
  options: KeepOptions,
): Promise<KeptEntry> {
  const key = contentKey(phone, newEntry);
  const entry = parseNewEntry(newEntry, givenUp.get(key) ?? makeId());
  const savedAt = phone.now().toISOString();
  try {
    const work = write({ entry, savedAt, unsentSince: savedAt }, phone, options);
    const row = await orAborted(work, options.signal);
    givenUp.delete(key);
    // The entry is saved, whatever becomes of this.
    await rebuildBikes(phone).catch(() => undefined);
    return asKeptEntry(row, phone.account);
  } catch (error) {
    if (isTyped(error)) throw error;
    givenUp.set(key, entry.id);
    throw new NotSavedError({ cause: error });
  }
}
