import {
  button,
  closeOut,
  entriesOnServer,
  expectStep,
  field,
  heading,
  link,
  runAndRead,
  short,
  startRun,
  stopClock,
  withBaseline,
} from "./check-scene.ts";
import {
  expect,
  expectAccessible,
  expectNoSidewaysScroll,
  openAs,
  test,
  testAlone,
  waitUntilDrafted,
  waitUntilInstalled,
  waitUntilSent,
} from "./fixtures.ts";

testAlone(
  "A rider can do a first check with no signal, reloading at every step",
  async ({ page, rider, server }) => {
    await rider.signUp();
    await openAs(rider, page);
    await link(page, "Add a bike").click();
    await page.getByLabel("Name").fill("Heather");
    await button(page, "Save the bike").click();
    await expect(page.getByRole("region", { name: "Heather" })).toBeVisible();
    await waitUntilSent(page);
    await waitUntilInstalled(page);
    await server.stop();
    const pass = await stopClock(page);

    await link(page, "Delivery check").click();
    await expectStep(page, "Delivery check");
    await button(page, "Start the guided check").click();
    await expect(page.getByText("Never start the engine with the oil hose off")).toBeVisible();
    await expectStep(page, "Before the first run", '"hoursText":""');
    await button(page, "I have read this: go on").click();

    await button(page, "Go to run 1").click();
    await expect(page.getByText("Choose the syringe you read from.")).toBeVisible();
    await expect(page.getByText("Type the engine hours as the meter shows them.")).toBeVisible();
    await button(page, "Add a syringe").click();
    await expect(page.getByRole("dialog")).toBeVisible();
    await expectAccessible(page);
    await button(page, "Save the syringe").click();
    await expect(page.getByRole("dialog")).toBeHidden();
    await field(page, "Engine hours").fill("12,0");
    await expectStep(page, "Set up", '"hoursText":"12,0"');
    await expect(field(page, "Engine hours")).toHaveValue("12,0");
    await expect(page.getByRole("img", { name: /A 5 mL barrel/ })).toBeVisible();
    await button(page, "Go to run 1").click();

    await expectStep(page, "Run 1");
    await startRun(page);
    await pass(12);
    await expectStep(page, "Run 1", '"startedAt":"');
    await expect(page.getByRole("timer")).toContainText(/^12/);
    await page.getByText("Steady").click();
    await pass(18);
    await button(page, "The ticking stopped").click();
    await expect(page.getByRole("timer")).toContainText("wait for the last drops");
    await pass(5);
    await expectStep(page, "Run 1", '"seconds":30,"rhythm":"steady"');
    await expect(page.getByRole("timer")).toContainText(/^25s to wait for the last drops/);
    await pass(30);
    await expectStep(page, "Run 1");
    await link(page, "Read the level").click();

    await expectStep(page, "Read the level, run 1");
    await button(page, "Level up 1 mL").click();
    await button(page, "Level up 1 mL").click();
    await button(page, "Level up 1 mL").click();
    await button(page, "Level down 0.1 mL").click();
    await expect(field(page, "Level after the run")).toHaveValue("2.9");
    await expectStep(page, "Read the level, run 1", '"endText":"2.9"');
    await button(page, "That is the level").click();

    await expectStep(page, "1 of 2 runs read");
    await page.getByText("A usual kind").click();
    await expectStep(page, "1 of 2 runs read", '"nominalMl":3');
    await expect(page.getByText(/One more run like this would make it/)).toBeVisible();
    await link(page, "One more run").click();

    await expect(page.getByText(/there is no room for one more run/)).toBeVisible();
    await field(page, "Level before the run").fill("0.1");
    await startRun(page);
    await pass(10);
    await button(page, "Interrupted").click();
    await expectStep(page, "Run 2 of 2", '"voided":"interrupted"');
    await link(page, "Do it again").click();
    await runAndRead(page, pass, "0.2", "3.2");
    await expectStep(page, "2 runs read: enough", '"endText":"3.2"');
    await link(page, "Done: close out").click();

    await expectStep(page, "Close-out");
    await closeOut(page);
    await expectStep(page, "Close-out", "smoke-as-usual");
    await button(page, "Save the check").click();

    await expectStep(page, "Result");
    await expect(page.getByText("Saved on this phone", { exact: true })).toBeVisible();
    await expect(page.getByText("Ride on")).toBeVisible();
    await expect(page.getByText("Delivery settling")).toBeVisible();
    await expect(page.getByText("Void runs are kept, and not counted.")).toBeVisible();
    await expect(page.getByRole("heading", { name: /Next check: in 20.0/ })).toBeVisible();

    await server.start();
    await button(page, "Send and fetch now").click();
    await expect(page.getByText("Sent", { exact: true })).toBeVisible();
    await waitUntilSent(page);
    const entries = await entriesOnServer(rider);
    const check = entries.find(({ kind }) => kind === "check");
    expect(check?.body).toMatchObject({
      closedOut: true,
      runs: [
        { startMl: 0, endMl: 2.9, rhythm: "steady" },
        { startMl: 0.1, void: true },
        { startMl: 0.2, endMl: 3.2, seconds: 30 },
      ],
      note: "Run 2 is void: it was interrupted.",
    });
    expect(entries.at(-2)).toMatchObject({ kind: "bike", body: { sequence: short } });
  },
);

