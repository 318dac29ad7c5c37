import { logbook } from "../helpers/logbook-in-words.ts";
import {
  expect,
  expectAccessible,
  expectNoSidewaysScroll,
  openAs,
  setLetters,
  test,
} from "./fixtures.ts";
import { openBike } from "./open-bike.ts";

test("A rider can add, change and retire a syringe", async ({ page, rider }) => {
  await rider.signUp();
  await openAs(rider, page, "/syringes");
  await expect(page.getByText("Add the syringe you measure with")).toBeVisible();
  await expectAccessible(page);

  await page.getByRole("button", { name: "Add a syringe" }).click();
  const sheet = page.getByRole("dialog");
  await sheet.getByRole("radio", { name: "Another" }).check();
  await sheet.getByRole("textbox", { name: "Highest mark" }).fill("3");
  await sheet.getByRole("textbox", { name: "One graduation" }).fill("2");
  await sheet.getByLabel("Name").fill("The fine one");
  await sheet.getByRole("button", { name: "Save the syringe" }).click();
  const graduation = sheet.getByRole("textbox", { name: "One graduation" });
  await expect(graduation).toHaveAccessibleDescription(/at most half the capacity/);
  await expectAccessible(page);
  await graduation.fill("0,1");
  await sheet.getByRole("button", { name: "Save the syringe" }).click();
  const fine = page.getByRole("region", { name: "The fine one" });
  await expect(fine).toContainText(/3\smL, marks each 0\.1\smL/);

  await page.getByRole("button", { name: "Change The fine one" }).click();
  await sheet.getByLabel("Name").fill("The finest");
  await sheet.getByRole("button", { name: "Save the syringe" }).click();
  await expect(page.getByRole("region", { name: "The finest" })).toBeVisible();
  await expect(fine).toBeHidden();

  await page.reload();
  await page.getByRole("button", { name: "Retire The finest" }).click();
  await sheet.getByRole("button", { name: "Retire it" }).click();
  await expect(page.getByText("Add the syringe you measure with")).toBeVisible();
});

test("A syringe comes with the checks made with it; with other marks it is another", async ({
  page,
  rider,
}) => {
  await openBike(page, rider, logbook().bike({ name: "Moss" }).check(12, [3]));
  await page.goto("/syringes");
  await expect(page.getByRole("region", { name: "5 mL" })).toBeVisible();
  await page.getByRole("button", { name: "Change 5 mL" }).click();
  const sheet = page.getByRole("dialog");
  await sheet.getByRole("radio", { name: /^10\smL/ }).check();
  await sheet.getByLabel("Name").fill("The large one");
  await sheet.getByRole("button", { name: "Save the syringe" }).click();
  await expect(page.getByRole("region")).toHaveCount(1);
  await expect(page.getByRole("region", { name: "The large one" })).toContainText(
    /10\smL, marks each 0\.5\smL/,
  );
  await expectAccessible(page);
  await page.setViewportSize({ width: 320, height: 640 });
  for (const size of ["16px", "32px"]) {
    await setLetters(page, size);
    await expectNoSidewaysScroll(page, size);
  }
});
