import { bikeEntry, checkEntry, hoursEntry, newId } from "../helpers/make-entry.ts";
import {
  expect,
  expectAccessible,
  expectNoSidewaysScroll,
  inTopBar,
  openAs,
  Rider,
  setLetters,
  signUp,
  test,
  testAlone,
  waitUntilInstalled,
  waitUntilSent,
} from "./fixtures.ts";
import type { Page } from "@playwright/test";

const card = (page: Page, name: string) => page.getByRole("region", { name });
const daysAgo = (days: number) => new Date(Date.now() - days * 86_400_000).toISOString();

test("A rider can add a bike and log its hours in two taps and a number", async ({
  page,
  rider,
}) => {
  await signUp(page, rider.email);
  await page.getByRole("link", { name: "Add a bike" }).click();
  await page.getByLabel("Name").fill("Heather");
  await page.getByRole("button", { name: "Save the bike" }).click();

  const heather = card(page, "Heather");
  await expect(heather).toContainText("Now");
  await expect(heather).toContainText("first check is due");
  await heather.getByRole("button", { name: "Log hours" }).click();
  await expect(page.getByRole("textbox", { name: "Engine hours" })).toBeFocused();
  await page.keyboard.type("12,4");
  await page.getByRole("button", { name: "Save hours" }).click();
  await expect(page.getByRole("dialog")).toBeHidden();
  await waitUntilSent(page);

  await heather.getByRole("button", { name: "Log hours" }).click();
  await expect(page.getByRole("textbox", { name: "Engine hours" })).toHaveValue("12.4");
  await page.getByRole("button", { name: "Engine hours: more" }).click();
  await expect(page.getByRole("textbox", { name: "Engine hours" })).toHaveValue("12.5");

  await rider.signIn();
  const bikes = await rider.bikes<{ name: string; hours: { now: number } }>();
  expect(bikes.map(({ name, hours }) => [name, hours.now])).toEqual([["Heather", 12.4]]);
});

test("A rider is told that a reading does not fit, saves it all the same and confirms it", async ({
  page,
  rider,
}) => {
  const bikeId = newId();
  await rider.signUp();
  await rider.push([
    bikeEntry(bikeId),
    checkEntry(bikeId, 12, 3, daysAgo(9)),
    hoursEntry(bikeId, 16, daysAgo(2)),
  ]);
  await openAs(rider, page);
  const moss = card(page, "Moss");
  await expect(moss).toContainText("16.0 h to the next check");

  await moss.getByRole("button", { name: "Log hours" }).click();
  await page.getByRole("textbox", { name: "Engine hours" }).fill("160");
  await expect(page.getByText("more hours than have passed")).toBeVisible();
  await expectAccessible(page);
  await page.getByRole("button", { name: "Save hours" }).click();
  await expect(moss).toContainText("Does the meter show 160.0 h?");
  await expect(moss).toContainText("16.0 h to the next check");

  await moss.getByRole("button", { name: "Yes, the meter shows this" }).click();
  await expect(moss).toContainText("128.0 h over");
});

test("A rider sees the worst bike first, and a hose that may be off before all", async ({
  page,
  rider,
}) => {
  const [sound, low, open] = [newId(), newId(), newId()];
  await rider.signUp();
  await rider.push([
    bikeEntry(sound, { name: "Sound" }),
    checkEntry(sound, 12, 3, daysAgo(40)),
    checkEntry(sound, 30, 2.95, daysAgo(9)),
    bikeEntry(low, { name: "Low" }),
    checkEntry(low, 12, 3, daysAgo(40)),
    checkEntry(low, 32, 2.5, daysAgo(9)),
    bikeEntry(open, { name: "Left open" }),
    {
      ...checkEntry(open, 12, 3, daysAgo(9)),
      body: { syringe: null, runs: [{ deliveredMl: 3 }], closedOut: false },
    },
    bikeEntry(newId(), { name: "Sold", retired: true }),
  ]);
  await openAs(rider, page);
  await expect(page.getByRole("heading", { level: 2 })).toHaveText(["Left open", "Low", "Sound"]);
  await expect(card(page, "Left open")).toContainText("Hose may be off: do not start");
  await expect(card(page, "Left open")).not.toContainText("Ride on");
  await expect(card(page, "Low")).toContainText("Stop, find the cause");
  await expect(card(page, "Low")).toContainText("Delivery low");
  await expect(card(page, "Low").getByRole("img")).toHaveAccessibleName(/under the limit of 2\.5/);
  await expect(card(page, "Sound")).toContainText("Ride on");

  await expect(page.getByRole("link", { name: "Sold" })).toBeHidden();
  await page.getByText("Retired (1)").click();
  await expect(page.getByRole("link", { name: "Sold" })).toBeVisible();
});

