import type { Page } from "@playwright/test";
import { subDays } from "date-fns";
import type { Summary } from "../../shared/schemas/summary.ts";
import { bikeEntry, checkEntry, newId } from "../helpers/make-entry.ts";
import {
  expect,
  openAs,
  rowsOnPhone,
  signIn,
  signUp,
  test,
  testAlone,
  waitUntilInstalled,
  waitUntilSent,
  type Rider,
} from "./fixtures.ts";

const card = (page: Page, name: string) => page.getByRole("region", { name });
const now = new Date();
const baselineAt = subDays(now, 30);

async function addBike(page: Page, name: string): Promise<void> {
  await page.getByRole("link", { name: "Add a bike" }).click();
  await page.getByLabel("Name", { exact: true }).fill(name);
  await page.getByRole("button", { name: "Save the bike" }).click();
  await expect(card(page, name)).toContainText("first check is due");
}

async function logHours(page: Page, bike: string, hours: string): Promise<void> {
  await card(page, bike).getByRole("button", { name: "Log hours" }).click();
  await page.getByRole("textbox", { name: "Engine hours" }).fill(hours);
  await page.getByRole("button", { name: "Save hours" }).click();
  await expect(page.getByRole("dialog")).toBeHidden();
}

async function addSyringe(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Add a syringe" }).click();
  const sheet = page.getByRole("dialog");
  await sheet.getByRole("radio", { name: /^5 mL/ }).check();
  await sheet.getByRole("button", { name: "Save the syringe" }).click();
  await expect(sheet).toBeHidden();
}

/** The quick form from the Shed: one run, read from an empty 5 mL barrel with 0.2 mL marks. */
async function check(
  page: Page,
  bike: string,
  hours: string,
  levelMl: string,
  { ownsSyringe = true } = {},
): Promise<void> {
  await page.goto("/");
  await card(page, bike).getByRole("link", { name: "Delivery check" }).click();
  await page.getByRole("link", { name: /quick/i }).click();
  await page.getByRole("textbox", { name: "Engine hours" }).fill(hours);
  const syringe = page.getByLabel("Syringe", { exact: true });
  if (!ownsSyringe) await addSyringe(page);
  await expect(syringe).toContainText(/5\smL.*0\.2\smL marks/);
  await page.getByRole("textbox", { name: "Run 1: level before" }).fill("0.0");
  await page.getByRole("textbox", { name: "Run 1: level after" }).fill(levelMl);
  await page.getByRole("checkbox", { name: /^Closed out/ }).check();
  await page.getByRole("button", { name: "Save the check" }).click();
  await expect(page.getByRole("heading", { name: "Result" })).toBeVisible();
}

/** What the phone stored with the bike's log, and shows. */
const summaryOnPhone = async (page: Page, bikeId: string) =>
  (await rowsOnPhone<{ bikeId: string; summary: Summary }>(page, "bikes")).find(
    (row) => row.bikeId === bikeId,
  )?.summary;

const summaryOnServer = async (rider: Rider, bikeId: string) =>
  (await (await rider.call("GET", `/api/bikes/${bikeId}`)).json()) as Summary;

