import { bikeEntry, checkEntry, newId, noteEntry } from "../helpers/make-entry.ts";
import { daysAgo, withBaseline } from "./check-scene.ts";
import { clubOf, member, share } from "./club-scene.ts";
import { expect, expectAccessible, inTopBar, openAs, test } from "./fixtures.ts";
import { sendNow } from "./write-notes.ts";

test("A mechanic at the station reads that a stop still stands, however good the check", async ({
  page,
  server,
}) => {
  const [odo, wren] = [await member(server, "Odo"), await member(server, "Wren")];
  const club = await clubOf(odo, wren);
  const bikeId = newId();
  await wren.push([
    bikeEntry(bikeId, { name: "Moss" }),
    checkEntry(bikeId, 12, 3, daysAgo(30)),
    { ...noteEntry(bikeId, "Hose is cracked", "stop"), at: daysAgo(1) },
  ]);
  await share(wren, bikeId, club);

  await openAs(odo, page);
  await inTopBar(page, "Clubs").click();
  await page.getByRole("link", { name: "Test day" }).click();
  await page.getByRole("button", { name: "Add a syringe" }).click();
  await page.getByRole("dialog").getByRole("radio", { name: /^5 mL/ }).check();
  await page.getByRole("button", { name: "Save the syringe" }).click();
  await page.getByRole("searchbox", { name: "Find" }).fill("moss");
  await page.keyboard.press("Enter");
  await page.getByRole("link", { name: "Start: Moss" }).click();

  await page.getByRole("textbox", { name: "Engine hours" }).fill("32.0");
  await page.getByRole("textbox", { name: "Run 1: level after" }).fill("3.0");
  const soFar = page.getByRole("region", { name: "So far" });
  await expect(soFar).toContainText("Delivery holding");
  await expect(soFar).toContainText("The stop that was advised still stands.");
  await expect(page.getByText("Ride on")).toHaveCount(0);
  await expectAccessible(page);

  await page.getByRole("checkbox", { name: /^Closed out/ }).check();
  await page.getByRole("button", { name: "Save the check" }).click();
  await page.getByRole("button", { name: "All done: to the test day" }).click();
  const done = page.getByRole("region", { name: /^Done/ });
  await expect(done).toContainText("Stop, find the cause");
  await expect(done).not.toContainText("Ride on");
});

test("A rider reads the same in the quick form", async ({ page, rider }) => {
  const bikeId = await withBaseline(page, rider);
  await rider.push([noteEntry(bikeId, "Hose is cracked", "stop")]);
  await page.goto(`/bikes/${bikeId}`);
  await sendNow(page);
  await expect(page.getByRole("alert")).toContainText("Hose is cracked");
  await page.goto(`/bikes/${bikeId}/check/quick`);
  await page.getByRole("textbox", { name: "Engine hours" }).fill("32");
  await page.getByRole("textbox", { name: "Run 1: level after" }).fill("2.95");
  const soFar = page.getByRole("region", { name: "So far" });
  await expect(soFar).toContainText("The stop that was advised still stands.");
  await expect(soFar).not.toContainText("Ride on");
});
