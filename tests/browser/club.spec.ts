import type { Page } from "@playwright/test";
import { bikeEntry, checkEntry, hoursEntry, newId } from "../helpers/make-entry.ts";
import { clubOf, exchange, member, phoneOf, remembered, share } from "./club-scene.ts";
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
  waitUntilDrafted,
  waitUntilInstalled,
} from "./fixtures.ts";
import { mailedLink } from "./mailed-link.ts";
import { logLines } from "./open-bike.ts";

const daysAgo = (days: number) => new Date(Date.now() - days * 86_400_000).toISOString();
const card = (page: Page, name: string) => page.getByRole("region", { name });
const queue = (page: Page) => page.getByRole("region", { name: /^Queue/ });
const done = (page: Page) => page.getByRole("region", { name: /^Done/ });

/** A bike whose pump gave 3 mL at 12 h. */
const knownBike = (bikeId: string, name: string) => [
  bikeEntry(bikeId, { name }),
  checkEntry(bikeId, 12, 3, daysAgo(30)),
];

async function openTestDay(page: Page): Promise<void> {
  await inTopBar(page, "Clubs").click();
  await page.getByRole("link", { name: "Test day" }).click();
  await expect(page.getByRole("heading", { name: "Test day" })).toBeVisible();
}

/** A 5 mL barrel with 0.2 mL marks. */
async function addSyringe(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Add a syringe" }).click();
  await page.getByRole("dialog").getByRole("radio", { name: /^5 mL/ }).check();
  await page.getByRole("button", { name: "Save the syringe" }).click();
  await expect(page.getByLabel("This station’s syringe")).toContainText("0.2 mL marks");
}

/** On the station's page of a bike: one run, from an empty barrel. */
async function check(page: Page, hours: string, levelMl: string): Promise<void> {
  await page.getByRole("textbox", { name: "Engine hours" }).fill(hours);
  await page.getByRole("textbox", { name: "Run 1: level after" }).fill(levelMl);
  await page.getByRole("checkbox", { name: /^Closed out/ }).check();
  await page.getByRole("button", { name: "Save the check" }).click();
  await expect(page.getByRole("button", { name: "Check it again" })).toBeVisible();
}

async function writeNote(page: Page, text: string, advice: string): Promise<void> {
  await page.getByLabel("What is worth keeping?").fill(text);
  await page.getByRole("radio", { name: advice }).check();
  await page.getByRole("button", { name: "Save", exact: true }).click();
}

