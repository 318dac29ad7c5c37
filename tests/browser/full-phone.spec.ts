import type { Page } from "@playwright/test";
import { expect, openAs, test, waitUntilInstalled, waitUntilSent } from "./fixtures.ts";
import {
  addBike,
  fillNote,
  logLine,
  notesOnServer,
  saveNote,
  sendNow,
  writeNote,
} from "./write-notes.ts";

/** Whether IndexedDB takes a few bytes more; Chromium looks at its quota anew every half minute. */
const roomLeft = (page: Page) =>
  page.evaluate(
    () =>
      new Promise<boolean>((resolve) => {
        const opening = indexedDB.open("room");
        opening.onupgradeneeded = () => opening.result.createObjectStore("bytes");
        opening.onerror = () => resolve(false);
        opening.onsuccess = () => {
          const database = opening.result;
          const writing = database.transaction("bytes", "readwrite");
          writing.objectStore("bytes").put("byte", "byte");
          const answer = (room: boolean) => () => {
            database.close();
            resolve(room);
          };
          writing.oncomplete = answer(true);
          writing.onabort = answer(false);
        };
      }),
  );

test("A rider whose phone is full keeps what is saved and what is typed, and saves it once there is room", async ({
  page,
  context,
  rider,
  baseURL,
}) => {
  await rider.signUp();
  await openAs(rider, page);
  await waitUntilInstalled(page);
  const bike = await addBike(page, "Heather");
  await waitUntilSent(page);
  await context.setOffline(true);
  await page.goto(bike);
  await writeNote(page, "Plug changed");

  const devtools = await context.newCDPSession(page);
  const patience = { timeout: 90_000, intervals: [1_000] };
  await devtools.send("Storage.overrideQuotaForOrigin", { origin: baseURL!, quotaSize: 1 });
  await expect.poll(() => roomLeft(page), patience).toBe(false);
  await fillNote(page, "Chain oiled");
  await saveNote(page);
  await expect(page.getByRole("alert")).toContainText("Not saved yet");
  await expect(page.getByLabel("What is worth keeping?")).toHaveValue("Chain oiled");
  const opened = await context.newPage();
  await opened.goto(bike);
  await expect(logLine(opened, "Plug changed")).toContainText("Saved on this phone");
  await expect(logLine(opened, "Chain oiled")).toBeHidden();

  await devtools.send("Storage.overrideQuotaForOrigin", { origin: baseURL! });
  await expect.poll(() => roomLeft(page), patience).toBe(true);
  await expect(page.getByLabel("What is worth keeping?")).toHaveValue("Chain oiled");
  await saveNote(page);
  await expect(logLine(page, "Chain oiled")).toContainText("Saved on this phone");
  await context.setOffline(false);
  await sendNow(page);
  await expect(logLine(page, "Chain oiled")).toContainText("Sent");
  expect(await notesOnServer(rider)).toEqual(["Chain oiled", "Plug changed"]);
});
