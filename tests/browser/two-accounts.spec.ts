import type { Page, Request } from "@playwright/test";
import type { SyncRequest, SyncResponse } from "../../shared/schemas/sync.ts";
import { bikeEntry, newId } from "../helpers/make-entry.ts";
import {
  expect,
  inTopBar,
  openAs,
  Rider,
  test,
  testAlone,
  waitUntilInstalled,
  waitUntilSent,
} from "./fixtures.ts";
import {
  addBike,
  card,
  fillNote,
  logLine,
  saveNote,
  notesOnServer,
  sendNow,
  writeNote,
} from "./write-notes.ts";

/** Through the form that stands open, without loading the page anew. */
async function fillSignIn(page: Page, email: string): Promise<void> {
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(Rider.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL("/");
}

/** All that the phone holds of an account. */
const logbookOf = (page: Page, accountId: string) =>
  page.evaluate(async (name) => {
    const outcome = <T>(asked: IDBRequest<T>) =>
      new Promise<T>((resolve) => {
        asked.onsuccess = () => resolve(asked.result);
      });
    const database = await outcome(indexedDB.open(name));
    const stores = database.transaction([...database.objectStoreNames]);
    const rows = await Promise.all(
      [...database.objectStoreNames].map((store) => outcome(stores.objectStore(store).getAll())),
    );
    database.close();
    return JSON.stringify(rows);
  }, `sumpless-logbook-${accountId}`);

test.describe("on one phone", () => {
  test.use({ serviceWorkers: "block" });

  test("A rider sees and sends nothing of another's, whose late answer changes nothing", async ({
    page,
    rider,
    server,
  }) => {
    const other = await new Rider(server.origin).signUp("Fern");
    await other.push([bikeEntry(newId(), { name: "Gorse" })]);
    await rider.signUp();
    await openAs(rider, page);
    await page.goto(await addBike(page, "Heather"));
    await waitUntilSent(page);

    let deliver: () => void = () => undefined;
    const released = new Promise<void>((resolve) => (deliver = resolve));
    const carriesNote = (request: Request) =>
      request.postData()?.includes("Smokes when cold") ?? false;
    let held = false;
    // The first answer for the note is held back; every other passes.
    await page.route("**/api/sync", async (route) => {
      if (held || !carriesNote(route.request())) return route.continue();
      held = true;
      const response = await route.fetch();
      await released;
      await route.fulfill({ response });
    });
    await writeNote(page, "Smokes when cold");
    await expect.poll(() => notesOnServer(rider)).toEqual(["Smokes when cold"]);
    await inTopBar(page, "Account").click();
    await page.getByRole("button", { name: "Sign out" }).click();
    await expect(page.getByRole("dialog", { name: "1 entry is not sent yet" })).toBeVisible();
    await page.getByRole("button", { name: "Sign out, keep them here" }).click();

    await fillSignIn(page, other.email);
    await expect(card(page, "Gorse")).toBeVisible();
    await waitUntilSent(page);
    const before = await logbookOf(page, other.id);
    const arrived = page.waitForResponse((response) => carriesNote(response.request()));
    deliver();
    await arrived;
    await inTopBar(page, "Account").click();
    await expect(page.getByText("Every entry has been sent.")).toBeVisible();
    expect(await logbookOf(page, other.id)).toBe(before);
    expect(before).not.toMatch(/Heather|Smokes when cold/);
    await page.getByRole("link", { name: "Sumpless" }).click();
    await expect(card(page, "Gorse")).toBeVisible();
    await expect(page.getByText("Heather")).toHaveCount(0);
    expect(await logbookOf(page, rider.id)).toMatch(/Smokes when cold.*"unsentSince"/);

    await inTopBar(page, "Account").click();
    await page.getByRole("button", { name: "Sign out" }).click();
    await fillSignIn(page, rider.email);
    await card(page, "Heather").getByRole("link", { name: "Heather" }).click();
    await expect(logLine(page, "Smokes when cold")).toContainText("Sent");
    expect(await notesOnServer(rider)).toEqual(["Smokes when cold"]);
    expect(await notesOnServer(other)).toEqual([]);
  });

  test("A rider's unsent entries outlive a server that disowns every bike", async ({
    page,
    rider,
  }) => {
    await rider.signUp();
    await openAs(rider, page);
    const bike = await addBike(page, "Heather");
    await waitUntilSent(page);
    const answered = page.waitForResponse("**/api/sync");
    await sendNow(page);
    const { epoch } = (await (await answered).json()) as SyncResponse;
    await page.goto(bike);
    await page.route("**/api/sync", async (route) => {
      const { entries, known } = route.request().postDataJSON() as SyncRequest;
      if (entries.length === 0) return route.continue();
      const results = (entries as { id: string }[]).map(({ id }, index) => ({
        ...{ index, id },
        ...{ status: "refused", reason: "not-writable" },
      }));
      const gone = [...Object.keys(known), bike.split("/").at(-1)];
      await route.fulfill({ json: { epoch, results, bikes: [], gone, more: false } });
    });
    await fillNote(page, "Smokes when cold");
    await saveNote(page);
    await expect(page.getByText(/1 not accepted/)).toBeVisible();
    await expect(page.getByRole("heading", { name: "This bike is not here" })).toBeVisible();
    await page.goto("/");
    await expect(card(page, "Heather")).toHaveCount(0);
    await page.goto("/account");
    await expect(page.getByText("Not sent yet: 1")).toBeVisible();

    await page.unrouteAll({ behavior: "wait" });
    await sendNow(page);
    await waitUntilSent(page);
    await page.goto(bike);
    await expect(logLine(page, "Smokes when cold")).toContainText("Sent");
    expect(await notesOnServer(rider)).toEqual(["Smokes when cold"]);
  });
});

testAlone(
  "A rider whose session has expired opens the app with no network, and is asked to sign in to send",
  async ({ page, context, rider, server }) => {
    await rider.signUp();
    await openAs(rider, page);
    const bike = await addBike(page, "Heather");
    await waitUntilSent(page);
    await waitUntilInstalled(page);
    await context.clearCookies();
    await server.stop();

    await page.goto("/");
    await expect(card(page, "Heather")).toBeVisible();
    await page.goto(bike);
    await writeNote(page, "Smokes when cold");

    await server.start();
    await sendNow(page);
    await expect(page.getByText(/^Signed out · 1 entry waits since/)).toBeVisible();
    await expect(logLine(page, "Smokes when cold")).toContainText("Saved on this phone");
    await page.getByRole("link", { name: "Sign in to send" }).click();
    await fillSignIn(page, rider.email);
    await waitUntilSent(page);
    expect(await notesOnServer(rider)).toEqual(["Smokes when cold"]);
  },
);