test("A check given up after its first run keeps the bike from being started until it is closed out", async ({
  page,
  rider,
}) => {
  const bikeId = await withBaseline(page, rider);
  await stopClock(page);
  await page.goto(`/bikes/${bikeId}/check`);
  await button(page, "Start the guided check").click();
  await button(page, "I have read this: go on").click();
  await button(page, "Go to run 1").click();
  await startRun(page);
  await waitUntilDrafted(page, '"startedAt":"');
  await page.goto("/");
  await expect(page.getByText("Hose may be off: do not start")).toBeVisible();

  await page.goto(`/bikes/${bikeId}/check`);
  await expect(page.getByText("A check is half done")).toBeVisible();
  await button(page, "Give it up").click();
  await expect(page.getByRole("dialog")).toBeVisible();
  await expectAccessible(page);
  await page.getByRole("dialog").getByRole("button", { name: "Give it up" }).click();
  await expect(page.getByText("A check was given up with the hose off.")).toBeVisible();
  await expectAccessible(page);
  await waitUntilDrafted(page, '{"hoseMaybeOff":true}');
  await page.goto("/");
  await expect(page.getByText("Hose may be off: do not start")).toBeVisible();

  await page.getByRole("region", { name: "Moss" }).getByRole("link", { name: /close/i }).click();
  await expect(heading(page, "Close-out")).toBeVisible();
  await button(page, "Save the close-out").click();
  await expect(page.getByText("Tick all five first.")).toBeVisible();
  await expectAccessible(page);
  await closeOut(page);
  await button(page, "Save the close-out").click();
  await expect(page).toHaveURL(`/bikes/${bikeId}`);
  await page.goto("/");
  await expect(page.getByRole("region", { name: "Moss" })).toBeVisible();
  await expect(page.getByText("Hose may be off: do not start")).toBeHidden();
});

test("A run goes on while the phone is off, and its alarm is given when it is on", async ({
  page,
  rider,
}) => {
  const bikeId = await withBaseline(page, rider);
  await page.addInitScript(() => {
    const heard: string[] = [];
    Object.assign(window, { heard });
    navigator.vibrate = () => heard.push("shake") > 0;
    if (!("wakeLock" in navigator)) return;
    navigator.wakeLock.request = () => {
      heard.push("awake");
      return Promise.reject(new Error("The battery is low."));
    };
  });
  const heard = () =>
    page.evaluate(() => (window as unknown as { heard: string[] }).heard.join(" "));
  const pass = await stopClock(page);
  await page.goto(`/bikes/${bikeId}/check`);
  await button(page, "Start the guided check").click();
  await button(page, "I have read this: go on").click();
  await button(page, "Go to run 1").click();
  await expect(page.getByText("The timer stops by itself after 30 s.")).toBeVisible();
  await button(page, "Sound is on").click();
  await expect(button(page, "Sound is off")).toBeVisible();
  await startRun(page);
  await pass(30.5);
  await expect(page.getByRole("timer")).toContainText("wait");
  await expect.poll(heard).toBe("awake shake");
  await waitUntilDrafted(page, '"startedAt":"');

  await page.goto("about:blank");
  await pass(2 * 3600);
  await page.goto(`/bikes/${bikeId}/check`);
  await link(page, "Go on with it").click();
  await expect(page.getByText("The last drops have fallen.")).toBeVisible();
  await expect.poll(heard).toBe("awake");
  await link(page, "Read the level").click();
  await expect(heading(page, /Read the level/)).toBeVisible();
});