testAlone(
  "A rider logs hours and a check with the server gone, and it is all there when it is back",
  async ({ page, context, rider, server }) => {
    await page.clock.setFixedTime(baselineAt);
    await signUp(page, rider.email);
    await addBike(page, "Moss");
    await waitUntilSent(page);
    await waitUntilInstalled(page);
    await server.stop();

    await logHours(page, "Moss", "12.0");
    await check(page, "Moss", "12.0", "3.0", { ownsSyringe: false });
    await expect(page.getByText("Saved on this phone")).toBeVisible();
    await expect(page.getByText("Ride on")).toBeVisible();
    await expect(page.getByText("Delivery settling")).toBeVisible();

    await page.goto("/");
    await page.reload();
    await expect(card(page, "Moss")).toContainText("20.0 h to the next check");
    await expect(card(page, "Moss")).toContainText("Saved on this phone");
    await card(page, "Moss").getByRole("link", { name: "Moss" }).click();
    await expect(page.getByText("2.99 ± 0.20 mL").first()).toBeVisible();
    await expect(page.getByText("Saved on this phone")).toHaveCount(2);
    const bikeId = new URL(page.url()).pathname.split("/").at(-1)!;

    // Closed and opened again, still without a server: a new page of the same installed app.
    await page.close();
    const reopened = await context.newPage();
    await reopened.clock.setFixedTime(now);
    await reopened.goto("/");
    await check(reopened, "Moss", "32.0", "2.5");
    await expect(reopened.getByText("Stop, find the cause")).toBeVisible();
    await expect(reopened.getByText("Delivery low")).toBeVisible();

    await server.start();
    await reopened.goto("/");
    await expect(card(reopened, "Moss")).toBeVisible();
    await waitUntilSent(reopened);
    await rider.signIn();
    const onServer = await summaryOnServer(rider, bikeId);
    expect(onServer).toEqual(await summaryOnPhone(reopened, bikeId));
    expect(onServer).toMatchObject({ verdict: "low", action: "stop", due: { inHours: 0 } });
    expect(onServer.pLow).toBeCloseTo(0.65, 2);

    // A second phone of the same rider shows the same.
    const second = await context.browser()!.newContext({ baseURL: server.origin });
    const secondPage = await second.newPage();
    await signIn(secondPage, rider.email);
    await expect(card(secondPage, "Moss")).toContainText("Stop, find the cause");
    await card(secondPage, "Moss").getByRole("link", { name: "Moss" }).click();
    await expect(secondPage.getByText("2.99 ± 0.20 mL").first()).toBeVisible();
    await second.close();
  },
);

test("A rider is told what a second check means and when the next one falls due", async ({
  page,
  rider,
}) => {
  const cases = [
    { name: "Fern", levelMl: "2.7", action: "repeat", verdict: "dropping", pLow: 0.13, due: 32 },
    { name: "Reed", levelMl: "2.95", action: "ride", verdict: "holding", pLow: 0.0025, due: 52 },
    { name: "Heath", levelMl: "2,95", action: "ride", verdict: "holding", pLow: 0.0025, due: 72 },
  ] as const;
  await rider.signUp();
  const bikeIds = new Map<string, string>(cases.map(({ name }) => [name, newId()]));
  await rider.push(
    cases.flatMap(({ name, due }) => {
      const bikeId = bikeIds.get(name)!;
      return [
        bikeEntry(bikeId, { name, intervalHours: due === 72 ? 40 : 20 }),
        checkEntry(bikeId, 12, 3, baselineAt.toISOString()),
      ];
    }),
  );
  await rider.enterOn(page.context());
  for (const { name, levelMl, action, verdict, pLow, due } of cases) {
    await check(page, name, "32.0", levelMl);
    await expect(
      page.getByText(action === "ride" ? "Ride on" : "Repeat before riding").first(),
    ).toBeVisible();
    await expect(page.getByText(`Delivery ${verdict}`).first()).toBeVisible();
    await expect(page.getByText("Sent", { exact: true })).toBeVisible();
    const summary = await summaryOnServer(rider, bikeIds.get(name)!);
    expect(summary).toMatchObject({ verdict, action, due: { atHours: due, inHours: due - 32 } });
    expect(summary.pLow).toBeCloseTo(pLow, 2);
  }
});

test("The app can be installed", async ({ page, rider }) => {
  await rider.signUp();
  await openAs(rider, page);
  await waitUntilInstalled(page);
  const devtools = await page.context().newCDPSession(page);
  const { installabilityErrors } = await devtools.send("Page.getInstallabilityErrors");
  // Playwright's contexts are all private windows, which no app is installed from.
  expect(installabilityErrors.filter(({ errorId }) => errorId !== "in-incognito")).toEqual([]);
  const { errors } = await devtools.send("Page.getAppManifest");
  expect(errors).toEqual([]);
});
