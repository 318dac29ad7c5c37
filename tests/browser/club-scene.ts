import type { Browser, Page } from "@playwright/test";
import type { Club } from "../../shared/schemas/club.ts";
import { expect, newEmail, openAs, Rider, waitUntilSent, type Served } from "./fixtures.ts";

/** An account of the scene, by the name that others see. */
export async function member(server: Served, name: string): Promise<Rider> {
  return new Rider(server.origin, newEmail(name.toLowerCase())).signUp(name);
}

async function answer<T>(response: Response): Promise<T> {
  expect(response.ok, `${response.url}: ${response.status}`).toBe(true);
  return (await response.json()) as T;
}

/** A club as its organiser, who is its mechanic too, has it once all have joined. */
export async function clubOf(organiser: Rider, ...riders: Rider[]): Promise<Club> {
  const made = await organiser.call("POST", "/api/clubs", { name: "Moor Riders" });
  const { club } = await answer<{ club: Club }>(made);
  const asked = await organiser.call("POST", `/api/clubs/${club.id}/invites`, { uses: 50 });
  const { url } = await answer<{ url: string }>(asked);
  const token = new URL(url).searchParams.get("token");
  for (const rider of riders)
    await answer(await rider.call("POST", `/api/invites/${token}/accept`));
  const member = `/api/clubs/${club.id}/members/${organiser.id}`;
  await answer(await organiser.call("PUT", member, { mechanic: true }));
  return club;
}

export async function share(rider: Rider, bikeId: string, club: Club): Promise<void> {
  const shared = await rider.call("PUT", `/api/bikes/${bikeId}/shares/${club.id}`);
  expect(shared.status).toBe(204);
}

/** Somebody's own phone, apart from the test's first one. */
export async function phoneOf(browser: Browser, server: Served, rider: Rider) {
  const context = await browser.newContext({
    baseURL: server.origin,
    viewport: { width: 360, height: 780 },
    locale: "en-GB",
    timezoneId: "Europe/Berlin",
  });
  const page = await context.newPage();
  await openAs(rider, page);
  return page;
}

/** Presses the button at the top, and waits until both sides agree. */
export async function exchange(page: Page): Promise<void> {
  const answered = page.waitForResponse((response) => response.url().endsWith("/api/sync"));
  await page.getByRole("button", { name: "Send and fetch now" }).click();
  expect((await answered).ok()).toBe(true);
  await waitUntilSent(page);
}

/** The read cache is written a second behind: waits until it holds what the page shows. */
export const remembered = (page: Page, words: string) =>
  expect.poll(() => page.evaluate(() => JSON.stringify(localStorage))).toContain(words);
