import type { Page } from "@playwright/test";
import { logbook } from "../helpers/logbook-in-words.ts";
import {
  expect,
  expectAccessible,
  expectNoSidewaysScroll,
  setLetters,
  test,
  testAlone,
  waitUntilInstalled,
  waitUntilSent,
} from "./fixtures.ts";
import { logLines, openBike } from "./open-bike.ts";

const moss = () => logbook().bike({ name: "Moss" }).check(12, [3]).hours(24.5);
const write = (page: Page, what: string) =>
  page.getByRole("navigation", { name: "Write in the log" }).getByRole("link", { name: what });
const hours = (page: Page, name: string | RegExp = "Engine hours") =>
  page.getByRole("textbox", { name });
const save = (page: Page) => page.getByRole("button", { name: "Save", exact: true }).click();

testAlone(
  "A rider can write every kind of entry with no network, and it is sent later",
  async ({ page, rider, server }) => {
    await openBike(page, rider, moss());
    await waitUntilInstalled(page);
    await server.stop();

    await write(page, "Hours").click();
    await expect(hours(page)).toHaveValue("24.5");
    await page.getByRole("button", { name: "Engine hours: more" }).click();
    await page.getByLabel("Note").fill("A ride along the moor");
    await save(page);
    await expect(page.getByRole("main").getByRole("status").first()).toHaveText(
      "Saved on this phone",
    );
    await expect(logLines(page).first()).toContainText(/Hours\s*24\.6\sh.*A ride along the moor/);

    await write(page, "Top-up").click();
    await page.getByRole("textbox", { name: "Oil added" }).fill("450");
    await page.getByLabel("The oil tank is full now").check();
    await page.getByRole("textbox", { name: "Fuel added" }).fill("8,5");
    await save(page);
    await expect(logLines(page).first()).toContainText(/Oil 450\smL, filled up · Fuel 8\.5\sL/);

    await write(page, "Note").click();
    await page.getByLabel("What is worth keeping?").fill("Smokes when cold");
    await save(page);
    await expect(logLines(page).first()).toContainText("Smokes when cold");

    await write(page, "Meter change").click();
    await expect(hours(page, /old meter/)).toHaveValue("24.6");
    await hours(page, /old meter/).fill("24.7");
    await hours(page, /new meter/).fill("0.5");
    await save(page);
    await expect(logLines(page).first()).toContainText(
      /The old meter showed 24\.7\sh · The new one starts at 0\.5\sh/,
    );
    const now = page.getByRole("region", { name: "What to do now" });
    await expect(now).toContainText(/Over the bike's life\s*24\.7\sh/);

    await write(page, "Work").click();
    await page.getByLabel("Pump renewed").check();
    await hours(page).fill("0.5");
    await save(page);
    await expect(logLines(page).first()).toContainText("Pump renewed · Starts a new baseline");
    await expect(page.getByText("No check yet")).toBeVisible();
    await expect(page.getByText(/^Offline · 5 entries wait since/)).toBeVisible();

    await server.start();
    await page.getByRole("button", { name: "Send and fetch now" }).click();
    await waitUntilSent(page);
    await expect(logLines(page).first()).toContainText("Sent");
    expect(await rider.bikes()).toMatchObject([
      {
        verdict: "none",
        hours: { displayOffset: 24.2 },
        series: [{}, { items: ["pump-renewed"] }],
      },
    ]);
  },
);

test("A new baseline is proposed where the delivery changes, and the rider decides", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, moss());
  await write(page, "Work").click();
  const starts = page.getByLabel("Starts a new baseline");
  await page.getByLabel("Screen or filter cleaned").check();
  await expect(starts).not.toBeChecked();
  await expect(page.getByText(/the old baseline stays/)).toBeVisible();
  await page.getByLabel("Controller updated").check();
  await expect(starts).toBeChecked();
  await expect(page.getByText(/becomes the new baseline/)).toBeVisible();
  await starts.uncheck();
  await page.getByLabel("Pump renewed").check();
  await expect(starts).not.toBeChecked();
});

