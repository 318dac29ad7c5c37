import type { Page } from "@playwright/test";
import type { logbook } from "../helpers/logbook-in-words.ts";
import { newId } from "../helpers/make-entry.ts";
import { expect, openAs, waitUntilSent, type Rider } from "./fixtures.ts";

type Book = ReturnType<typeof logbook>;

/** Entries as a phone made them, before any server saw them. Every book has the same ids: here new. */
function asMade({ entries }: Book) {
  const ids = new Map<string, string>();
  const renewed = (id: string) => ids.get(id) ?? ids.set(id, newId()).get(id)!;
  const made = entries.map(({ author: _a, receivedAt: _r, rev: _rev, ...entry }) => entry);
  const text = JSON.stringify(made).replace(/\b0190a000-[\da-f-]{27}\b/g, renewed);
  return JSON.parse(text) as typeof made;
}

/** Opens the book's bike on a phone of its rider, which then has all of it. Answers its address. */
export async function openBike(page: Page, rider: Rider, book: Book): Promise<string> {
  await rider.signUp();
  const entries = asMade(book);
  await rider.push(entries);
  const path = `/bikes/${entries[0]!.bikeId}`;
  await openAs(rider, page, path);
  await expect(logLines(page)).not.toHaveCount(0);
  await waitUntilSent(page);
  return path;
}

/** The lines of the log, newest first. */
export const logLines = (page: Page) =>
  page.getByRole("list", { name: "Entries, newest first" }).locator("> li");

/** Puts a row into the phone's own store, as an older or newer app may have left it there. */
export const putInStore = (page: Page, entry: object) =>
  page.evaluate(async (entry) => {
    const databases = await indexedDB.databases();
    const info = databases.find(({ name }) => name?.startsWith("sumpless-logbook-"));
    const database = await new Promise<IDBDatabase>((resolve) => {
      const opening = indexedDB.open(info!.name!);
      opening.onsuccess = () => resolve(opening.result);
    });
    const savedAt = new Date().toISOString();
    await new Promise<void>((resolve) => {
      const change = database.transaction("entries", "readwrite");
      change.objectStore("entries").put({ entry, savedAt, unsentSince: savedAt });
      change.oncomplete = () => resolve();
    });
    database.close();
  }, entry);
