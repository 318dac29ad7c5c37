import type { Page } from "@playwright/test";
import { logbook } from "../helpers/logbook-in-words.ts";
import { newId } from "../helpers/make-entry.ts";
import { closeOut } from "./check-scene.ts";
import {
  expect,
  expectAccessible,
  expectNoSidewaysScroll,
  Rider,
  setLetters,
  test,
  testAlone,
  waitUntilInstalled,
} from "./fixtures.ts";
import { logLines, openBike, putInStore } from "./open-bike.ts";

const sequence = { seconds: 30, rhythm: "steady", nominalMl: 3 } as const;

/** A life with everything in it: a struck check, a drop, a new pump, a new meter, doubted hours. */
function fullLife() {
  const book = logbook().bike({ name: "Moss", hasScreen: true, sequence }).check(12, [3, 3.1, 3]);
  book.check(22, [1.6]);
  book.strike(book.lastId, "Read from the wrong end");
  return book
    .check(32, [2.9, 2.95, 3])
    .check(55, [2.7, 2.7, 2.75])
    .check(76, [2.5, 2.5, 2.5])
    .work(77, ["pump-renewed", "hose-renewed"], true)
    .check(78, [3.2, 3.3, 3.2])
    .meter(100.5, 0)
    .hours(4.5)
    .check(10, [3.2, 3.1, 3.2])
    .note("Smokes when cold")
    .hours(2_000);
}

const chart = (page: Page) => page.getByRole("slider", { name: /Delivery over engine hours/ });

test("A rider can see what to do now, why, how sure that is and when the next check is due", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, logbook().bike({ name: "Moss" }).check(12, [3]).check(32, [2.5]));
  const now = page.getByRole("region", { name: "What to do now" });
  await expect(now).toContainText("Stop, find the cause");
  await expect(now).toContainText("Delivery low");
  await expect(now).toContainText(/delivers 83\s% of its baseline.*below the limit of 85\s%/);
  await expect(now).toContainText(
    /65\s% sure the delivery is below the limit; this baseline cannot settle it/,
  );
  await expect(now).toContainText("Now");
  await expect(now).toContainText("Delivery is low: find the cause, then check again.");
  await expect(now).toContainText(/The meter shows\s*32\.0\sh/);
  await expect(now).toContainText(/Ridden a week\s*14\.0\sh/);
  await expect(now.getByRole("img")).toHaveAccessibleName(
    /2\.49\smL a run.*limit of 2\.54\smL.*baseline 2\.99\smL/,
  );
});

test("A rider can see the hours of the meter and of the bike's life where they differ", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, fullLife());
  const now = page.getByRole("region", { name: "What to do now" });
  await expect(now).toContainText(/The meter shows\s*10\.0\sh/);
  await expect(now).toContainText(/Over the bike's life\s*110\.5\sh/);
});

test("A rider is told not to start while the hose may be off, and can close the check out", async ({
  page,
  rider,
}) => {
  const book = logbook().bike({ name: "Moss" }).check(12, [3]);
  await openBike(page, rider, book.check(32, [2.95], { closedOut: false }));
  await expect(page.getByRole("alert")).toContainText("Hose may be off: do not start");
  await expect(page.getByText("Ride on")).toBeHidden();
  await page.getByRole("link", { name: "Close it out" }).click();
  await closeOut(page);
  await page.getByRole("button", { name: "Save the close-out" }).click();
  await expect(page.getByText("Ride on")).toBeVisible();
  await expect(page.getByText("Hose may be off: do not start")).toBeHidden();
  await expect(logLines(page).first()).toContainText("Oil line bled");
});

