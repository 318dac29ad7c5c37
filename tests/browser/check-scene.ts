/** What the browser tests of the delivery check share: a bike with a baseline, and its screens. */
import type { Page } from "@playwright/test";
import type { LogEntry } from "../../shared/schemas/entry.ts";
import { syncResponseSchema } from "../../shared/schemas/sync.ts";
import { bikeEntry, checkEntry, newId } from "../helpers/make-entry.ts";
import {
  expect,
  expectAccessible,
  expectNoSidewaysScroll,
  openAs,
  waitUntilDrafted,
  type Rider,
} from "./fixtures.ts";

export const short = { seconds: 30, rhythm: "steady", nominalMl: 3 } as const;
export const daysAgo = (days: number) => new Date(Date.now() - days * 86_400_000).toISOString();

/** A bike whose sequence is known, with a baseline of 3 mL from four runs at 12.0 h. */
export async function withBaseline(page: Page, rider: Rider): Promise<string> {
  const bikeId = newId();
  const baseline = checkEntry(bikeId, 12, 3, daysAgo(40));
  baseline.body.runs = Array.from({ length: 4 }, () => ({ startMl: 0, endMl: 3 }));
  await rider.signUp();
  await rider.push([bikeEntry(bikeId, { name: "Moss", sequence: short }), baseline]);
  await openAs(rider, page);
  await expect(page.getByRole("region", { name: "Moss" })).toBeVisible();
  return bikeId;
}

/**
 * Stops the clock; the answer lets so many seconds pass. A run is then as long as the test says,
 * however slow the machine is.
 */
export async function stopClock(page: Page) {
  let nowMs = Date.now();
  await page.clock.setFixedTime(nowMs);
  return (seconds: number) => page.clock.setFixedTime((nowMs += 1000 * seconds));
}

export const button = (page: Page, name: string | RegExp) => page.getByRole("button", { name });
export const link = (page: Page, name: string | RegExp) => page.getByRole("link", { name });
export const field = (page: Page, name: string) => page.getByRole("textbox", { name });
export const heading = (page: Page, name: string | RegExp) =>
  page.getByRole("heading", { name, level: 1 });

/**
 * A step stands the same after the page is loaded anew, and axe finds nothing wrong with it.
 * `drafted`: what was done last, as the phone's store has it.
 */
export async function expectStep(
  page: Page,
  title: string | RegExp,
  drafted?: string,
): Promise<void> {
  await expect(heading(page, title)).toBeVisible();
  if (drafted) await waitUntilDrafted(page, drafted);
  await page.reload();
  await expect(heading(page, title)).toBeVisible();
  await expectAccessible(page);
  await expectNoSidewaysScroll(page);
}

/** Starts a run, and sees it run. */
export async function startRun(page: Page): Promise<void> {
  await button(page, /^Start$/).click();
  await expect(page.getByRole("timer")).toContainText(/^0/);
}

/** One run of a known sequence: started, waited for and read. */
export async function runAndRead(
  page: Page,
  pass: (seconds: number) => Promise<void>,
  startMl: string,
  endMl: string,
): Promise<void> {
  await field(page, "Level before the run").fill(startMl);
  await startRun(page);
  await pass(61);
  await link(page, "Read the level").click();
  await field(page, "Level after the run").fill(endMl);
  await button(page, "That is the level").click();
}

/** Ticks all that makes the bike safe. */
export async function closeOut(page: Page): Promise<void> {
  const ticks = page.getByRole("checkbox");
  await expect(ticks).toHaveCount(5);
  for (const tick of await ticks.all()) await tick.check();
  await expect(page.getByRole("checkbox", { checked: true })).toHaveCount(5);
}

/** The entries of the rider's one bike, as the server has them. */
export async function entriesOnServer(rider: Rider): Promise<LogEntry[]> {
  const answer = await rider.call("POST", "/api/sync", { known: {}, entries: [] });
  const { bikes } = syncResponseSchema.parse(await answer.json());
  return (bikes[0]?.entries ?? []) as unknown as LogEntry[];
}