testAlone(
  "A rider is told of unsent entries before signing out, and keeps them",
  async ({ page, rider, server }) => {
    const bikeId = newId();
    await rider.signUp();
    await rider.push([bikeEntry(bikeId), hoursEntry(bikeId, 3, daysAgo(2))]);
    await openAs(rider, page);
    await expect(card(page, "Moss")).toBeVisible();
    await waitUntilSent(page);
    await waitUntilInstalled(page);

    await server.stop();
    await card(page, "Moss").getByRole("button", { name: "Log hours" }).click();
    await page.getByRole("textbox", { name: "Engine hours" }).fill("5");
    await page.getByRole("button", { name: "Save hours" }).click();
    await expect(card(page, "Moss")).toContainText("Saved on this phone");
    await expect(page.getByText(/^Offline · 1 entry waits since/)).toBeVisible();

    await inTopBar(page, "Account").click();
    await page.getByRole("button", { name: "Sign out" }).click();
    await expect(page.getByRole("dialog", { name: "1 entry is not sent yet" })).toBeVisible();
    await page.getByRole("button", { name: "Sign out, keep them here" }).click();
    await expect(page.getByRole("alert")).toContainText("Signing out needs the network");

    const download = page.waitForEvent("download");
    await page.getByRole("button", { name: "Close" }).click();
    await page.getByRole("button", { name: "Save these as a file" }).click();
    expect((await download).suggestedFilename()).toMatch(/^sumpless-not-sent-.*\.json$/);

    await server.start();
    await page.getByRole("button", { name: "Send and fetch now" }).click();
    await waitUntilSent(page);
    await page.getByRole("button", { name: "Sign out" }).click();
    await expect(page).toHaveURL("/sign-in");
  },
);

test("A wrong password and a taken address are said, and what was typed is kept", async ({
  page,
  rider,
}) => {
  await rider.signUp();
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill(rider.email);
  await page.getByLabel("Password", { exact: true }).fill("not this one at all");
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByRole("alert")).toBeVisible();
  await expect(page.getByLabel("E-mail")).toHaveValue(rider.email);

  await page.goto("/sign-up");
  await page.getByRole("button", { name: "Create the account" }).click();
  await expect(page.getByLabel("Your name")).toBeFocused();
  await page.getByLabel("Your name").fill("Wren");
  await page.getByLabel("E-mail").fill(rider.email);
  await page.getByLabel("Password", { exact: true }).fill(Rider.password);
  await page.getByRole("button", { name: "Create the account" }).click();
  await expect(page.getByLabel("E-mail")).toHaveAccessibleDescription(/already an account/);
  await expect(page).toHaveURL("/sign-up");
});

for (const colorScheme of ["light", "dark"] as const)
  test(`A rider can read and reach everything in the ${colorScheme} theme`, async ({
    page,
    rider,
  }) => {
    const bikeId = newId();
    await rider.signUp();
    await rider.push([
      bikeEntry(bikeId, { name: "A bike with quite a long name, written out in full" }),
      checkEntry(bikeId, 112.5, 3, daysAgo(40)),
      checkEntry(bikeId, 132.5, 2.7, daysAgo(9)),
    ]);
    await page.emulateMedia({ colorScheme });
    await rider.enterOn(page.context());
    for (const path of [
      "/",
      "/bikes/new",
      "/account",
      "/sign-in",
      "/sign-up",
      "/forgot",
      "/nowhere",
    ]) {
      await page.goto(path);
      await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
      if (path === "/") await expect(page.getByRole("region")).toBeVisible();
      await expectAccessible(page);
    }
  });

test("A rider can use a narrow phone and letters twice as large without scrolling sideways", async ({
  page,
  rider,
}) => {
  const bikeId = newId();
  await rider.signUp();
  await rider.push([
    bikeEntry(bikeId, { name: "A bike with quite a long name", meterFormat: "hh:mm" }),
    checkEntry(bikeId, 112.5, 3, daysAgo(40)),
    hoursEntry(bikeId, 250, daysAgo(9)),
  ]);
  await page.setViewportSize({ width: 320, height: 640 });
  await rider.enterOn(page.context());
  for (const path of ["/", "/bikes/new", "/account", "/sign-in", "/sign-up"]) {
    await page.goto(path);
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
    if (path === "/") await expect(page.getByRole("region")).toBeVisible();
    for (const size of ["16px", "32px"]) {
      await setLetters(page, size);
      await expectNoSidewaysScroll(page, `${path} at ${size}`);
    }
  }
});

test("A rider's choice of theme outlives a reload", async ({ page, rider }) => {
  await rider.signUp();
  await openAs(rider, page);
  const ground = () =>
    page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);
  const light = await ground();
  await inTopBar(page, "Account").click();
  await page.getByText("Dark", { exact: true }).click();
  await expect.poll(ground).not.toBe(light);
  const dark = await ground();
  await page.reload();
  await expect(page.getByRole("radio", { name: "Dark" })).toBeChecked();
  await expect.poll(ground).toBe(dark);
});
