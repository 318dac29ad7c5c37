import { readFile } from "node:fs/promises";
import { bikeEntry, newId, noteEntry } from "../helpers/make-entry.ts";
import { clubOf, member, share } from "./club-scene.ts";
import { expect, expectAccessible, inTopBar, openAs, test, waitUntilSent } from "./fixtures.ts";
import { putInStore } from "./open-bike.ts";
import { logLine, saveNote, sendNow, writeNote } from "./write-notes.ts";

test("A mechanic can discard what a withdrawn bike no longer takes, and is asked first", async ({
  page,
  server,
}) => {
  const [odo, wren] = [await member(server, "Odo"), await member(server, "Wren")];
  const club = await clubOf(odo, wren);
  const bikeId = newId();
  await wren.push([bikeEntry(bikeId, { name: "Heather" })]);
  await share(wren, bikeId, club);

  await openAs(odo, page, `/bikes/${bikeId}`);
  await expect(page.getByRole("heading", { name: "Heather" })).toBeVisible();
  await waitUntilSent(page);
  await page.route("**/api/sync", (route) => route.abort());
  await writeNote(page, "Screen half blocked");
  await wren.call("DELETE", `/api/bikes/${bikeId}/shares/${club.id}`);
  await page.unrouteAll({ behavior: "wait" });
  await sendNow(page);
  const bar = page.getByRole("status").filter({ hasText: "1 not accepted" });
  await expect(bar).toBeVisible();

  await page.getByRole("link", { name: "See which" }).click();
  await page.getByText("Not sent yet: 1").click();
  const line = page.getByRole("listitem").filter({ hasText: "Not accepted" });
  await expect(line).toContainText("Its bike is no longer on this phone.");
  await line.getByRole("button", { name: "Discard" }).click();
  const question = page.getByRole("dialog", { name: "Discard this entry?" });
  await expect(question).toBeVisible();
  await expectAccessible(page);
  const download = page.waitForEvent("download");
  await question.getByRole("button", { name: "Save it as a file" }).click();
  expect(await readFile(await (await download).path(), "utf8")).toContain("Screen half blocked");
  await question.getByRole("button", { name: "Leave it here" }).click();
  await expect(bar).toBeVisible();

  await line.getByRole("button", { name: "Discard" }).click();
  await question.getByRole("button", { name: "Discard it for good" }).click();
  await expect(page.getByText("Every entry has been sent.")).toBeVisible();
  await expect(page.getByText(/^All sent/)).toBeVisible();
  await page.reload();
  await expect(page.getByText("Every entry has been sent.")).toBeVisible();
});

test("A rider who writes a refused entry anew is told of it no more", async ({
  page,
  rider,
  server,
}) => {
  const other = await member(server, "Fern");
  const elsewhere = newId();
  const taken = noteEntry(elsewhere, "Somebody else's");
  await other.push([bikeEntry(elsewhere), taken]);
  const bikeId = newId();
  await rider.signUp();
  await rider.push([bikeEntry(bikeId, { name: "Heather" })]);
  await openAs(rider, page, `/bikes/${bikeId}`);
  await expect(page.getByRole("heading", { name: "Heather" })).toBeVisible();
  await waitUntilSent(page);
  await putInStore(page, { ...noteEntry(bikeId), id: taken.id });
  await sendNow(page);
  await expect(page.getByText(/1 not accepted/)).toBeVisible();

  await page.getByRole("link", { name: "Write it anew" }).click();
  await saveNote(page);
  await expect(logLine(page, "Chain oiled")).toHaveCount(2);
  await expect(page.getByText(/^All sent/)).toBeVisible();
  await inTopBar(page, "Account").click();
  await expect(page.getByText("Every entry has been sent.")).toBeVisible();
});