testAlone(
  "A rider joins by a link and shares a bike; a mechanic checks it with no signal until it is withdrawn",
  async ({ page, browser, rider, server }) => {
    await signUp(page, rider.email, "Maud");
    await inTopBar(page, "Clubs").click();
    await page.getByRole("button", { name: "Make a club" }).click();
    await page.getByLabel("Name of the club").fill("Moor Riders");
    await page.getByRole("button", { name: "Make the club" }).click();
    await expect(page.getByRole("heading", { name: "Moor Riders" })).toBeVisible();
    await page.getByRole("button", { name: "Maud (you)" }).click();
    await page.getByRole("checkbox", { name: /^Mechanic/ }).check();
    await page.getByRole("button", { name: "Save" }).click();
    await expect(page.getByText("You: organiser and mechanic")).toBeVisible();
    await page.getByRole("button", { name: "Invite" }).click();
    await page.getByRole("button", { name: "Make the invitation" }).click();
    await expect(page.getByRole("img", { name: "The link as a code to scan" })).toBeVisible();
    await expectAccessible(page);
    const link = await page.getByRole("textbox", { name: "Link" }).inputValue();
    await page.getByRole("button", { name: "Close", exact: true }).click();

    // The rider is new, and comes back to the invitation once signed up.
    const context = await browser.newContext({ baseURL: server.origin });
    const wren = await context.newPage();
    await wren.goto(link);
    await expect(wren.getByRole("heading", { name: "Join Moor Riders" })).toBeVisible();
    await expectAccessible(wren);
    await wren.getByRole("link", { name: "I am new here" }).click();
    await wren.getByLabel("Your name").fill("Wren");
    await wren.getByLabel("E-mail").fill("wren@moor.example");
    await wren.getByLabel("Password", { exact: true }).fill(Rider.password);
    await wren.getByRole("button", { name: "Create the account" }).click();
    await wren.getByRole("button", { name: "Join as Wren" }).click();
    await expect(wren.getByRole("heading", { name: "Moor Riders" })).toBeVisible();
    await expect(wren.getByRole("region", { name: "Members" })).toContainText("Maud");

    const bikeId = newId();
    const wrensAccount = await new Rider(server.origin, "wren@moor.example").signIn();
    await wrensAccount.push(knownBike(bikeId, "Moss"));
    await wren.goto("/");
    await card(wren, "Moss").getByRole("link", { name: "Moss" }).click();
    await wren.getByRole("link", { name: "Share with a club" }).click();
    const consent = card(wren, "Moor Riders");
    await expect(consent).toContainText("Not shared");
    await expect(consent).toContainText("Would be seen by Maud.");
    await consent.getByRole("button", { name: "Share it" }).click();
    await expect(consent).toContainText("Seen by Maud.");
    await expectAccessible(wren);

    await page.getByRole("link", { name: "Line-up" }).click();
    await expect(page.getByRole("link", { name: /Moss/ })).toContainText("Delivery settling");
    await page.getByRole("link", { name: "Test day" }).click();
    await addSyringe(page);
    await page.getByRole("searchbox", { name: "Find" }).fill("moss");
    await page.keyboard.press("Enter");
    await expect(queue(page)).toContainText("All their logs are on this phone");
    await expect(queue(page).getByRole("link", { name: /Moss/ })).toContainText("Ready");
    await waitUntilInstalled(page);
    await remembered(page, bikeId);

    await server.stop();
    await page.getByRole("link", { name: "Start: Moss" }).click();
    await check(page, "32.0", "1.5");
    await expect(page.getByText("Stop, find the cause")).toBeVisible();
    await expectAccessible(page);
    await page.getByRole("button", { name: "All done: to the test day" }).click();
    await expect(done(page)).toContainText("Stop, find the cause");
    await expect(done(page)).toContainText("Saved on this phone");
    await page.reload();
    await expect(done(page)).toContainText("Moss");
    await page.getByRole("link", { name: "Line-up" }).click();
    await expect(page.getByRole("link", { name: /Moss/ })).toContainText("Delivery low");
    await expect(page.getByRole("link", { name: /Moss/ })).toContainText("Saved on this phone");

    await server.start();
    await exchange(page);
    await wren.goto("/");
    await exchange(wren);
    await expect(card(wren, "Moss")).toContainText("Stop, find the cause");
    await card(wren, "Moss").getByRole("link", { name: "Moss" }).click();
    await expect(logLines(wren).first()).toContainText("Maud");

    // Maud writes on with no signal; meanwhile Wren takes the bike back.
    await page.getByRole("link", { name: /Moss/ }).click();
    await expect(page.getByText("Belongs to Wren")).toBeVisible();
    await expect(page.getByRole("link", { name: "Details and settings" })).toBeHidden();
    await page.route("**/api/sync", (route) => route.abort());
    await page.getByRole("link", { name: "Note" }).click();
    await writeNote(page, "Looks dry", "None");
    await expect(logLines(page).first()).toContainText("Saved on this phone");
    await wren.getByRole("link", { name: "Share with a club" }).click();
    await card(wren, "Moor Riders").getByRole("button", { name: "Withdraw it" }).click();
    await expect(card(wren, "Moor Riders")).toContainText("Not shared");

    await page.unrouteAll({ behavior: "wait" });
    await page.getByRole("button", { name: "Send and fetch now" }).click();
    await expect(page.getByRole("heading", { name: "This bike is not here" })).toBeVisible();
    await inTopBar(page, "Account").click();
    await page.getByText("Not sent yet: 1").click();
    await expect(page.getByText("This bike does not take entries from you")).toBeVisible();
    const file = page.waitForEvent("download");
    await page.getByRole("button", { name: "Save these as a file" }).click();
    expect((await file).suggestedFilename()).toMatch(/^sumpless-not-sent-/);
    await inTopBar(page, "Clubs").click();
    await page.getByRole("link", { name: "Line-up" }).click();
    await expect(page.getByText("No bike is shared with the club yet")).toBeVisible();
    await context.close();
  },
);

