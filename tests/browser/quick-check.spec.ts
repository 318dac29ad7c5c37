import {
  button,
  closeOut,
  daysAgo,
  entriesOnServer,
  field,
  heading,
  link,
  withBaseline,
} from "./check-scene.ts";
import {
  expect,
  expectAccessible,
  openAs,
  test,
  waitUntilDrafted,
  waitUntilSent,
} from "./fixtures.ts";
import { bikeEntry, checkEntry, newId } from "../helpers/make-entry.ts";

test("A rider who knows it saves a check with at most six taps and two numbers", async ({
  page,
  rider,
}) => {
  await withBaseline(page, rider);
  let taps = 0;
  const tap = async (target: ReturnType<typeof button>) => {
    taps += 1;
    await target.click();
  };
  await tap(
    page.getByRole("region", { name: "Moss" }).getByRole("link", { name: "Delivery check" }),
  );
  await tap(link(page, "Quick form"));
  await tap(field(page, "Engine hours"));
  await page.keyboard.type("32");
  await tap(field(page, "Run 1: level after"));
  await page.keyboard.type("2,95");
  await expect(page.getByRole("region", { name: "So far" })).toContainText("Ride on");
  await tap(page.getByRole("checkbox", { name: /Closed out/ }));
  await tap(button(page, "Save the check"));
  await expect(heading(page, "Result")).toBeVisible();
  await expect(page.getByText(/^(Saved on this phone|Sent)$/)).toBeVisible();
  await expect(page.getByText("Delivery holding")).toBeVisible();
  await expectAccessible(page);
  expect(taps).toBeLessThanOrEqual(6);
});

test("A rider with a delivery low is told to stop, finds the cause and writes down what was done", async ({
  page,
  rider,
}) => {
  const bikeId = await withBaseline(page, rider);
  await page.goto(`/bikes/${bikeId}/check/quick`);
  await field(page, "Engine hours").fill("32");
  await field(page, "Run 1: level after").fill("2.3");
  await page.getByRole("checkbox", { name: /Closed out/ }).check();
  await expectAccessible(page);
  await button(page, "Save the check").click();

  await expect(heading(page, "Result")).toBeVisible();
  await expect(page.getByText("Stop, find the cause")).toBeVisible();
  await expect(page.getByText("Delivery low", { exact: true })).toBeVisible();
  await expect(page.getByText(/sure the delivery is below the limit/)).toBeVisible();
  await expect(page.getByText(/your syringe’s 0.2 mL marks/)).toBeVisible();
  await expect(page.getByRole("img", { name: /^Delivery 2.29.*under the limit/ })).toBeVisible();
  await expect(page.getByRole("heading", { name: "Next check: now" })).toBeVisible();

  await page.getByText("Mixing oil into the fuel").click();
  await expect(page.getByText("It never lifts a stop")).toBeVisible();
  await page.getByRole("textbox", { name: "Fuel to oil" }).fill("1:80");
  await expect(page.getByText(/Oil to mix in: 63/)).toBeVisible();

  await page.getByRole("checkbox", { name: /Oil level and tank vent/ }).check();
  await page.getByRole("checkbox", { name: /Pump replaced/ }).check();
  await waitUntilDrafted(page, "renew");
  await page.reload();
  await expect(page.getByRole("checkbox", { name: /Pump replaced/ })).toBeChecked();
  await expect(page.getByRole("checkbox", { name: /Start a new baseline/ })).toBeChecked();
  await expectAccessible(page);
  await button(page, "Write it in the log").click();
  await expect(page.getByText("Written in the log: saved on this phone.")).toBeVisible();
  await waitUntilSent(page);
  const work = (await entriesOnServer(rider)).at(-1);
  expect(work).toMatchObject({
    kind: "work",
    hours: 32,
    body: {
      items: ["other", "pump-renewed"],
      startsSeries: true,
      note: "Oil level and tank vent looked at.",
    },
  });
});

test("A check saved with its close-out open is closed out later from the Shed", async ({
  page,
  rider,
}) => {
  const bikeId = await withBaseline(page, rider);
  await page.goto(`/bikes/${bikeId}/check/quick`);
  await field(page, "Engine hours").fill("32");
  await field(page, "Run 1: level after").fill("3");
  await button(page, "Save the check").click();
  await expect(heading(page, "Result")).toBeVisible();
  await expect(page.getByText("Hose may be off: do not start")).toBeVisible();
  await expect(page.getByText("Delivery holding")).toBeVisible();
  await expect(page.getByText("Ride on")).toBeHidden();
  await link(page, "To the Shed").click();
  await page.getByRole("region", { name: "Moss" }).getByRole("link", { name: /close/i }).click();
  await closeOut(page);
  await button(page, "Save the close-out").click();
  await expect(page).toHaveURL(`/bikes/${bikeId}`);
  await page.goto("/");
  await expect(page.getByText("Ride on")).toBeVisible();
  await expect(page.getByText("Hose may be off: do not start")).toBeHidden();
});

