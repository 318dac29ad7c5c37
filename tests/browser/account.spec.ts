import type { Page } from "@playwright/test";
import { readFile } from "node:fs/promises";
import { bikeEntry, checkEntry, newId } from "../helpers/make-entry.ts";
import {
  expect,
  expectAccessible,
  expectNoSidewaysScroll,
  inTopBar,
  openAs,
  Rider,
  setLetters,
  signIn,
  signUp,
  test,
  testAlone,
  waitUntilSent,
} from "./fixtures.ts";
import { mailedLink } from "./mailed-link.ts";

const NEW_PASSWORD = "another pump altogether";

const password = (page: Page, label: string) => page.getByLabel(label, { exact: true });

async function open(page: Page, link: string): Promise<void> {
  await inTopBar(page, "Account").click();
  await page.getByRole("link", { name: link }).click();
  await expect(page.getByRole("heading", { level: 1 })).toBeFocused();
}

/** The databases of logbooks that the phone holds. */
const logbooksOn = (page: Page) =>
  page.evaluate(async () => {
    const names = (await indexedDB.databases()).map(({ name }) => name);
    return names.filter((name) => name?.includes("logbook"));
  });

/** The file that a button saves. */
async function saved(page: Page, button: string) {
  const download = page.waitForEvent("download");
  await page.getByRole("button", { name: button }).click();
  const file = await download;
  return { name: file.suggestedFilename(), text: await readFile(await file.path(), "utf8") };
}

testAlone(
  "A rider can confirm an address, and then move to another one",
  async ({ page, rider, server }) => {
    await signUp(page, rider.email);
    await inTopBar(page, "Account").click();
    await expect(page.getByText("not confirmed yet")).toBeVisible();
    await page.getByRole("button", { name: "Send the link again" }).click();
    await expect(page.getByText("A link is on its way")).toBeVisible();
    await page.goto(await mailedLink(server, "Confirm your e-mail address"));
    await page.getByRole("button", { name: "Yes, this is my address" }).click();
    await expect(page.getByText("Confirmed, thank you")).toBeVisible();

    await open(page, "Change the e-mail address");
    await page.getByLabel("New e-mail").fill("wren@fell.example");
    await password(page, "Your password").fill("not this one");
    await page.getByRole("button", { name: "Send a link" }).click();
    await expect(password(page, "Your password")).toHaveAccessibleDescription(/not your password/);
    await password(page, "Your password").fill(Rider.password);
    await page.getByRole("button", { name: "Send a link" }).click();
    await expect(page.getByRole("status").filter({ hasText: "Look in your mail" })).toBeVisible();
    await expect(page.getByText(`Now it is ${rider.email}`)).toBeVisible();

    await page.goto(await mailedLink(server, "Confirm your new e-mail address"));
    await page.getByRole("button", { name: "Yes, this is my address" }).click();
    await expect(page.getByText("Confirmed, thank you")).toBeVisible();
    await inTopBar(page, "Account").click();
    await expect(page.getByText("wren@fell.example")).toBeVisible();
    await expect(page.getByText("not confirmed yet")).toBeHidden();
  },
);

test("A rider can choose another password, and is kept from one that anybody would try", async ({
  page,
  rider,
}) => {
  await rider.signUp();
  await signIn(page, rider.email);
  await open(page, "Change the password");
  for (const label of ["Present password", "New password"])
    await expect(password(page, label)).toHaveAttribute("type", "password");
  await expect(password(page, "New password")).toHaveAttribute("autocomplete", "new-password");
  await password(page, "Present password").fill(Rider.password);
  await password(page, "New password").fill("password123");
  await page.getByRole("button", { name: "Save the new password" }).click();
  await expect(password(page, "New password")).toHaveAccessibleDescription(/would try/);
  await expect(password(page, "New password")).toBeFocused();
  await password(page, "New password").fill(NEW_PASSWORD);
  await page.getByRole("button", { name: "Save the new password" }).click();
  await expect(page.getByText("Every other device is signed out")).toBeVisible();
  await expect(password(page, "New password")).toHaveValue("");
  expect((await rider.call("GET", "/api/auth/me")).status).toBe(401);
  await page.reload();
  await open(page, "Devices signed in");
  await expect(page.getByRole("listitem")).toHaveCount(1);
});

testAlone("A rider can choose a new password by a mailed link", async ({ page, rider, server }) => {
  await rider.signUp();
  await page.goto("/sign-in");
  await page.getByRole("link", { name: "I forgot my password" }).click();
  await expect(page.getByRole("heading", { name: "A new password" })).toBeVisible();
  await page.getByLabel("E-mail").fill(rider.email);
  await page.getByRole("button", { name: "Send me a link" }).click();
  await expect(page.getByText("Look in your mail")).toBeVisible();
  await page.goto(await mailedLink(server, "Choose a new password"));
  await password(page, "New password").fill(NEW_PASSWORD);
  await page.getByRole("button", { name: "Save the new password" }).click();
  await expect(page).toHaveURL("/sign-in");
  await page.getByLabel("E-mail").fill(rider.email);
  await password(page, "Password").fill(NEW_PASSWORD);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL("/");
});