test("A rider can step through the delivery chart by keyboard, button and tap", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, fullLife());
  const said = page.getByRole("figure").getByRole("status");
  await expect(said).toContainText(/^7 of 7\. 110\.5\sh/);
  await chart(page).focus();
  await page.keyboard.press("ArrowLeft");
  await expect(said).toContainText(/^6 of 7\. 78\.0\sh.*100\s% ± \d\s% of the baseline/);
  await expect(chart(page)).toHaveAttribute("aria-valuetext", "Check 6 of 7");
  await page.keyboard.press("Home");
  await expect(said).toContainText(/^1 of 7\. 12\.0\sh/);
  await page.keyboard.press("ArrowRight");
  await expect(said).toContainText(/22\.0\sh.*Struck, not counted\.$/);
  await page.keyboard.press("End");
  await expect(said).toContainText(/^7 of 7/);

  await page.getByRole("button", { name: "Earlier check" }).click();
  await expect(said).toContainText(/^6 of 7/);
  const box = (await chart(page).boundingBox())!;
  await chart(page).click({ position: { x: 50, y: box.height / 2 } });
  await expect(said).toContainText(/^1 of 7/);
  await expect(chart(page).getByText("Pump renewed, hose renewed")).toBeVisible();
});

test("A rider can read the chart as a table, each series under what began it", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, fullLife());
  const table = page.getByRole("table");
  await expect(table.getByRole("rowheader", { name: /^Pump renewed, hose renewed/ })).toBeVisible();
  await expect(table.getByRole("rowheader", { name: /^First check, 12\.0/ })).toContainText(
    /Baseline 3\.02\smL/,
  );
  await expect(table.getByRole("row", { name: /^76\.0/ })).toContainText(
    /2\.49\smL.*± 0\.\d\d\smL.*82\s%.*Delivery low/,
  );
  await expect(table.getByRole("row", { name: /^22\.0/ })).toContainText("Struck, not counted");
});

test("A rider can confirm hours that were doubted, or strike them", async ({ page, rider }) => {
  await openBike(page, rider, fullLife());
  await expect(page.getByText(/Does the meter show 2000\.0\sh\?/)).toBeVisible();
  await page.getByRole("button", { name: "No, strike it" }).click();
  await page.getByLabel("What was wrong with it?").fill("20.0, not 2000");
  await page.getByRole("button", { name: "Strike it", exact: true }).click();
  await expect(page.getByText(/Does the meter show/)).toBeHidden();

  await page.goto(`${page.url()}/log/hours`);
  await page.getByRole("textbox", { name: "Engine hours" }).fill("5");
  await page.getByRole("button", { name: "Save" }).click();
  await page.getByRole("button", { name: "Yes, the meter shows this" }).click();
  await expect(page.getByText(/Does the meter show/)).toBeHidden();
  await expect(logLines(page).first()).toContainText("Confirms an earlier reading");
});

testAlone(
  "A rider can strike an entry with no network; it stays, ruled through, and is sent later",
  async ({ page, rider, server }) => {
    await openBike(page, rider, logbook().bike({ name: "Moss" }).check(12, [3]).check(32, [2.5]));
    await waitUntilInstalled(page);
    await server.stop();
    const line = logLines(page).filter({ hasText: "32.0" });
    await line.getByRole("button", { name: "Strike" }).click();
    const sheet = page.getByRole("dialog", { name: "Strike this entry?" });
    await sheet.getByRole("button", { name: "Strike it", exact: true }).click();
    await expect(sheet.getByLabel("What was wrong with it?")).toHaveAccessibleDescription(/empty/);
    await sheet.getByLabel("What was wrong with it?").fill("The hose hung in the oil");
    await sheet.getByRole("button", { name: "Strike it", exact: true }).click();
    await expect(line).toContainText("Struck: The hose hung in the oil");
    await expect(logLines(page).first()).toContainText("Saved on this phone");
    await expect(page.getByText("Delivery settling").first()).toBeVisible();

    await server.start();
    await page.getByRole("button", { name: "Send and fetch now" }).click();
    await expect(logLines(page).first()).toContainText("Sent");
    expect(await rider.bikes<{ verdict: string }>()).toMatchObject([{ verdict: "settling" }]);
  },
);

test("A rider can see one kind of entry alone, and what was written in a check", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, fullLife());
  await page.getByLabel("Show").selectOption("Delivery check");
  await expect(logLines(page)).toHaveCount(7);
  const struck = logLines(page).filter({ hasText: "Struck" });
  await expect(struck).toContainText("Read from the wrong end");
  await struck.getByText("What was written").click();
  await expect(struck).toContainText(/Run 1: 0\.00 to 1\.60\smL/);
  await logLines(page).first().getByRole("link", { name: "Result" }).click();
  await expect(page).toHaveURL(/\/check\/result\//);
});

