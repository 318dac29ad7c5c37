import { chromium, type BrowserContext, type Page } from "@playwright/test";
import { spawn, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import { mkdtemp, readFile, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { hoursEntry } from "../helpers/make-entry.ts";
import { expect, Rider, signUp, test } from "./fixtures.ts";
import { installed } from "./open-bike.ts";
import {
  addBike,
  entriesOnServer,
  fillNote,
  logLine,
  saveNote,
  sendNow,
  writeNote,
} from "./write-notes.ts";

const waiting = (page: Page, entries: number) =>
  expect(page.getByText(new RegExp(`\\b${entries} (entry waits|entries wait) since`))).toBeVisible({
    timeout: 15_000,
  });

/** The read cache's key; anything may happen to what stands there. */
const cacheKey = (accountId: string) => `sumpless-read-${accountId}`;

const harms = {
  "weeks old": (key: string) => {
    const cache = JSON.parse(localStorage.getItem(key)!) as object;
    localStorage.setItem(
      key,
      JSON.stringify({ ...cache, timestamp: Date.now() - 21 * 86_400_000 }),
    );
  },
  "cut off": (key: string) => localStorage.setItem(key, '{"buster":"1","clientState":{"quer'),
  "of another shape": (key: string) =>
    localStorage.setItem(
      key,
      JSON.stringify({ buster: "1", timestamp: Date.now(), clientState: { queries: "none" } }),
    ),
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

test("A rider can write a hundred entries with no network, whatever befalls the phone, and all are sent once", async ({
  page,
  context,
  rider,
  server,
}) => {
  test.setTimeout(300_000);
  await signUp(page, rider.email);
  await rider.signIn();
  const bike = await addBike(page, "Heather");
  await rider.push([hoursEntry(bike.split("/").at(-1)!, 5)]);
  await installed(page);
  await page.goto("/clubs");
  const key = cacheKey(rider.id);
  await page.waitForFunction((key) => localStorage.getItem(key)?.includes("queries"), key);
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
      await context.pages()[0]!.evaluate(harm, key);
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
  await expect(opened.getByText(/^All sent/)).toBeVisible({ timeout: 30_000 });
  await expect(logLine(opened, notes.at(-1)!)).toContainText("Sent");
  const entries = await entriesOnServer(rider);
  expect(entries.flatMap(({ body }) => body.text ?? []).sort()).toEqual(notes);
  expect(entries.filter(({ kind }) => kind === "hours")).toHaveLength(1 + 93);
});

const running: ChildProcess[] = [];
test.afterEach(() => running.forEach((browser) => browser.kill("SIGKILL")));

/** A browser of its own, which can be killed as a flat battery would. */
async function openBrowser(profile: string) {
  const { executablePath, args = [] } = test.info().project.use.launchOptions!;
  const portFile = path.join(profile, "DevToolsActivePort");
  await rm(portFile, { force: true });
  const process = spawn(
    executablePath!,
    [...args, "--headless", "--remote-debugging-port=0", `--user-data-dir=${profile}`],
    { stdio: "ignore" },
  );
  running.push(process);
  const readPort = () => readFile(portFile, "utf8").then(parseInt, () => 0);
  await expect.poll(readPort, { timeout: 30_000 }).toBeGreaterThan(0);
  const browser = await chromium.connectOverCDP(`http://127.0.0.1:${await readPort()}`);
  const page = await browser.contexts()[0]!.newPage();
  page.setDefaultTimeout(15_000);
  const kill = async () => {
    const exited = once(process, "exit");
    process.kill("SIGKILL");
    await exited;
  };
  return { page, kill };
}

test("A rider whose browser dies right after signing up finds the entries again, with no network", async ({
  rider,
  server,
}) => {
  test.setTimeout(120_000);
  const profile = await mkdtemp(path.join(tmpdir(), "sumpless-profile-"));
  const first = await openBrowser(profile);
  await first.page.goto(server.origin);
  await installed(first.page);
  await first.page.getByRole("link", { name: "I am new here" }).click();
  await first.page.getByLabel(/name|call you/i).fill("Wren");
  await first.page.getByLabel(/e-mail/i).fill(rider.email);
  await first.page.getByLabel(/^password/i).fill(Rider.password);
  await first.page.getByRole("button", { name: /create|sign up/i }).click();
  await expect(first.page.getByRole("link", { name: "Add a bike" })).toBeVisible();
  await server.stop();
  await addBike(first.page, "Heather");
  await first.kill();

  const second = await openBrowser(profile);
  await second.page.goto(server.origin);
  await expect(second.page.getByRole("region", { name: "Heather" })).toContainText(
    "Saved on this phone",
  );
  await second.kill();
  await rm(profile, { recursive: true, force: true, maxRetries: 5 });
});
