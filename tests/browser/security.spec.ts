import type { Page } from "@playwright/test";
import type { Club } from "../../shared/schemas/club.ts";
import { bikeEntry, checkEntry, newId, noteEntry, strikeEntry } from "../helpers/make-entry.ts";
import { exchange, share } from "./club-scene.ts";
import { expect, openAs, Rider, test } from "./fixtures.ts";

/** What somebody might type into a field, told apart by the field. */
const markup = (field: string) => `"><img src=x onerror=alert(1)>${field}`;

/** All that a page says, in sight or folded away, and what its fields hold. */
const textOf = (page: Page) =>
  page.evaluate(() => {
    const fields = [...document.querySelectorAll<HTMLInputElement>("input, textarea, select")];
    return [document.body.textContent, ...fields.map(({ value }) => value)].join("\n");
  });

/** Every kind of entry with every text that it can hold. */
function markedLog(bikeId: string): object[] {
  const entry = (kind: string, hours: number | null, body: object) => ({
    ...noteEntry(bikeId),
    id: newId(),
    kind,
    hours,
    body,
  });
  const note = noteEntry(bikeId, markup("note"));
  const check = checkEntry(bikeId, 12, 3);
  const syringe = { ...check.body.syringe!, label: markup("syringe") };
  const [name, make, model] = ["bike", "make", "model"].map(markup);
  return [
    bikeEntry(bikeId, { name: name!, make: make!, model: model! }),
    { ...check, body: { ...check.body, syringe, note: markup("check") } },
    entry("hours", 13, { note: markup("hours") }),
    entry("work", 13, { items: ["other"], startsSeries: false, note: markup("work") }),
    note,
    { ...strikeEntry(bikeId, note.id), body: { entryId: note.id, reason: markup("strike") } },
  ];
}

test("Markup in any text that riders type is shown as the text it is", async ({ page, server }) => {
  const rider = new Rider(server.origin);
  await rider.signUp(markup("rider"));
  const bikeId = newId();
  await rider.push(markedLog(bikeId));
  const made = await rider.call("POST", "/api/clubs", { name: markup("club") });
  const { club } = (await made.json()) as { club: Club };
  await rider.call("PUT", `/api/clubs/${club.id}/members/${rider.id}`, { mechanic: true });
  await share(rider, bikeId, club);
  const invited = await rider.call("POST", `/api/clubs/${club.id}/invites`, {});
  const { url } = (await invited.json()) as { url: string };

  page.on("dialog", (dialog) => expect(dialog.message(), "a script has run").toBe(""));
  await rider.enterOn(page.context());
  const seen: string[] = [];
  const screens: [path: string, ...fields: string[]][] = [
    ["/", "bike"],
    [`/bikes/${bikeId}`, "bike", "syringe", "check", "hours", "work", "note", "strike"],
    [`/bikes/${bikeId}/details`, "bike", "make", "model"],
    [`/bikes/${bikeId}/share`, "club"],
    ["/syringes", "syringe"],
    ["/account", "rider"],
    ["/clubs", "club"],
    [`/clubs/${club.id}`, "bike", "rider"],
    [`/clubs/${club.id}/members`, "rider"],
    [url.replace(server.origin, ""), "club"],
  ];
  for (const [path, ...fields] of screens) {
    await page.goto(path);
    for (const field of fields)
      await expect.poll(() => textOf(page), `${field} on ${path}`).toContain(markup(field));
    await expect(page.locator("img[src=x]"), path).toHaveCount(0);
    seen.push(...fields);
  }
  expect(new Set(seen).size).toBe(11);
});

test("A page of another site can neither frame the app nor send a form to it", async ({
  browser,
  rider,
  server,
}) => {
  await rider.signUp();
  // A page of its own: what the browser says of the refused frame is no error of ours.
  const page = await browser.newPage({ baseURL: server.origin });
  await openAs(rider, page);
  const elsewhere = server.origin.replace("localhost", "127.0.0.1");
  await page.route(`${elsewhere}/trap`, (route) =>
    route.fulfill({
      contentType: "text/html",
      body: `<iframe src="${server.origin}/"></iframe>
        <form method="post" action="${server.origin}/api/auth/sign-out"></form>`,
    }),
  );
  await page.goto(`${elsewhere}/trap`);
  await expect.poll(() => page.frames()[1]?.url()).toBe("chrome-error://chromewebdata/");
  await page.locator("form").evaluate((form: HTMLFormElement) => form.submit());
  await expect(page.getByText("not sent from the logbook's own address")).toBeVisible();
  await page.goto("/");
  await exchange(page);
  await page.context().close();
});