test("A rider sees an entry of a newer app version for what it is", async ({ page, rider }) => {
  const book = logbook().bike({ name: "Moss" }).hours(3);
  const bikeId = (await openBike(page, rider, book)).split("/").at(-1)!;
  const at = new Date().toISOString();
  await putInStore(page, { id: newId(), bikeId, v: 2, kind: "photo", at, hours: 3, body: {} });
  await page.reload();
  await expect(logLines(page).first()).toContainText("Written by a newer version of the app");
  await expect(logLines(page)).toHaveCount(3);
  await expectAccessible(page);
});

test("A rider can mend an entry that the server did not accept, or keep it as a file", async ({
  page,
  rider,
  server,
}) => {
  const book = logbook().bike({ name: "Moss" }).hours(3);
  const bikeId = (await openBike(page, rider, book)).split("/").at(-1)!;
  const taken = newId();
  const other = await new Rider(server.origin).signUp("Fern");
  const elsewhere = newId();
  const note = { id: taken, v: 1, kind: "note", at: new Date().toISOString(), hours: null };
  await other.push([
    { ...note, id: newId(), bikeId: elsewhere, kind: "bike", body: { name: "Fern's" } },
    { ...note, bikeId: elsewhere, body: { text: "Somebody else's" } },
  ]);
  await putInStore(page, { ...note, bikeId, body: { text: "Chain oiled" } });
  await page.reload();
  await page.getByRole("button", { name: "Send and fetch now" }).click();

  const refused = logLines(page).filter({ hasText: "Chain oiled" });
  await expect(refused).toContainText("The server has another entry under the same id");
  await expectAccessible(page);
  const download = page.waitForEvent("download");
  await refused.getByRole("button", { name: "Save as a file" }).click();
  expect((await download).suggestedFilename()).toMatch(/^entry-.*\.json$/);

  await refused.getByRole("link", { name: "Write it anew" }).click();
  await expect(page.getByLabel("What is worth keeping?")).toHaveValue("Chain oiled");
  await page.getByRole("button", { name: "Save" }).click();
  await expect(page).toHaveURL(/\/bikes\/[^/]+$/);
  await expect(refused.filter({ hasText: "Struck: Not accepted" })).toHaveCount(1);
  await expect(refused.filter({ hasText: /Sent/ })).toHaveCount(1);
});

for (const [timezoneId, shown] of [
  ["America/Los_Angeles", "1 Mar 2026, 01:00"],
  ["Pacific/Auckland", "1 Mar 2026, 22:00"],
] as const)
  test.describe(timezoneId, () => {
    test.use({ timezoneId });
    test("A rider sees times in their own zone", async ({ page, rider }) => {
      await openBike(page, rider, logbook("2026-03-01T09:00:00.000Z").bike({ name: "Moss" }));
      await expect(logLines(page).first()).toContainText(shown);
    });
  });

test("A rider on a wide screen has the log beside the chart", async ({ page, rider }) => {
  await page.setViewportSize({ width: 1280, height: 800 });
  await openBike(page, rider, fullLife());
  await expect(async () => {
    const drawn = (await chart(page).boundingBox())!;
    const log = (await page.getByRole("region", { name: "Log" }).boundingBox())!;
    expect(log.x).toBeGreaterThan(drawn.x + drawn.width);
    expect(Math.abs(log.y - drawn.y)).toBeLessThan(100);
  }).toPass();
});

for (const colorScheme of ["light", "dark"] as const)
  test(`A rider can read a bike in the ${colorScheme} theme, at 320 px and with letters twice as large`, async ({
    page,
    rider,
  }) => {
    await page.emulateMedia({ colorScheme });
    await openBike(page, rider, fullLife());
    await expect(chart(page)).toBeVisible();
    await expectAccessible(page);
    for (const width of [320, 1280])
      for (const size of ["16px", "32px"]) {
        await page.setViewportSize({ width, height: 780 });
        await setLetters(page, size);
        await expectNoSidewaysScroll(page, `${width} px, ${size}`);
      }
  });
