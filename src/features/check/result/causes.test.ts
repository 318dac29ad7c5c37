import { expect, test } from "vitest";
import { summariseLogbook } from "../../../../shared/logbook/summarise-logbook.ts";
import { entrySchema } from "../../../../shared/schemas/entry.ts";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import { causes, workBody } from "./causes.ts";

test("looks for the cheap and likely causes first", () => {
  expect(causes.map(({ id }) => id)).toEqual([
    "warm",
    "tank",
    "screen",
    "air",
    "hose",
    "volts",
    "clean",
    "renew",
    "controller",
  ]);
});

test("makes one entry of what was done, naming what has no kind of its own", () => {
  expect(workBody(["tank", "screen", "volts"], false)).toEqual({
    items: ["other", "screen-cleaned"],
    startsSeries: false,
    note: "Oil level and tank vent looked at.\nConnector, earth and volts under load looked at.",
  });
});

test("makes an entry that the log takes, whatever is ticked", () => {
  const entry = {
    id: "0190a000-0000-7000-9000-000000000001",
    bikeId: "0190a000-0000-7000-8000-000000000001",
    v: 1,
    kind: "work",
    at: "2026-03-01T09:00:00.000Z",
    hours: 12,
    body: workBody(
      causes.map(({ id }) => id),
      true,
    ),
  };
  expect(entrySchema.safeParse(entry).success).toBe(true);
});

test("makes no entry that says the hose is back on, whatever is ticked", () => {
  const all = causes.map(({ id }) => id);
  const book = logbook().bike({ name: "Bike" }).check(12, [3], { closedOut: false });
  book.work(12, workBody(all, true).items, true);
  const { flags } = summariseLogbook({ ownerId: "owner", entries: book.entries });
  expect(flags).toContain("not-closed-out");
});