test("Back goes one step back and loses nothing", async ({ page, rider }) => {
  const bikeId = await withBaseline(page, rider);
  const pass = await stopClock(page);
  await page.goto(`/bikes/${bikeId}/check`);
  await button(page, "Start the guided check").click();
  await button(page, "I have read this: go on").click();
  await field(page, "Engine hours").fill("32");
  await button(page, "Go to run 1").click();
  await runAndRead(page, pass, "0", "2.8");
  await expect(heading(page, /1 (of \d )?runs? read/)).toBeVisible();

  await page.goBack();
  await expect(field(page, "Level after the run")).toHaveValue("2.8");
  await field(page, "Level after the run").fill("2.9");
  await page.goBack();
  await expect(page.getByText("The last drops have fallen.")).toBeVisible();
  await page.goBack();
  await expect(field(page, "Engine hours")).toHaveValue("32");
  await page.goForward();
  await page.goForward();
  await expect(field(page, "Level after the run")).toHaveValue("2.9");
  await link(page, "Run 1").click();
  await link(page, "Set up").click();
  await expect(field(page, "Engine hours")).toHaveValue("32");
});

test("A rider can do the whole check by keyboard alone", async ({ page, rider }) => {
  const bikeId = await withBaseline(page, rider);
  const pass = await stopClock(page);
  await page.goto(`/bikes/${bikeId}/check`);
  /** Tabs on until the control with this name has the focus. */
  const reach = async (name: RegExp) => {
    for (let presses = 0; presses < 60; presses++) {
      await page.keyboard.press("Tab");
      const focused = await page.evaluate(() => {
        const element = document.activeElement as HTMLInputElement | null;
        if (element === document.body) return "";
        const labels = [...(element?.labels ?? [])].map((label) => label.textContent);
        return [element?.getAttribute("aria-label"), element?.textContent, ...labels].join(" ");
      });
      if (name.test(focused)) return;
    }
    throw new Error(`The focus never came to ${name}.`);
  };
  const press = async (name: RegExp, key = "Enter") => {
    await reach(name);
    await page.keyboard.press(key);
  };
  await expect(heading(page, "Delivery check")).toBeFocused();
  await press(/Start the guided check/);
  await expect(heading(page, "Before the first run")).toBeFocused();
  await press(/I have read this/);
  await expect(heading(page, "Set up")).toBeFocused();
  await reach(/^ *Engine hours/);
  await page.keyboard.type("32");
  await press(/Go to run 1/);
  await expect(heading(page, /Run 1/)).toBeFocused();
  await expect(button(page, /^Start$/)).toBeEnabled();
  await press(/^ ?Start$/);
  await expect(page.getByRole("timer")).toContainText(/^0/);
  await pass(61);
  await expect(link(page, "Read the level")).toBeVisible();
  await press(/^ ?Read the level$/);
  await expect(heading(page, /Read the level/)).toBeFocused();
  await reach(/Level after the run/);
  await page.keyboard.type("2.9");
  await press(/That is the level/);
  await expect(heading(page, /runs? read/)).toBeFocused();
  await press(/Done: close out/);
  await expect(heading(page, "Close-out")).toBeFocused();
  for (const name of [/Test lead/, /Oil hose/, /Line primed/, /No leaks/, /Engine started/])
    await press(name, "Space");
  await expect(button(page, "Save the check")).toBeVisible();
  await press(/Save the check/);
  await expect(heading(page, "Result")).toBeFocused();
});

test("The check fits 320 px with letters twice as large", async ({ page, rider }) => {
  const bikeId = await withBaseline(page, rider);
  await page.setViewportSize({ width: 320, height: 640 });
  await page.addInitScript(() => {
    document.addEventListener("DOMContentLoaded", () => {
      document.documentElement.style.fontSize = "200%";
    });
  });
  const pass = await stopClock(page);
  await page.goto(`/bikes/${bikeId}/check`);
  await button(page, "Start the guided check").click();
  await expect(heading(page, "Before the first run")).toBeVisible();
  await expectNoSidewaysScroll(page);
  await button(page, "I have read this: go on").click();
  await expect(heading(page, "Set up")).toBeVisible();
  await expectNoSidewaysScroll(page);
  await button(page, "Go to run 1").click();
  await expect(heading(page, /Run 1/)).toBeVisible();
  await expectNoSidewaysScroll(page);
  await runAndRead(page, pass, "0", "2.5");
  await expect(heading(page, /runs? read/)).toBeVisible();
  await expectNoSidewaysScroll(page);
  await link(page, "Done: close out").click();
  await closeOut(page);
  await expectNoSidewaysScroll(page);
  await button(page, "Save the check").click();
  await expect(heading(page, "Result")).toBeVisible();
  await expectNoSidewaysScroll(page);
  await page.goto(`/bikes/${bikeId}/check/quick`);
  await expect(heading(page, "Quick form")).toBeVisible();
  await expectNoSidewaysScroll(page);
});
