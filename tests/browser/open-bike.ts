import type { Page } from "@playwright/test";
import type { logbook } from "../helpers/logbook-in-words.ts";
import { expect, signIn, type Rider } from "./fixtures.ts";

type Book = ReturnType<typeof logbook>;

/** Entries as a phone made them, before any server saw them. */
const asMade = ({ entries }: Book) =>
  entries.map(({ author: _author, receivedAt: _receivedAt, rev: _rev, ...entry }) => entry);

/** Signs a rider in on a phone that has the book's bike, and opens it. Answers the bike's address. */
export async function openBike(page: Page, rider: Rider, book: Book): Promise<string> {
  await rider.signUp();
  await rider.push(asMade(book));
  await signIn(page, rider.email);
  await expect(page.getByRole("region").first()).toBeVisible();
  const path = `/bikes/${book.entries[0]!.bikeId}`;
  await page.goto(path);
  await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
  return path;
}

/** From here on every screen opens with no network. */
export const installed = (page: Page) =>
  page.waitForFunction(() => navigator.serviceWorker.controller !== null);

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

/** How far the page reaches beyond the screen's right edge, px. */
export const overflow = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
