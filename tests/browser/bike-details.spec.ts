import { logbook } from "../helpers/logbook-in-words.ts";
import {
  expect,
  expectAccessible,
  expectNoSidewaysScroll,
  setLetters,
  test,
  testAlone,
  waitUntilInstalled,
} from "./fixtures.ts";
import { logLines, openBike } from "./open-bike.ts";

const sequence = { seconds: 30, rhythm: "steady", nominalMl: 3 } as const;
const moss = () => logbook().bike({ name: "Moss", sequence }).check(12, [3]).check(32, [2.95]);

testAlone(
  "A rider can change a bike's details with no network; only what changed is written",
  async ({ page, rider, server }) => {
    await openBike(page, rider, moss());
    await waitUntilInstalled(page);
    await server.stop();
    await page.getByRole("link", { name: "Details and settings" }).click();
    await page.getByLabel("Name").fill("Fern");
    await page.getByRole("textbox", { name: "Year" }).fill("2021");
    await page.getByRole("radio", { name: "Yes" }).check();
    await page.getByRole("radio", { name: "12:30" }).check();
    await page.getByRole("textbox", { name: "Hours between checks" }).fill("30");
    await page.getByRole("textbox", { name: "Delivery is low from" }).fill("12,5");
    await page.getByRole("button", { name: "Save", exact: true }).click();

    await expect(page.getByRole("heading", { level: 1, name: "Fern" })).toBeVisible();
    const line = logLines(page).first();
    await expect(line).toContainText("Saved on this phone");
    await expect(line.getByText(/^Name/)).toHaveText(
      /^Name: Fern · Year: 2021 · Meter shows 12:30 · Interval: 30\sh · Screen: yes · Delivery low from: 12\.5\s% under the baseline$/,
    );
    await expect(page.getByText(/30:00\sh/)).toBeVisible();

    await server.start();
    await page.getByRole("button", { name: "Send and fetch now" }).click();
    await expect(line).toContainText("Sent");
    expect(await rider.bikes()).toMatchObject([{ name: "Fern", due: { atHours: 62 } }]);
  },
);

test("A rider who changes nothing writes nothing", async ({ page, rider }) => {
  await openBike(page, rider, moss());
  await expect(logLines(page)).toHaveCount(3);
  await page.getByRole("link", { name: "Details and settings" }).click();
  await page.getByRole("button", { name: "Save", exact: true }).click();
  await expect(logLines(page)).toHaveCount(3);
});

test("Limits can be tightened, not loosened, and what does not fit is said by field", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, moss());
  await page.getByRole("link", { name: "Details and settings" }).click();
  const low = page.getByRole("textbox", { name: "Delivery is low from" });
  await low.fill("20");
  await page.getByRole("textbox", { name: "Year" }).fill("1850");
  await page.getByRole("button", { name: "Save", exact: true }).click();
  await expect(low).toHaveAccessibleDescription(/can be tightened, not loosened/);
  await expect(page.getByRole("textbox", { name: "Year" })).toHaveAccessibleDescription(
    /before 1900/,
  );
  await expectAccessible(page);
  await page.getByLabel("Name").fill(" ");
  await page.getByRole("button", { name: "Save", exact: true }).click();
  await expect(page.getByLabel("Name")).toHaveAccessibleDescription(/Give the bike a name/);
  await expect(low).toHaveValue("20");
});

test("Another sequence is announced to start a new baseline, and does", async ({ page, rider }) => {
  await openBike(page, rider, moss());
  await page.getByRole("link", { name: "Details and settings" }).click();
  await expect(page.getByRole("radio", { name: /^60\ss, one fast rate/ })).toBeVisible();
  await expect(page.getByText("This starts a new baseline")).toBeHidden();
  await page.getByRole("radio", { name: /^60\ss, one fast rate/ }).check();
  await expect(page.getByText("This starts a new baseline")).toBeVisible();
  await page.getByRole("button", { name: "Save", exact: true }).click();
  await expect(page.getByRole("rowheader", { name: /^Other sequence/ })).toContainText(
    "No baseline yet",
  );
});

test("A rider can retire a bike and bring it back", async ({ page, rider }) => {
  const path = await openBike(page, rider, moss());
  await page.getByRole("link", { name: "Details and settings" }).click();
  await page.getByRole("button", { name: "Retire this bike" }).click();
  await expect(page.getByText(/This bike is retired/)).toBeVisible();
  await page.goto("/");
  await expect(page.getByText("Retired (1)")).toBeVisible();
  await page.goto(`${path}/details`);
  await page.getByRole("button", { name: "Bring it back" }).click();
  await expect(page.getByText(/A retired bike moves/)).toBeVisible();
  await page.goto("/");
  await expect(page.getByRole("region", { name: "Moss" })).toBeVisible();
  await expect(page.getByText("Retired (1)")).toBeHidden();
});

testAlone(
  "A rider is asked twice before a bike is deleted, and can keep its log as a file",
  async ({ page, rider, server }) => {
    await openBike(page, rider, moss());
    await waitUntilInstalled(page);
    await page.getByRole("link", { name: "Details and settings" }).click();
    await page.getByRole("button", { name: "Delete this bike" }).click();
    const sheet = page.getByRole("dialog", { name: "Delete Moss?" });
    await expectAccessible(page);

    const download = page.waitForEvent("download");
    await sheet.getByRole("button", { name: "Save the log as a file" }).click();
    const file = await (await download).createReadStream();
    const chunks = [];
    for await (const chunk of file) chunks.push(chunk as Buffer);
    const log = JSON.parse(Buffer.concat(chunks).toString()) as { entries: { kind: string }[] };
    expect(log.entries.map(({ kind }) => kind)).toEqual(["bike", "check", "check"]);

    await server.stop();
    await sheet.getByRole("button", { name: "Delete it" }).click();
    await sheet.getByRole("button", { name: "Yes, delete it for good" }).click();
    await expect(sheet.getByRole("alert")).toContainText("No network just now");
    await server.start();
    await sheet.getByRole("button", { name: "Yes, delete it for good" }).click();
    await expect(page).toHaveURL("/");
    await expect(page.getByRole("heading", { name: "Your shed is empty" })).toBeVisible();
    expect(await rider.bikes()).toEqual([]);
  },
);

for (const colorScheme of ["light", "dark"] as const)
  test(`Details can be read and reached in the ${colorScheme} theme`, async ({ page, rider }) => {
    await page.emulateMedia({ colorScheme });
    const path = await openBike(page, rider, moss());
    await page.goto(`${path}/details`);
    await expect(page.getByRole("heading", { name: "Put it away" })).toBeVisible();
    await expectAccessible(page);
    await page.setViewportSize({ width: 320, height: 640 });
    for (const size of ["16px", "32px"]) {
      await setLetters(page, size);
      await expectNoSidewaysScroll(page, size);
    }
  });
