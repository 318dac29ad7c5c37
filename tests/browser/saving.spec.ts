import type { BrowserContext, Page } from "@playwright/test";
import { once } from "node:events";
import { createServer, request as forward, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { expect, openAs, test, testAlone, waitUntilInstalled, waitUntilSent } from "./fixtures.ts";

const card = (page: Page, name: string) => page.getByRole("region", { name });

async function addBike(page: Page, name: string): Promise<void> {
  await page.getByRole("link", { name: "Add a bike" }).click();
  await page.getByLabel("Name").fill(name);
  await page.getByRole("button", { name: "Save the bike" }).click();
  await expect(card(page, name)).toBeVisible();
}

async function logHours(page: Page, name: string, hours: string): Promise<void> {
  await card(page, name).getByRole("button", { name: "Log hours" }).click();
  await page.getByRole("textbox", { name: "Engine hours" }).fill(hours);
  await page.getByRole("button", { name: "Save hours" }).click();
  await expect(page.getByRole("dialog")).toBeHidden();
}

testAlone(
  "A rider sees the same in every tab, with no network and after opening the app again",
  async ({ page, context, rider, server }) => {
    await rider.signUp();
    await openAs(rider, page);
    await addBike(page, "Heather");
    await waitUntilSent(page);
    await waitUntilInstalled(page);
    const second = await context.newPage();
    await second.goto("/");
    await expect(card(second, "Heather")).toBeVisible();

    await server.stop();
    await logHours(second, "Heather", "12.4");
    await expect(card(page, "Heather")).toContainText("Saved on this phone");
    await addBike(page, "Gorse");
    await expect(card(second, "Gorse")).toBeVisible();
    await expect(second.getByText(/2 entries wait since/)).toBeVisible();

    await second.close();
    await page.reload();
    await expect(card(page, "Heather")).toContainText("Saved on this phone");
    await expect(page.getByText(/2 entries wait since/)).toBeVisible();

    await server.start();
    await page.getByRole("button", { name: "Send and fetch now" }).click();
    await waitUntilSent(page);
    const bikes = await rider.bikes<{ name: string; hours: { now: number } }>();
    expect(bikes.map(({ name, hours }) => [name, hours.now]).sort()).toEqual([
      ["Gorse", null],
      ["Heather", 12.4],
    ]);
  },
);

/** Stands before the product; once `deployed`, its service worker is that of another version. */
async function standBefore(origin: string) {
  let version = "";
  const server = createServer((incoming, outgoing) => {
    const { method, url, headers } = incoming;
    // Always the whole file, in plain text: its end may differ from the product's.
    for (const name of ["accept-encoding", "if-none-match", "if-modified-since"])
      delete headers[name];
    const onward = forward(origin + url!, { method, headers });
    onward.on("error", () => outgoing.destroy());
    onward.on("response", (answer) => {
      const { "content-length": _, ...kept } = answer.headers;
      outgoing.writeHead(answer.statusCode!, kept);
      answer.on("end", () => outgoing.end(url === "/sw.js" ? version : ""));
      answer.pipe(outgoing, { end: false });
    });
    incoming.pipe(onward);
  });
  server.listen(0, "localhost");
  await once(server, "listening");
  const { port } = server.address() as AddressInfo;
  return { server, origin: `http://localhost:${port}`, deploy: () => (version = "\n// next") };
}

/** As whoever used this phone last, with no session. */
const asOwner = (context: BrowserContext) =>
  context.addInitScript(() => {
    const account = { id: "owner", name: "Wren", email: "wren@moor.example" };
    localStorage.setItem("sumpless-account", JSON.stringify(account));
  });

const lookForUpdate = (page: Page) =>
  page.evaluate(async () => {
    await (await navigator.serviceWorker.ready).update();
  });

/**
 * Watched by a debugger, as here, Chrome may never find the old service worker idle; once stopped, a
 * tab's call may wake it again.
 */
async function idleWorkers(context: BrowserContext, page: Page): Promise<() => Promise<unknown>> {
  const debug = await context.newCDPSession(page);
  await debug.send("ServiceWorker.enable");
  return () => debug.send("ServiceWorker.stopAllWorkers");
}

/** A page that is loaded anew forgets it. */
const mark = (page: Page) => page.evaluate(() => Object.assign(window, { marked: true }));
const isMarked = (page: Page) => page.evaluate(() => "marked" in window);

test.describe("a new version", () => {
  let front: Server | undefined;
  test.afterEach(() => void front?.closeAllConnections());

  test("A rider keeps a half-typed form, in any tab, until it is done", async ({
    page,
    context,
    server,
  }) => {
    const { server: before, origin, deploy } = await standBefore(server.origin);
    front = before;
    await asOwner(context);
    await page.goto(`${origin}/bikes/new`);
    await page.getByLabel("Name").fill("Heather");
    await waitUntilInstalled(page);
    await mark(page);
    const second = await context.newPage();
    await second.goto(origin);
    await mark(second);

    deploy();
    await lookForUpdate(second);
    await second.getByRole("button", { name: "Use it now" }).click();
    await expect(page.getByLabel("Name")).toHaveValue("Heather");
    await expect(page.getByRole("button", { name: "Use it now" })).toBeHidden();
    expect(await isMarked(second)).toBe(true);

    await page.getByRole("button", { name: "Save the bike" }).click();
    await expect(card(page, "Heather")).toBeVisible();
    const letIdle = await idleWorkers(context, page);
    for (const tab of [second, page]) {
      const isOld = async () => {
        const old = await isMarked(tab).catch(() => true);
        if (old) await letIdle();
        return old;
      };
      await expect.poll(isOld, { intervals: [1_000, 4_000] }).toBe(false);
    }
    await expect(card(page, "Heather")).toBeVisible();
    front.close();
  });
});