test("A mechanic's stop stands on the owner's bike until a later note lifts it", async ({
  page,
  browser,
  server,
}) => {
  const [maud, wren] = [await member(server, "Maud"), await member(server, "Wren")];
  const bikeId = newId();
  await wren.push([...knownBike(bikeId, "Moss"), checkEntry(bikeId, 32, 2.98, daysAgo(1))]);
  await share(wren, bikeId, await clubOf(maud, wren));
  // From a mail's link: the phone does not have this bike yet.
  await openAs(maud, page, `/bikes/${bikeId}`);
  await expect(page.getByText("Ride on")).toBeVisible();
  await page.getByRole("link", { name: "Note" }).click();
  await writeNote(page, "The hose is swollen", "Stop, find the cause");
  await expect(page.getByRole("alert")).toContainText("Maud wrote on");
  await expect(page.getByText("Ride on")).toBeHidden();
  await exchange(page);

  const owner = await phoneOf(browser, server, wren);
  await expect(card(owner, "Moss").getByRole("alert")).toContainText("The hose is swollen");
  await expect(card(owner, "Moss")).not.toContainText("Ride on");
  await expectAccessible(owner);
  await card(owner, "Moss").getByRole("link", { name: "Lift it by a note" }).click();
  await writeNote(owner, "New hose on", "Ride on");
  await expect(owner.getByText("Saved on this phone").first()).toBeVisible();
  await expect(owner.getByRole("alert")).toBeHidden();
  await expect(owner.getByText("Ride on").first()).toBeVisible();
  await owner.context().close();
});

testAlone(
  "A mechanic finds, filters and sorts the Line-up, also with the server gone",
  async ({ page, server }) => {
    const [maud, wren] = [await member(server, "Maud"), await member(server, "Wren")];
    const [sound, low, over] = [newId(), newId(), newId()];
    await wren.push([
      ...knownBike(sound, "Sound"),
      checkEntry(sound, 22, 2.95, daysAgo(9)),
      ...knownBike(low, "Low"),
      checkEntry(low, 32, 1.5, daysAgo(9)),
      ...knownBike(over, "Over"),
      hoursEntry(over, 40, daysAgo(2)),
    ]);
    const club = await clubOf(maud, wren);
    for (const bikeId of [sound, low, over]) await share(wren, bikeId, club);
    await openAs(maud, page, `/clubs/${club.id}`);
    const lines = page.getByRole("main").getByRole("listitem");
    await expect(lines).toHaveCount(3);
    await expect(lines).toContainText(["Low", "Over", "Sound"]);
    await expect(lines.nth(1)).toContainText("8.0 h over");

    await page.getByRole("searchbox", { name: "Find" }).fill("sou");
    await expect(lines).toContainText(["Sound"]);
    await expect(lines).toHaveCount(1);
    await lines.first().getByRole("link").click();
    await expect(page.getByRole("heading", { name: "Sound" })).toBeVisible();
    await page.getByRole("link", { name: "Line-up" }).click();
    await expect(page.getByRole("searchbox", { name: "Find" })).toHaveValue("sou");
    await page.getByRole("searchbox", { name: "Find" }).fill("");
    await page.getByText("Every bike: worst first").click();
    await expect(
      page.getByText(/Worst first: stop, repeat before riding, check overdue/),
    ).toBeVisible();
    await page.getByLabel("Show").selectOption("Overdue, or due soon");
    await expect(lines).toHaveCount(2);
    await page.getByLabel("Show").selectOption("Every bike");
    await page.getByLabel("Order").selectOption("Name");
    await expect(lines).toContainText(["Low", "Over", "Sound"]);
    await page.getByLabel("Order").selectOption("Fewest hours left");
    await expect(lines).toContainText(["Over", "Low", "Sound"]);

    await page.setViewportSize({ width: 1280, height: 800 });
    const names = page.getByRole("rowheader").getByRole("link");
    await expect(names).toHaveText(["Over", "Low", "Sound"]);
    await page.getByRole("button", { name: "Of baseline" }).click();
    await expect(names).toHaveText(["Low", "Sound", "Over"]);
    await expect(page.getByRole("columnheader", { name: "Of baseline" })).toHaveAttribute(
      "aria-sort",
      "ascending",
    );
    await expectAccessible(page);

    await remembered(page, "line-up");
    await waitUntilInstalled(page);
    await server.stop();
    await page.goto(`/clubs/${club.id}`);
    await expect(names).toHaveText(["Low", "Over", "Sound"]);
    await expect(page.getByText("This is as the server last said")).toBeVisible();
  },
);

