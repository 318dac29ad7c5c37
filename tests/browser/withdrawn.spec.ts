import type { Page } from "@playwright/test";
import { readFile } from "node:fs/promises";
import { bikeTag } from "../../shared/logbook/bike-tag.ts";
import type { Club } from "../../shared/schemas/club.ts";
import { bikeEntry, checkEntry, newId } from "../helpers/make-entry.ts";
import { clubOf, exchange, member, remembered, share } from "./club-scene.ts";
import {
  expect,
  expectAccessible,
  openAs,
  rowsOnPhone,
  test,
  testAlone,
  waitUntilDrafted,
  waitUntilInstalled,
  type Rider,
} from "./fixtures.ts";

/** A rider's bike with one check, shared with the club. */
async function shareNewBike(rider: Rider, name: string, club: Club): Promise<string> {
  const bikeId = newId();
  const check = checkEntry(bikeId, 12, 3, "2026-03-02T09:00:00.000Z");
  await rider.push([bikeEntry(bikeId, { name }), check]);
  await share(rider, bikeId, club);
  return bikeId;
}

async function does(rider: Rider, method: string, path: string, body?: object): Promise<void> {
  expect((await rider.call(method, path, body)).ok).toBe(true);
}

/** The Line-up is looked at and left, which is all that this phone ever had of its bikes. */
async function lookAtLineUp(page: Page, club: Club): Promise<void> {
  await page.goto(`/clubs/${club.id}`);
  await expect(page.getByRole("link", { name: /Moss/ })).toBeVisible();
  await remembered(page, "Moss");
  await page.goto("/");
  await expect(page.getByRole("link", { name: "Clubs" })).toBeVisible();
  await waitUntilInstalled(page);
}

/** What the phone holds in localStorage, a second after it last changed. */
const forgotten = (page: Page, words: string) =>
  expect.poll(() => page.evaluate(() => JSON.stringify(localStorage))).not.toContain(words);

testAlone(
  "A mechanic's phone shows no bike that was withdrawn while it was at another page",
  async ({ page, server }) => {
    const [maud, wren] = [await member(server, "Maud"), await member(server, "Wren")];
    const club = await clubOf(maud, wren);
    await shareNewBike(wren, "Fern", club);
    const bikeId = await shareNewBike(wren, "Moss", club);
    await maud.enterOn(page.context());
    await lookAtLineUp(page, club);

    await does(wren, "DELETE", `/api/bikes/${bikeId}/shares/${club.id}`);
    await exchange(page);
    await forgotten(page, "Moss");
    await server.stop();
    await page.getByRole("link", { name: "Clubs" }).click();
    await page.getByRole("link", { name: "Line-up" }).click();
    await expect(page.getByRole("link", { name: /Fern/ })).toBeVisible();
    await expect(page.getByRole("link", { name: /Moss/ })).toBeHidden();
    await page.reload();
    await expect(page.getByRole("link", { name: /Fern/ })).toBeVisible();
    await expect(page.getByRole("link", { name: /Moss/ })).toBeHidden();
  },
);

testAlone(
  "A mechanic who was removed from the club has nothing of it on the phone any more",
  async ({ page, server }) => {
    const [odo, wren] = [await member(server, "Odo"), await member(server, "Wren")];
    const maud = await member(server, "Maud");
    const club = await clubOf(odo, wren, maud);
    await does(odo, "PUT", `/api/clubs/${club.id}/members/${maud.id}`, { mechanic: true });
    await shareNewBike(wren, "Moss", club);
    await maud.enterOn(page.context());
    await lookAtLineUp(page, club);

    await does(odo, "DELETE", `/api/clubs/${club.id}/members/${maud.id}`);
    await exchange(page);
    for (const name of ["Moss", "Wren", club.name]) await forgotten(page, name);
    await server.stop();
    await page.goto(`/clubs/${club.id}`);
    await expect(page.getByRole("heading", { name: "This club is not here" })).toBeVisible();
  },
);

test("A check half typed when its bike is withdrawn can still be saved as a file", async ({
  page,
  server,
}) => {
  const [maud, wren] = [await member(server, "Maud"), await member(server, "Wren")];
  const club = await clubOf(maud, wren);
  const bikeId = await shareNewBike(wren, "Moss", club);
  await openAs(maud, page, `/clubs/${club.id}/test-day`);
  await page.getByRole("button", { name: "Add a syringe" }).click();
  await page.getByRole("dialog").getByRole("radio", { name: /^5 mL/ }).check();
  await page.getByRole("button", { name: "Save the syringe" }).click();
  await page.getByRole("button", { name: /Moss/ }).click();
  await expect(page.getByText("All their logs are on this phone")).toBeVisible();
  await page.getByRole("link", { name: "Start: Moss" }).click();
  await page.getByRole("textbox", { name: "Run 1: level after" }).fill("2.9");
  await waitUntilDrafted(page, '"endText":"2.9"');

  await does(wren, "DELETE", `/api/bikes/${bikeId}/shares/${club.id}`);
  await exchange(page);
  await expect(page.getByRole("heading", { name: "This bike is not in the queue" })).toBeVisible();
  await page.getByRole("link", { name: "To the test day" }).click();
  await expect(page.getByRole("heading", { name: "Queue: 0" })).toBeVisible();
  await expect(page.getByText(/Moss|Wren/)).toBeHidden();
  await expectAccessible(page);
  const left = page.getByRole("region", { name: "Typed, and not saved" });
  await expect(left).toContainText(`Bike ${bikeTag(bikeId)}`);
  const download = page.waitForEvent("download");
  await left.getByRole("button", { name: "Save it as a file" }).click();
  const file = await readFile(await (await download).path(), "utf8");
  expect(file).toContain(bikeId);
  expect(file).toContain('"endText": "2.9"');

  await page.goto("/clubs");
  await expect(left).toBeVisible();
  await left.getByRole("button", { name: "Discard" }).click();
  await expectAccessible(page);
  await page.getByRole("button", { name: "Discard it for good" }).click();
  await expect(left).toBeHidden();
  expect(JSON.stringify(await rowsOnPhone(page, "drafts"))).not.toContain("endText");
});

test("A Line-up that is as it was is not sent again", async ({ page, server }) => {
  const [maud, wren] = [await member(server, "Maud"), await member(server, "Wren")];
  const club = await clubOf(maud, wren);
  await shareNewBike(wren, "Moss", club);
  await openAs(maud, page, `/clubs/${club.id}`);
  await expect(page.getByRole("link", { name: /Moss/ })).toBeVisible();
  await remembered(page, "Moss");
  const again = page.waitForResponse((response) => response.url().includes("/line-up"));
  await page.reload();
  expect((await again).status()).toBe(304);
  await expect(page.getByText(/^1 bike/)).toBeVisible();

  await shareNewBike(wren, "Fern", club);
  const changed = page.waitForResponse((response) => response.url().includes("/line-up"));
  await page.reload();
  expect((await changed).status()).toBe(200);
  await expect(page.getByRole("link", { name: /Fern/ })).toBeVisible();
});
