import type { Page, Route } from "@playwright/test";
import { cpSync, readdirSync, readFileSync, renameSync, symlinkSync, writeFileSync } from "node:fs";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import type { StoredEntry } from "../../shared/schemas/entry.ts";
import type { SyncRequest, SyncResponse } from "../../shared/schemas/sync.ts";
import { earlierChunks } from "../../scripts/earlier-chunks.ts";
import { hoursEntry, newId } from "../helpers/make-entry.ts";
import { expect, inTopBar, openAs, test, testAlone, waitUntilSent } from "./fixtures.ts";
import { logLines } from "./open-bike.ts";
import { addBike, card, logLine, notesOnServer, sendNow, writeNote } from "./write-notes.ts";

// A page with no service worker has nothing but what the server still serves; and only its calls
// can be stepped between.
test.use({ serviceWorkers: "block" });

/** Gives each chunk another name, as another version of its source would. */
function renameChunks(clientDir: string): void {
  const chunks = readdirSync(path.join(clientDir, "assets"));
  const named = new RegExp(`(?<![\\w-])(${chunks.join("|").replaceAll(".", "\\.")})`, "g");
  for (const name of chunks)
    renameSync(
      path.join(clientDir, "assets", name),
      path.join(clientDir, "assets", `next-${name}`),
    );
  for (const name of readdirSync(clientDir, { recursive: true, encoding: "utf8" })) {
    if (!/\.(js|css|html)$/.test(name)) continue;
    const file = path.join(clientDir, name);
    writeFileSync(file, readFileSync(file, "utf8").replace(named, "next-$1"));
  }
}

/** The product as the next build leaves it, in a folder of its own. */
async function buildNext(): Promise<string> {
  const root = await mkdtemp(path.join(tmpdir(), "sumpless-next-"));
  for (const name of ["node_modules", "drizzle", "package.json"])
    symlinkSync(path.resolve(name), path.join(root, name));
  const dist = path.join(root, "dist");
  cpSync("dist", dist, { recursive: true });
  const { setAside, bringBack } = earlierChunks(dist);
  setAside();
  renameChunks(path.join(dist, "client"));
  bringBack();
  return root;
}

let next: string | undefined;
test.afterEach(() => next && rm(next, { recursive: true, force: true }));

const nextScripts = (page: Page) => page.locator('script[src^="/assets/next-"]');

/** The names of the chunks that the page gets from here on. */
function chunksGot(page: Page): string[] {
  const got: string[] = [];
  page.on("response", (answer) => {
    const { pathname } = new URL(answer.url());
    if (!pathname.startsWith("/assets/")) return;
    expect(answer.status(), pathname).toBe(200);
    got.push(path.basename(pathname));
  });
  return got;
}

testAlone(
  "A rider saves a half-typed form and goes on with the version that is open, after a newer one was deployed",
  async ({ page, rider, server }) => {
    next = await buildNext();
    await rider.signUp();
    await openAs(rider, page, "/bikes/new");
    await page.getByLabel("Name", { exact: true }).fill("Heather");
    await waitUntilSent(page);
    await server.stop();
    server.root = next;
    await server.start();

    const got = chunksGot(page);
    await expect(page.getByLabel("Name", { exact: true })).toHaveValue("Heather");
    await page.getByRole("button", { name: "Save the bike" }).click();
    await expect(card(page, "Heather")).toBeVisible();
    await inTopBar(page, "Account").click();
    await expect(page.getByText("Every entry has been sent.")).toBeVisible();
    expect(got.length).toBeGreaterThan(1);
    expect(got.filter((name) => name.startsWith("next-"))).toEqual([]);

    await expect(nextScripts(page)).toHaveCount(0);
    await page.reload();
    await expect(page.getByText("Every entry has been sent.")).toBeVisible();
    await expect(nextScripts(page)).not.toHaveCount(0);
  },
);

test("A rider whose open version is served no more keeps what was typed", async ({
  page,
  rider,
}) => {
  await rider.signUp();
  await openAs(rider, page, "/bikes/new");
  await page.getByLabel("Name", { exact: true }).fill("Heather");
  await page.route("**/assets/**", (route) => route.fulfill({ status: 404 }));
  await page.getByRole("button", { name: "Save the bike" }).click();
  await expect(page.getByRole("alert")).toContainText("Not saved yet");
  await expect(page.getByLabel("Name", { exact: true })).toHaveValue("Heather");
});

/** Writes as a later server may: more fields, a kind and a version that this phone does not know. */
async function answerAsNewer(route: Route): Promise<void> {
  const response = await route.fetch();
  const answer = (await response.json()) as SyncResponse;
  const bikes = answer.bikes.map(({ entries, ...bike }) => {
    const { id: _, ...like } = entries.at(-1) as StoredEntry;
    const unknownKind = { ...like, id: newId(), kind: "photo", hours: 900, body: { url: "x" } };
    const unknownVersion = { ...like, id: newId(), v: 2, kind: "hours", hours: 900, body: {} };
    return { ...bike, colour: "red", entries: [...entries, unknownKind, unknownVersion] };
  });
  await route.fulfill({ response, json: { ...answer, bikes, weather: { rain: true } } });
}

test("A rider with an older version keeps what a newer one wrote, and is judged without it", async ({
  page,
  rider,
}) => {
  await rider.signUp();
  await openAs(rider, page);
  const bike = await addBike(page, "Heather");
  await waitUntilSent(page);
  await rider.push([hoursEntry(bike.split("/").at(-1)!, 5)]);
  await page.route("**/api/sync", answerAsNewer);
  await page.goto(bike);
  const foreign = logLines(page).filter({ hasText: "Written by a newer version of the app" });
  await expect(foreign).toHaveCount(2);
  await page.unrouteAll({ behavior: "wait" });

  await writeNote(page, "Chain oiled");
  await expect(logLine(page, "Chain oiled")).toContainText("Sent");
  await page.reload();
  await expect(foreign).toHaveCount(2);
  const now = page.getByRole("region", { name: "What to do now" });
  await expect(now).toContainText(/5\.0\sh/);
  await expect(now).not.toContainText("900");
});

/** Reads as an earlier server may: notes are a kind it has not heard of. */
async function askAsOlder(route: Route): Promise<void> {
  const request = route.request().postDataJSON() as SyncRequest;
  const entries = (request.entries as StoredEntry[]).map((entry) =>
    entry.kind === "note" ? { ...entry, kind: "later-kind" } : entry,
  );
  await route.fulfill({
    response: await route.fetch({ postData: JSON.stringify({ ...request, entries }) }),
  });
}

test("A rider with a newer version keeps what an older server does not know, until it does", async ({
  page,
  rider,
}) => {
  await rider.signUp();
  await openAs(rider, page);
  await page.goto(await addBike(page, "Heather"));
  await page.route("**/api/sync", askAsOlder);
  await writeNote(page, "Chain oiled");
  await expect(logLine(page, "Chain oiled")).toContainText("does not know this kind of entry yet");
  await expect(page.getByText(/1 not accepted/)).toBeVisible();
  await page.reload();
  await expect(logLine(page, "Chain oiled")).toContainText("Not accepted");

  await page.unrouteAll({ behavior: "wait" });
  await sendNow(page);
  await expect(logLine(page, "Chain oiled")).toContainText("Sent");
  expect(await notesOnServer(rider)).toEqual(["Chain oiled"]);
});
