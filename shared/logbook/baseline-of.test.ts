import { expect, it } from "vitest";
import { logbook } from "../../tests/helpers/logbook-in-words.ts";
import { baselineOf } from "./baseline-of.ts";
import { baselineSeries } from "./baseline-series.ts";
import { lifetimeHours } from "./lifetime-hours.ts";

const baseline = ({ entries }: ReturnType<typeof logbook>) =>
  baselineOf(baselineSeries(entries, lifetimeHours(entries))[0]!);

it("is the first session that delivered anything (the documented example)", () => {
  // 3·0.99639, and √(0.2²/6 + (0.02·3)² + (0.0041663·3)²)·0.99639.
  expect(baseline(logbook().check(10, [0]).check(12, [3]).check(32, [2.9]))).toEqual({
    perRunMl: expect.closeTo(2.989, 3) as number,
    uMl: expect.closeTo(0.1017, 4) as number,
    uScaleMl: expect.any(Number) as number,
    syringeId: "five",
    oilTempC: null,
    atHours: 12,
  });
});

it("pools the checks of the session, and takes its last hours and mean temperature", () => {
  const pooled = baseline(
    logbook().check(10, [3], { oilTempC: 14 }).check(10.5, [3], { oilTempC: 16 }).check(11, [3]),
  );
  expect(pooled).toMatchObject({ oilTempC: 15, atHours: 11 });
  expect(pooled!.uMl).toBeLessThan(0.1017 / Math.sqrt(2.9));
});

it("is null until there is one", () => {
  expect(baseline(logbook().check(10, [0]))).toBeNull();
});
