import { chromium, type BrowserContext, type Page } from "@playwright/test";
import { mkdtemp, readlink, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { hoursEntry } from "../helpers/make-entry.ts";
import {
  expect,
  openAs,
  signUp,
  test,
  testAlone,
  waitUntilInstalled,
  waitUntilSent,
} from "./fixtures.ts";
import {
  addBike,
  card,
  entriesOnServer,
  fillNote,
  logLine,
  saveNote,
  sendNow,
  writeNote,
} from "./write-notes.ts";

const waiting = (page: Page, entries: number) =>
  expect(
    page.getByText(new RegExp(`\\b${entries} (entry waits|entries wait) since`)),
  ).toBeVisible();

/** The read cache's key; anything may happen to what stands there. */
const cacheKey = (accountId: string) => `sumpless-read-${accountId}`;

interface Cached {
  key: string;
  cache: string;
}

/** What may happen to it; `cache` is what stood there while all was well. */
const harms = {
  "weeks old": ({ key, cache }: Cached) => {
    const aged = { ...JSON.parse(cache), timestamp: Date.now() - 21 * 86_400_000 } as object;
    localStorage.setItem(key, JSON.stringify(aged));
  },
  "cut off": ({ key, cache }: Cached) =>
    localStorage.setItem(key, cache.slice(0, cache.indexOf("queries"))),
  "of another shape": ({ key, cache }: Cached) => {
    const other = { ...JSON.parse(cache), clientState: { queries: "none" } } as object;
    localStorage.setItem(key, JSON.stringify(other));
  },
  "out of room": () => {
    let [filling, count] = ["x".repeat(1 << 20), 0];
    while (filling !== "")
      try {
        localStorage.setItem(`filling-${(count += 1)}`, filling);
      } catch {
        filling = filling.slice(0, Math.floor(filling.length / 2));
      }
  },
};

async function openAnew(context: BrowserContext, address: string): Promise<Page> {
  const page = await context.newPage();
  for (const other of context.pages()) if (other !== page) await other.close();
  await page.goto(address);
  return page;
}

/** Saves, and takes the tab away at the first sight of the words: its process dies on the spot. */
async function killOnceSaved(context: BrowserContext, page: Page): Promise<void> {
  const devtools = await context.newCDPSession(page);
  const crashed = page.waitForEvent("crash");
  await page.exposeFunction("killThisTab", () => {
    devtools.send("Page.crash").catch(() => undefined);
  });
  await page.evaluate(() => {
    const look = new MutationObserver(() => {
      if (!document.body.textContent.includes("Saved on this phone")) return;
      look.disconnect();
      void (window as unknown as { killThisTab(): void }).killThisTab();
    });
    look.observe(document.body, { childList: true, subtree: true, characterData: true });
  });
  await Promise.all([crashed, saveNote(page).catch(() => undefined)]);
}

/** The last reading stands in the form: it is saved once more. */
async function logHoursAgain(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Log hours" }).click();
  await page.getByRole("textbox", { name: "Engine hours" }).press("Enter");
  await expect(page.getByRole("dialog")).toBeHidden();
}

testAlone(
  "A rider can write a hundred entries with no network, whatever befalls the phone, and all are sent once",
  async ({ page, context, rider, server }) => {
    await rider.signUp();
    await openAs(rider, page);
    const bike = await addBike(page, "Heather");
    await waitUntilSent(page);
    await rider.push([hoursEntry(bike.split("/").at(-1)!, 5)]);
    await waitUntilInstalled(page);
    await page.goto("/clubs");
    const key = cacheKey(rider.id);
    await page.waitForFunction((key) => localStorage.getItem(key)?.includes("queries"), key);
    const cache = await page.evaluate((key) => localStorage.getItem(key)!, key);
    await page.goto("/");
    await page.getByRole("button", { name: "Log hours" }).click();
    await expect(page.getByText(/^Last: 5/)).toBeVisible();
    await server.stop();

    const tabs = [page, await context.newPage(), await context.newPage()];
    await Promise.all(
      tabs.map(async (tab) => {
        await tab.goto("/");
        for (let count = 0; count < 31; count += 1) await logHoursAgain(tab);
      }),
    );
    for (const tab of tabs) await waiting(tab, 93);

    const notes: string[] = [];
    const nextNote = () => notes[notes.push(`Note ${notes.length + 1}`) - 1]!;
    for (const [how, harm] of Object.entries(harms))
      await test.step(`the read cache is ${how}`, async () => {
        await context.pages()[0]!.evaluate(harm, { key, cache });
        const opened = await openAnew(context, bike);
        await waiting(opened, 93 + notes.length);
        await writeNote(opened, nextNote());
      });

    for (let count = 0; count < 3; count += 1)
      await test.step("a tab dies right after saving", async () => {
        const doomed = await openAnew(context, bike);
        await fillNote(doomed, nextNote());
        await killOnceSaved(context, doomed);
        await waiting(await openAnew(context, bike), 93 + notes.length);
      });

    const opened = await openAnew(context, bike);
    await waiting(opened, 100);
    await server.start();
    await sendNow(opened);
    await waitUntilSent(opened);
    await expect(logLine(opened, notes.at(-1)!)).toContainText("Sent");
    const entries = await entriesOnServer(rider);
    expect(entries.flatMap(({ body }) => body.text ?? []).sort()).toEqual(notes);
    expect(entries.filter(({ kind }) => kind === "hours")).toHaveLength(1 + 93);
  },
);

/** A browser with a disk of its own, which can be killed as by a flat battery. */
async function openBrowser(profile: string, baseURL: string) {
  const { launchOptions } = test.info().project.use;
  const context = await chromium.launchPersistentContext(profile, { ...launchOptions, baseURL });
  const kill = async () => {
    const closed = context.waitForEvent("close");
    // Chromium's lock on the disk names the machine and the process.
    process.kill(
      Number((await readlink(path.join(profile, "SingletonLock"))).split("-").at(-1)),
      9,
    );
    await closed;
  };
  return { page: context.pages()[0]!, kill };
}

testAlone(
  "A rider whose browser dies right after signing up finds the entries again, with no network",
  async ({ rider, server }) => {
    const profile = await mkdtemp(path.join(tmpdir(), "sumpless-profile-"));
    const first = await openBrowser(profile, server.origin);
    await first.page.goto("/");
    await waitUntilInstalled(first.page);
    await signUp(first.page, rider.email);
    await server.stop();
    await addBike(first.page, "Heather");
    await first.kill();

    const second = await openBrowser(profile, server.origin);
    await second.page.goto("/");
    await expect(card(second.page, "Heather")).toContainText("Saved on this phone");
    await second.kill();
    await rm(profile, { recursive: true, force: true, maxRetries: 5 });
  },
);