test("A check whose saving fails keeps all that was typed", async ({ page, rider }) => {
  const bikeId = await withBaseline(page, rider);
  await page.goto(`/bikes/${bikeId}/check/quick`);
  await field(page, "Engine hours").fill("32");
  await field(page, "Run 1: level after").fill("2,9");
  await page.getByRole("textbox", { name: "Note" }).fill("Windy.");
  await page.evaluate(() => {
    const whole = Object.getOwnPropertyDescriptor(IDBObjectStore.prototype, "add") ?? {};
    const mend = () => Object.defineProperty(IDBObjectStore.prototype, "add", whole);
    Object.assign(window, { mend });
    IDBObjectStore.prototype.add = () => {
      throw new DOMException("No room.", "QuotaExceededError");
    };
  });
  await button(page, "Save the check").click();
  await expect(page.getByRole("alert")).toContainText("Not saved yet");
  await expect(field(page, "Run 1: level after")).toHaveValue("2,9");
  await expect(page.getByRole("textbox", { name: "Note" })).toHaveValue("Windy.");

  await page.evaluate(() => (window as unknown as { mend: () => void }).mend());
  await button(page, "Save the check").click();
  await expect(heading(page, "Result")).toBeVisible();
  await page.goto(`/bikes/${bikeId}/check/quick`);
  await expect(field(page, "Run 1: level after")).toHaveValue("");
});

test("Every wrong field of the quick form is told by a sentence of its own", async ({
  page,
  rider,
}) => {
  const bikeId = await withBaseline(page, rider);
  await page.goto(`/bikes/${bikeId}/check/quick`);
  await field(page, "Engine hours").fill("");
  await field(page, "Run 1: level before").fill("1");
  await field(page, "Run 1: level after").fill("0.5");
  await field(page, "Oil temperature").fill("warm");
  await button(page, "Save the check").click();
  await expect(page.getByText("Type the engine hours as the meter shows them.")).toBeVisible();
  await expect(page.getByText("The end level is below the start level.")).toBeVisible();
  await expect(page.getByText(/oil’s temperature in figures/)).toBeVisible();
  await expectAccessible(page);
  await field(page, "Engine hours").fill("32");
  await field(page, "Run 1: level after").fill("9");
  await field(page, "Oil temperature").fill("");
  await expect(page.getByText("This level is far beyond the 5 mL barrel.")).toBeVisible();
  await waitUntilDrafted(page, '"endText":"9"');
  await waitUntilDrafted(page, '"oilTempText":""');
  await page.reload();
  await expect(field(page, "Run 1: level after")).toHaveValue("9");
  await field(page, "Run 1: level after").fill("3");
  await field(page, "Engine hours").fill("200000");
  await field(page, "Oil temperature").fill("200");
  await button(page, "Save the check").click();
  await expect(page.getByText("Engine hours is beyond 100,000 hours.")).toBeVisible();
  await expect(page.getByText("The oil's temperature is beyond 150 °C.")).toBeVisible();
  await button(page, "Start afresh").click();
  await expect(field(page, "Run 1: level after")).toHaveValue("");
});

for (const timezoneId of ["Pacific/Kiritimati", "America/St_Johns"]) {
  test.describe(timezoneId, () => {
    test.use({ timezoneId });
    test("An old note goes in by its volume, in the rider's own time", async ({ page, rider }) => {
      const bikeId = await withBaseline(page, rider);
      await page.goto(`/bikes/${bikeId}/check/quick`);
      await page.getByText("Volume alone").click();
      await field(page, "Run 1: delivered").fill("2,9");
      await page.getByRole("combobox", { name: "Syringe" }).selectOption("Not known");
      await page.getByText(/^When:/).click();
      await page.getByLabel("Checked at").fill("2025-07-01T23:30");
      await page.getByRole("checkbox", { name: "The hours are an estimate" }).check();
      await field(page, "Engine hours, estimated").fill("8");
      await page.getByRole("checkbox", { name: /Closed out/ }).check();
      await expect(page.getByText(/marks of 0.2 mL are assumed/).first()).toBeVisible();
      await button(page, "Save the check").click();
      await expect(heading(page, "Result")).toBeVisible();
      await expect(page.getByText("1 Jul 2025, 23:30")).toBeVisible();
      await expect(page.getByText("The engine hours of this check are an estimate.")).toBeVisible();
    });
  });
}

test("A bike with an hours-and-minutes meter takes 12:30 in the check", async ({ page, rider }) => {
  const bikeId = newId();
  await rider.signUp();
  await rider.push([
    bikeEntry(bikeId, { name: "Moss", meterFormat: "hh:mm" }),
    checkEntry(bikeId, 12, 3, daysAgo(9)),
  ]);
  await openAs(rider, page, `/bikes/${bikeId}/check/quick`);
  await expect(page.getByRole("textbox", { name: "Hours" })).toHaveValue("12");
  await page.getByRole("textbox", { name: "Minutes" }).fill("30");
  await field(page, "Run 1: level after").fill("3");
  await page.getByRole("checkbox", { name: /Closed out/ }).check();
  await button(page, "Save the check").click();
  await expect(page.getByText(/At 32:30/)).toBeVisible();
  await waitUntilSent(page);
  expect((await entriesOnServer(rider)).at(-1)?.hours).toBe(12.5);
});
