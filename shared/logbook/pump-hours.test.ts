import { expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { lifetimeHours } from "./lifetime-hours.ts";
import { pumpHours } from "./pump-hours.ts";

const read = ({ entries }: ReturnType<typeof logbook>) =>
  pumpHours(entries, lifetimeHours(entries));

it("counts from the last time a pump was renewed", () => {
  const book = logbook().work(100, ["pump-renewed"], true).hours(110);
  expect(read(book)).toBe(10);
  expect(read(book.work(120, ["line-bled", "pump-renewed"], true).hours(128.5))).toBe(8.5);
});

// By hand: renewed at 100.0, the old meter ends at 112.0, the new one shows 3.0: 112 + 3 − 100.
it("goes on across a meter change", () => {
  const book = logbook().work(100, ["pump-renewed"], true).meter(112, 0).hours(3);
  expect(read(book)).toBe(15);
});

it("is not known where the log knows of no renewal", () => {
  expect(read(logbook().work(100, ["pump-cleaned"], true).hours(110))).toBeNull();
  expect(read(logbook().note("New bike"))).toBeNull();
});

it("is never below zero, also while a reading is doubted", () => {
  const book = logbook().hours(50).work(900, ["pump-renewed"], true, "2026-03-02T09:00:00Z");
  expect(read(book)).toBe(0);
});
