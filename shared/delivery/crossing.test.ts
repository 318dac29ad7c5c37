import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { crossing } from "./crossing.ts";
import { fitLine } from "./fit-line.ts";

const K = 1.645;
const exactSlope = { intercept: 3, slope: -0.1, uIntercept: 0.1, uSlope: 0, covariance: 0 };

/** A falling or rising delivery over some hundred hours. */
const points = fc.array(
  fc.record({
    x: fc.integer({ min: 0, max: 500 }),
    y: fc.double({ min: 0.5, max: 6, noNaN: true }),
    u: fc.double({ min: 0.01, max: 1, noNaN: true }),
  }),
  { minLength: 2, maxLength: 12 },
);

describe("crossing", () => {
  test("lies k·u/slope either side of a line whose slope is exact (the documented example)", () => {
    expect(crossing(exactSlope, 2, 2)).toEqual({ at: 10, low: 8, high: 12 });
  });

  test("is the same distance away where the line rises", () => {
    const rising = { ...exactSlope, intercept: 1, slope: 0.1 };
    expect(crossing(rising, 2, 2)).toEqual({ at: 10, low: 8, high: 12 });
  });

  test("answers null for a flat line", () => {
    expect(crossing({ ...exactSlope, slope: 0 }, 2, K)).toBeNull();
    expect(crossing({ ...exactSlope, slope: 0 }, 3, K)).toBeNull();
  });

  test("has no limits where the slope cannot be told from zero", () => {
    const unsure = { ...exactSlope, uSlope: 0.1 };
    expect(crossing(unsure, 2, K)).toEqual({ at: 10, low: null, high: null });
    expect(crossing({ ...unsure, uSlope: 0.05 }, 2, 2)).toEqual({ at: 10, low: null, high: null });
  });

  test("reaches farther away from the measured hours than towards them", () => {
    const fit = fitLine([0, 20, 40, 60].map((x) => ({ x, y: 3 - x / 200, u: 0.05 })))!;
    const { at, low, high } = crossing(fit, 2.55, K)!;
    expect(at).toBeCloseTo(90, 9);
    expect(high! - at).toBeGreaterThan(at - low!);
  });

  test("has limits on which the line is exactly k uncertainties from the level", () => {
    fc.assert(
      fc.property(points, fc.double({ min: 0.5, max: 6, noNaN: true }), (measured, level) => {
        const fit = fitLine(measured);
        const found = fit && crossing(fit, level, K);
        fc.pre(!!found && found.low !== null && found.high !== null);
        expect(found.low).toBeLessThanOrEqual(found.at);
        expect(found.high).toBeGreaterThanOrEqual(found.at);
        for (const x of [found.low, found.high]) {
          const u = Math.sqrt(
            fit.uIntercept ** 2 + 2 * x * fit.covariance + x * x * fit.uSlope ** 2,
          );
          const away = Math.abs(fit.intercept + fit.slope * x - level);
          expect(Math.abs(away - K * u)).toBeLessThan(1e-6 * (K * u + Math.abs(fit.slope * x)));
        }
      }),
    );
  });

  test("holds only finite numbers or null, whatever the line", () => {
    const any = fc.double({ noNaN: true, noDefaultInfinity: true });
    const above = fc.double({ min: 0, noNaN: true, noDefaultInfinity: true });
    const line = fc.record({
      intercept: any,
      slope: any,
      uIntercept: above,
      uSlope: above,
      covariance: any,
    });
    fc.assert(
      fc.property(line, any, above, (fit, level, k) => {
        const before = { ...fit };
        const found = crossing(fit, level, k);
        expect(fit).toEqual(before);
        for (const value of Object.values(found ?? {}))
          expect(value === null || Number.isFinite(value)).toBe(true);
      }),
    );
  });
});