testAlone(
  "A test day's logs are fetched beforehand, for sixty bikes in a row",
  async ({ page, server }) => {
    const [maud, wren] = [await member(server, "Maud"), await member(server, "Wren")];
    const bikes = Array.from({ length: 60 }, (_, index) => ({
      bikeId: newId(),
      name: `Bike ${String(index + 1).padStart(2, "0")}`,
    }));
    await wren.push(bikes.flatMap(({ bikeId, name }) => knownBike(bikeId, name)));
    const club = await clubOf(maud, wren);
    for (const { bikeId } of bikes) await share(wren, bikeId, club);
    await openAs(maud, page);
    await openTestDay(page);
    await addSyringe(page);
    await page.getByRole("button", { name: "Add all 60 of them" }).click();
    await expect(queue(page)).toContainText("All their logs are on this phone");
    await page.getByRole("button", { name: "Show all 60" }).click();
    await expect(queue(page).getByText("Ready")).toHaveCount(60);
    await waitUntilInstalled(page);

    await server.stop();
    await page.reload();
    await page.getByRole("link", { name: /^Start: Bike/ }).click();
    // What is typed outlives a reload.
    await page.getByRole("textbox", { name: "Run 1: level after" }).fill("2.9");
    await expect(page.getByText("Ride on")).toBeVisible();
    await waitUntilDrafted(page, '"endText":"2.9"');
    await page.reload();
    await expect(page.getByRole("textbox", { name: "Run 1: level after" })).toHaveValue("2.9");
    for (const levelMl of ["2.9", "1.4", "3"]) {
      await check(page, "30", levelMl);
      await page.getByRole("button", { name: /^Next: Bike/ }).click();
      await expect(page.getByRole("button", { name: "Save the check" })).toBeVisible();
    }
    await page.getByRole("link", { name: "Test day" }).click();
    await expect(queue(page)).toContainText("Queue: 57");
    await expect(done(page)).toContainText("Done: 3");
    await expect(done(page).getByText("Saved on this phone")).toHaveCount(3);
    await server.start();
    await exchange(page);
    await expect(done(page).getByText("Sent")).toHaveCount(3);
    const answer = await wren.call("GET", "/api/bikes");
    const { bikes: summaries } = (await answer.json()) as { bikes: { checks: unknown[] }[] };
    expect(summaries.filter(({ checks }) => checks.length === 2)).toHaveLength(3);

    await page.getByRole("button", { name: "End the test day" }).click();
    await page.getByRole("button", { name: "End it" }).click();
    await expect(queue(page)).toContainText("Nobody waits");
  },
);

