import type { Page } from "@playwright/test";
import { expect, type Rider } from "./fixtures.ts";

export const card = (page: Page, name: string) => page.getByRole("region", { name });

/** Adds a bike from the Shed, and answers its address. */
export async function addBike(page: Page, name: string): Promise<string> {
  await page.getByRole("link", { name: "Add a bike" }).click();
  await page.getByLabel("Name", { exact: true }).fill(name);
  await page.getByRole("button", { name: "Save the bike" }).click();
  const link = card(page, name).getByRole("link", { name });
  await expect(link).toBeVisible();
  return (await link.getAttribute("href"))!;
}

/** Fills the form for a note on a bike, and leaves it unsaved. */
export async function fillNote(page: Page, text: string): Promise<void> {
  const actions = page.getByRole("navigation", { name: "Write in the log" });
  await actions.getByRole("link", { name: "Note" }).click();
  await page.getByLabel("What is worth keeping?").fill(text);
}

export const saveNote = (page: Page) =>
  page.getByRole("button", { name: "Save", exact: true }).click();

/** Writes a note from the page of its bike, and waits until it is said to be saved. */
export async function writeNote(page: Page, text: string): Promise<void> {
  await fillNote(page, text);
  await saveNote(page);
  await expect(page.getByRole("main").getByRole("status").first()).toHaveText(
    "Saved on this phone",
  );
}

export const logLine = (page: Page, text: string) =>
  page
    .getByRole("list", { name: "Entries, newest first" })
    .locator("> li")
    .filter({ has: page.getByText(text, { exact: true }) });

export const sendNow = (page: Page) =>
  page.getByRole("button", { name: "Send and fetch now" }).click();

interface Served {
  id: string;
  kind: string;
  body: { text?: string };
}

/** What the server holds of the account's bikes. */
export async function entriesOnServer(rider: Rider): Promise<Served[]> {
  const answer = await rider.call("POST", "/api/sync", { known: {}, entries: [] });
  const { bikes } = (await answer.json()) as { bikes: { entries: Served[] }[] };
  return bikes.flatMap(({ entries }) => entries);
}

export const notesOnServer = async (rider: Rider) =>
  (await entriesOnServer(rider)).flatMap(({ body }) => body.text ?? []).sort();
