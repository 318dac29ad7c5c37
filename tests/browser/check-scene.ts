/** What the browser tests of the delivery check share: a bike with a baseline, and its screens. */
import type { Page } from "@playwright/test";
import type { LogEntry } from "../../shared/schemas/entry.ts";
import { syncResponseSchema } from "../../shared/schemas/sync.ts";
import { bikeEntry, checkEntry, newId } from "../helpers/make-entry.ts";
import { expect, expectAccessible, Rider } from "./fixtures.ts";

export const short = { seconds: 30, rhythm: "steady", nominalMl: 3 } as const;
export const daysAgo = (days: number) => new Date(Date.now() - days * 86_400_000).toISOString();

export async function signIn(page: Page, email: string): Promise<void> {
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(Rider.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL("/");
}

/** A bike whose sequence is known, with a baseline of 3 mL from four runs at 12.0 h. */
export async function withBaseline(page: Page, rider: Rider): Promise<string> {
  const bikeId = newId();
  const baseline = checkEntry(bikeId, 12, 3, daysAgo(40));
  baseline.body.runs = Array.from({ length: 4 }, () => ({ startMl: 0, endMl: 3 }));
  await rider.signUp();
  await rider.push([bikeEntry(bikeId, { name: "Moss", sequence: short }), baseline]);
  await signIn(page, rider.email);
  await expect(page.getByRole("region", { name: "Moss" })).toBeVisible();
  return bikeId;
}

/** Everything the app needs is on the phone: from here on it works with the server gone. */
export async function installed(page: Page): Promise<void> {
  await page.evaluate(() => navigator.serviceWorker.ready);
  await page.reload();
  await expect
    .poll(() => page.evaluate(() => navigator.serviceWorker.controller !== null))
    .toBe(true);
}

export const button = (page: Page, name: string | RegExp) => page.getByRole("button", { name });
export const link = (page: Page, name: string | RegExp) => page.getByRole("link", { name });
export const field = (page: Page, name: string) => page.getByRole("textbox", { name });
export const heading = (page: Page, name: string | RegExp) =>
  page.getByRole("heading", { name, level: 1 });

export async function expectNoSidewaysScroll(page: Page): Promise<void> {
  const [content = 0, screen = 0] = await page.evaluate(() => [
    document.documentElement.scrollWidth,
    window.innerWidth,
  ]);
  expect(content).toBeLessThanOrEqual(screen);
}

/** A step stands the same after the page is loaded anew, and axe finds nothing wrong with it. */
export async function expectStep(page: Page, title: string | RegExp): Promise<void> {
  await expect(heading(page, title)).toBeVisible();
  await page.reload();
  await expect(heading(page, title)).toBeVisible();
  await expectAccessible(page);
  await expectNoSidewaysScroll(page);
}

/** One run of a known sequence: started, waited for and read. */
export async function runAndRead(page: Page, startMl: string, endMl: string): Promise<void> {
  await field(page, "Level before the run").fill(startMl);
  await button(page, /^Start$/).click();
  await page.clock.runFor(61_000);
  await link(page, "Read the level").click();
  await field(page, "Level after the run").fill(endMl);
  await button(page, "That is the level").click();
}

export async function closeOut(page: Page): Promise<void> {
  for (const tick of await page.getByRole("checkbox").all()) await tick.check();
}

/** The entries of the rider's one bike, as the server has them. */
export async function entriesOnServer(rider: Rider): Promise<LogEntry[]> {
  const answer = await rider.call("POST", "/api/sync", { known: {}, entries: [] });
  const { bikes } = syncResponseSchema.parse(await answer.json());
  return (bikes[0]?.entries ?? []) as unknown as LogEntry[];
}
