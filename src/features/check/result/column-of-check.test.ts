import { expect, test } from "vitest";
import { summariseLogbook } from "../../../../shared/logbook/summarise-logbook.ts";
import { logbook, syringe5 } from "../../../../tests/helpers/logbook-in-words.ts";
import { columnOfCheck } from "./column-of-check.ts";

const columnOfLast = ({ entries }: ReturnType<typeof logbook>) => {
  const summary = summariseLogbook({ ownerId: "owner", entries });
  return columnOfCheck(summary.checks.at(-1)!, 0.15, syringe5);
};

test("draws a check against its baseline and limit, in its own syringe", () => {
  const column = columnOfLast(logbook().bike({ name: "Bike" }).check(12, [3]).check(32, [2.7]));
  expect(column.scale).toEqual({ maxMl: 5, graduationMl: 0.2 });
  expect(column.baselineMl).toBeCloseTo(2.989, 3);
  expect(column.limitMl).toBeCloseTo(0.85 * 2.989, 2);
  expect(column.readingMl).toBeCloseTo(2.69, 2);
});

test("draws a first check alone", () => {
  const column = columnOfLast(logbook().bike({ name: "Bike" }).check(12, [3]));
  expect(column).toMatchObject({ baselineMl: null, limitMl: null });
});

test("draws a check of a series that hides a fault against the baseline before it", () => {
  const book = logbook().bike({ name: "Bike" }).check(12, [3]);
  const column = columnOfLast(book.work(20, ["pump-cleaned"], true).check(32, [2.4]));
  expect(column.baselineMl).toBeCloseTo(2.989, 3);
});