test("A rider can see which devices are signed in, and sign them out", async ({ page, rider }) => {
  const [lost, tablet] = [rider, rider].map(({ email }) => new Rider(rider.origin, email));
  await rider.signUp();
  await lost!.signIn();
  await tablet!.signIn();
  await signIn(page, rider.email);
  await open(page, "Devices signed in");
  const lines = page.getByRole("listitem");
  await expect(lines).toHaveCount(4);
  await expect(lines.filter({ hasText: "This device" })).toContainText("Chrome on Linux");
  await lines.getByRole("button").first().click();
  await expect(lines).toHaveCount(3);
  await page.getByRole("button", { name: "Sign out all the others" }).click();
  await expect(lines).toHaveCount(1);
  for (const { status } of await Promise.all(
    [rider, lost!, tablet!].map((device) => device.call("GET", "/api/auth/me")),
  ))
    expect(status).toBe(401);
});

test("A rider can take everything along as files", async ({ page, rider }) => {
  const bikeId = newId();
  await rider.signUp();
  await rider.push([bikeEntry(bikeId), checkEntry(bikeId, 12, 3)]);
  await openAs(rider, page);
  await open(page, "Take it along");
  const all = await saved(page, "Save everything");
  expect(all.name).toBe("sumpless.json");
  expect(JSON.parse(all.text)).toMatchObject({ user: { email: rider.email }, bikes: [{ bikeId }] });
  const checks = await saved(page, "Save the checks");
  expect(checks.name).toBe("sumpless-checks.csv");
  expect(checks.text).toContain("Moss,2026-03-01T09:00:00.000Z,12,12,");
});

test("A rider can delete the account, data taken along first, and nothing is left behind", async ({
  page,
  rider,
}) => {
  const bikeId = newId();
  await rider.signUp();
  await rider.push([bikeEntry(bikeId)]);
  await signIn(page, rider.email);
  await expect(page.getByRole("region", { name: "Moss" })).toBeVisible();
  await waitUntilSent(page);
  await open(page, "Delete the account");
  expect((await saved(page, "Save everything")).text).toContain(bikeId);
  const erase = page.getByRole("button", { name: "Delete the account and its bikes" });
  await password(page, "Your password").fill("not this one");
  await expect(erase).toBeDisabled();
  await page.getByLabel("Erase all of it, for good").check();
  await erase.click();
  await expect(password(page, "Your password")).toHaveAccessibleDescription(/not your password/);
  await password(page, "Your password").fill(Rider.password);
  await erase.click();

  await expect(page.getByText("Your account and its bikes are deleted.")).toBeVisible();
  await expect.poll(() => logbooksOn(page)).toEqual([]);
  expect(await page.evaluate(() => JSON.stringify(localStorage))).not.toContain(rider.id);
  await page.goto("/");
  await expect(page).toHaveURL("/sign-in");
  expect((await rider.call("GET", "/api/auth/me")).status).toBe(401);
});

test("A rider can leave a phone with nothing on it", async ({ page, rider }) => {
  await rider.signUp();
  await rider.push([bikeEntry(newId())]);
  await signIn(page, rider.email);
  await expect(page.getByRole("region", { name: "Moss" })).toBeVisible();
  await waitUntilSent(page);
  await inTopBar(page, "Account").click();
  const settings = () => page.evaluate(() => JSON.stringify([localStorage, sessionStorage]));
  await expect.poll(settings).toContain(`sumpless-read-${rider.id}`);
  await page.getByRole("checkbox", { name: /^A check falls due/ }).click();
  await page.getByRole("button", { name: "Leave, and clear this phone" }).click();
  await expect(page.getByText("nothing of yours is kept on this phone")).toBeVisible();
  await expect.poll(() => logbooksOn(page)).toEqual([]);
  // The read cache writes a second behind.
  await page.waitForTimeout(1_500);
  for (const trace of [rider.id, rider.email]) expect(await settings()).not.toContain(trace);
  await signIn(page, rider.email);
  await expect(page.getByRole("region", { name: "Moss" })).toBeVisible();
});

const screens = ["", "/email", "/password", "/devices", "/data", "/delete"];

for (const colorScheme of ["light", "dark"] as const)
  test(`A rider can read and reach all of the account in the ${colorScheme} theme at 360 px and at 1280 px`, async ({
    page,
    rider,
  }) => {
    await rider.signUp();
    await page.emulateMedia({ colorScheme });
    await rider.enterOn(page.context());
    for (const screen of screens) {
      await page.goto(`/account${screen}`);
      await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
      if (screen === "/devices") await expect(page.getByRole("listitem")).toHaveCount(2);
      for (const size of [
        { width: 360, height: 780 },
        { width: 1280, height: 800 },
      ]) {
        await page.setViewportSize(size);
        await expectAccessible(page);
      }
    }
  });

test("A rider can use the account's pages on a narrow phone with letters twice as large", async ({
  page,
  rider,
}) => {
  await rider.signUp();
  await page.setViewportSize({ width: 320, height: 640 });
  await rider.enterOn(page.context());
  for (const screen of screens) {
    await page.goto(`/account${screen}`);
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
    for (const size of ["16px", "32px"]) {
      await setLetters(page, size);
      await expectNoSidewaysScroll(page, `${screen} at ${size}`);
    }
  }
});