test("An organiser revokes, removes, and cannot leave a club without an organiser", async ({
  page,
  server,
}) => {
  const [odo, wren] = [await member(server, "Odo"), await member(server, "Wren")];
  const club = await clubOf(odo, wren);
  await openAs(odo, page, `/clubs/${club.id}/members`);
  const open = page.getByRole("region", { name: "Invitations" });
  await open.getByRole("button", { name: /^Revoke/ }).click();
  await expect(open).toContainText("None is open at present");
  await open.getByRole("button", { name: "Invite" }).click();
  await page.getByRole("textbox", { name: "How many may join by it" }).fill("0");
  await page.getByLabel("E-mail it to").fill("fenn@");
  await page.getByRole("button", { name: "Make the invitation" }).click();
  await expect(page.getByText("At least one may join.")).toBeVisible();
  await expect(page.getByText("This does not look like an e-mail address.")).toBeVisible();
  await page.getByRole("textbox", { name: "How many may join by it" }).fill("1");
  await page.getByLabel("E-mail it to").fill("fenn@moor.example");
  await page.getByRole("button", { name: "Make the invitation" }).click();
  await expect(page.getByText("It was not mailed")).toBeVisible();
  await expect(page.getByRole("textbox", { name: "Link" })).toHaveValue(/join\?token=/);
  await expectAccessible(page);
  await page.getByRole("link", { name: "Confirm my address" }).click();
  await expect(page.getByText("This address is not confirmed yet")).toBeVisible();
  await page.goto(await mailedLink(server, "Confirm your e-mail address", odo.email));
  await page.getByRole("button", { name: "Yes, this is my address" }).click();
  await expect(page.getByText("Confirmed, thank you")).toBeVisible();

  await page.goto(`/clubs/${club.id}/members`);
  await open.getByRole("button", { name: "Invite" }).click();
  await page.getByLabel("E-mail it to").fill("fenn@moor.example");
  await page.getByRole("button", { name: "Make the invitation" }).click();
  await expect(page.getByText("It is on its way to fenn@moor.example")).toBeVisible();
  await page.getByRole("button", { name: "Close", exact: true }).click();
  await expect(open).toContainText("fenn@moor.example");

  await page.getByRole("button", { name: "Leave the club" }).click();
  await page.getByRole("button", { name: "Yes, leave it" }).click();
  await expect(page.getByRole("alert")).toContainText("would be left without an organiser");
  await page.getByRole("button", { name: "Stay" }).click();
  await page.getByRole("button", { name: /^Odo \(you\)/ }).click();
  await page.getByRole("checkbox", { name: /^Organiser/ }).uncheck();
  await page.getByRole("button", { name: "Save" }).click();
  await expect(page.getByRole("alert")).toContainText("would be left without an organiser");
  await expectAccessible(page);
  await page.getByRole("button", { name: "Close", exact: true }).click();
  await page.getByRole("button", { name: /^Wren/ }).click();
  await page.getByText("Remove from the club").click();
  await page.getByRole("button", { name: "Remove Wren" }).click();
  await expect(page.getByRole("dialog")).toBeHidden();
  await expect(page.getByRole("button", { name: /^Wren/ })).toBeHidden();

  await page.getByRole("button", { name: "Close the club" }).click();
  await page.getByRole("button", { name: "Yes, close it for everyone" }).click();
  await expect(page.getByText("You are in none yet")).toBeVisible();
});

test("A rider says which reminders to get", async ({ page, rider }) => {
  await rider.signUp();
  await openAs(rider, page);
  await inTopBar(page, "Account").click();
  const due = page.getByRole("checkbox", { name: /^A check falls due/ });
  await expect(due).toBeChecked();
  await due.click();
  await expect(due).not.toBeChecked();
  await expect
    .poll(async () => (await rider.call("GET", "/api/account/reminders")).text())
    .toBe('{"reminders":{"dueMails":false,"stopMails":true}}');
  await page.reload();
  await expect(due).not.toBeChecked();
});

for (const colorScheme of ["light", "dark"] as const)
  test(`A mechanic can read and reach everything of a club in the ${colorScheme} theme`, async ({
    page,
    server,
  }) => {
    const [maud, wren] = [await member(server, "Maud"), await member(server, "Wren")];
    const bikeId = newId();
    await wren.push([
      ...knownBike(bikeId, "A bike with quite a long name, written out in full"),
      checkEntry(bikeId, 32, 2.6, daysAgo(9)),
    ]);
    await maud.push([bikeEntry(newId(), { name: "Own" })]);
    const club = await clubOf(maud, wren);
    await share(wren, bikeId, club);
    await page.emulateMedia({ colorScheme });
    await openAs(maud, page);
    await expect(card(page, "Own")).toBeVisible();
    await openTestDay(page);
    await addSyringe(page);
    await page.getByRole("button", { name: /A bike with quite/ }).click();
    await expect(queue(page)).toContainText("All their logs are on this phone");
    const paths = [
      "/clubs",
      `/clubs/${club.id}`,
      `/clubs/${club.id}/members`,
      `/clubs/${club.id}/test-day`,
      `/clubs/${club.id}/test-day/${bikeId}`,
      `/bikes/${bikeId}`,
      `/bikes/${bikeId}/log/note`,
      "/clubs/nowhere",
      "/join?token=nothing",
      "/unsubscribe?token=nothing",
    ];
    for (const path of paths) {
      await page.setViewportSize({ width: 360, height: 780 });
      await page.goto(path);
      await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
      await expectAccessible(page);
      for (const [width, size] of [
        [320, "16px"],
        [320, "32px"],
        [900, "16px"],
        [1280, "16px"],
      ] as const) {
        await page.setViewportSize({ width, height: 800 });
        await setLetters(page, size);
        await expectNoSidewaysScroll(page, `${path} at ${width}, ${size}`);
      }
    }
  });