test("What does not fit is said by field, and nothing typed is lost", async ({ page, rider }) => {
  await openBike(page, rider, moss());
  await write(page, "Hours").click();
  await hours(page).fill("twelve");
  await page.getByLabel("Note").fill("x".repeat(2_001));
  await save(page);
  await expect(hours(page)).toHaveAccessibleDescription(/must be a number of hours/);
  await expect(page.getByLabel("Note")).toHaveAccessibleDescription(/at most 2,000 characters/);
  await expect(hours(page)).toHaveValue("twelve");
  await expectAccessible(page);
  await hours(page).fill("-1");
  await page.getByLabel("Note").fill("Short");
  await save(page);
  await expect(hours(page)).toHaveAccessibleDescription(/cannot be negative/);
  await expect(page.getByLabel("Note")).toHaveValue("Short");

  await page.goBack();
  await write(page, "Top-up").click();
  await save(page);
  await expect(page.getByRole("textbox", { name: "Oil added" })).toHaveAccessibleDescription(
    /how much oil or fuel/,
  );
  await page.goBack();
  await write(page, "Work").click();
  await save(page);
  await expect(page.getByText("Say what was done.")).toBeVisible();
});

test("What was typed stays where the phone cannot save it, until it can", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, moss());
  await write(page, "Note").click();
  await page.getByLabel("What is worth keeping?").fill("Smokes when cold");
  await page.evaluate(() => {
    const add = Object.getOwnPropertyDescriptor(IDBObjectStore.prototype, "add")!;
    IDBObjectStore.prototype.add = () => {
      Object.defineProperty(IDBObjectStore.prototype, "add", add);
      throw new DOMException("The disk is full", "QuotaExceededError");
    };
  });
  await save(page);
  await expect(page.getByRole("alert")).toContainText("Not saved yet");
  await expect(page.getByLabel("What is worth keeping?")).toHaveValue("Smokes when cold");
  await save(page);
  await expect(logLines(page).first()).toContainText("Smokes when cold");
});

test("A rider with an hh:mm meter types hours and minutes", async ({ page, rider }) => {
  const book = logbook().bike({ name: "Moss", meterFormat: "hh:mm" }).hours(9.75);
  await openBike(page, rider, book);
  await write(page, "Hours").click();
  const group = page.getByRole("group", { name: "Engine hours" });
  await expect(group.getByLabel("Hours", { exact: true })).toHaveValue("9");
  await expect(group.getByRole("textbox", { name: "Minutes" })).toHaveValue("45");
  await group.getByLabel("Hours", { exact: true }).fill("11");
  await group.getByRole("textbox", { name: "Minutes" }).fill("15");
  await save(page);
  await expect(logLines(page).first()).toContainText(/11:15\sh/);
});

test("A rider can write down what happened days ago, by keyboard alone", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, moss());
  await write(page, "Note").focus();
  await page.keyboard.press("Enter");
  await page.getByLabel("What is worth keeping?").focus();
  await page.keyboard.type("Fell over in the ford");
  await page.getByLabel("When").fill("2026-03-15T18:30");
  await page.keyboard.press("Tab");
  await page.getByRole("button", { name: "Save", exact: true }).focus();
  await page.keyboard.press("Enter");
  const line = logLines(page).filter({ hasText: "Fell over in the ford" });
  await expect(line).toContainText("15 Mar 2026, 18:30");
});

test("Every form can be read and reached", async ({ page, rider }) => {
  const path = await openBike(page, rider, moss());
  for (const kind of ["hours", "work", "meter", "topup", "note", "nothing"]) {
    await page.goto(`${path}/log/${kind}`);
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
    await expectAccessible(page);
    await page.setViewportSize({ width: 320, height: 640 });
    for (const size of ["16px", "32px"]) {
      await setLetters(page, size);
      await expectNoSidewaysScroll(page, `${kind}, ${size}`);
    }
  }
});
