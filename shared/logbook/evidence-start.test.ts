import { expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { baselineSeries } from "./baseline-series.ts";
import { evidenceStart } from "./evidence-start.ts";
import { lifetimeHours } from "./lifetime-hours.ts";

/** Where the last session's evidence starts, and how many sessions there are. */
function startOf({ entries }: ReturnType<typeof logbook>) {
  const sessions = baselineSeries(entries, lifetimeHours(entries))[0]!.sessions;
  return [evidenceStart(sessions, sessions.length - 1), sessions.length];
}
const at = (minutes: number) => new Date(Date.UTC(2026, 2, 21, 9, minutes)).toISOString();
const checkedAt32 = () => logbook().check(12, [3]).check(32, [2.4], {}, at(0));

it("is the session itself after an hour of riding", () => {
  expect(startOf(checkedAt32())).toEqual([1, 2]);
  expect(startOf(checkedAt32().check(33.2, [3], {}, at(70)))).toEqual([2, 3]);
});

it("is the session before while the hours are doubted", () => {
  expect(startOf(checkedAt32().check(33.2, [3], {}, at(5)))).toEqual([1, 3]);
  expect(startOf(checkedAt32().check(23, [3], {}, at(9999)))).toEqual([1, 3]);
  expect(startOf(checkedAt32().check(23, [3], {}, at(5)).check(40, [3], {}, at(9)))).toEqual([
    1, 4,
  ]);
});

it("is so too where a second odd reading agrees with the first, or an estimate was odd", () => {
  const twice = checkedAt32().check(33.2, [3], {}, at(5)).check(33.2, [3], {}, at(10));
  expect(startOf(twice)).toEqual([1, 3]);
  const lower = checkedAt32().check(23, [3], {}, at(5)).check(23, [3], {}, at(9999));
  expect(startOf(lower)).toEqual([1, 3]);
  const estimated = logbook()
    .check(12, [3])
    .check(32, [2.4], { estimatedHours: true }, at(0))
    .check(33.2, [3], {}, at(5));
  expect(startOf(estimated)).toEqual([1, 3]);
});

it("leaps over a session at doubted hours, and goes no further than what was surely ridden", () => {
  const odd = () => checkedAt32().check(320, [3], {}, at(5));
  expect(startOf(odd().check(32.1, [3], {}, at(15)))).toEqual([1, 4]);
  expect(startOf(odd().check(52, [3], {}, at(9999)))).toEqual([2, 4]);
  expect(startOf(odd().check(52, [3], {}, at(9999)).check(72, [3], {}, at(19999)))).toEqual([4, 5]);
});

it("is at most 19 sessions before", () => {
  const book = checkedAt32();
  for (let i = 0; i < 40; i++) book.check(2000 - 2 * i, [3], {}, at(i + 1));
  expect(startOf(book)).toEqual([22, 42]);
});
