import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { fitLine, type PointWithUncertainty } from "./fit-line.ts";

/** Points as logbooks hold them, wild ones included. */
const point = fc.record({
  x: fc.double({ min: 0, max: 100_000, noNaN: true }),
  y: fc.double({ min: 0, max: 1_000, noNaN: true }),
  u: fc.double({ min: 0, max: 1_000, noNaN: true, minExcluded: true }),
});

const hourly = fc.array(
  fc.record({
    x: fc.integer({ min: 0, max: 2_000 }),
    y: fc.integer({ min: 1, max: 100 }).map((tenths) => tenths / 10),
    u: fc.integer({ min: 1, max: 50 }).map((hundredths) => hundredths / 100),
  }),
  { minLength: 2, maxLength: 20 },
);

describe("fitLine", () => {
  test("passes through two points (the documented example, by hand)", () => {
    const fit = fitLine([
      { x: 0, y: 3, u: 0.1 },
      { x: 10, y: 2, u: 0.1 },
    ]);
    expect(fit?.intercept).toBeCloseTo(3, 12);
    expect(fit?.slope).toBeCloseTo(-0.1, 12);
    expect(fit?.uIntercept).toBeCloseTo(0.1, 12);
    expect(fit?.covariance).toBeCloseTo(-0.001, 12);
    expect(fit?.uSlope).toBeCloseTo((0.1 * Math.SQRT2) / 10, 12);
    expect(fit?.chiSquared).toBeCloseTo(0, 12);
    expect(fit?.degreesOfFreedom).toBe(0);
  });

  test("follows the points that are known well", () => {
    const fit = fitLine([
      { x: 0, y: 3, u: 0.001 },
      { x: 10, y: 3, u: 0.001 },
      { x: 20, y: 9, u: 100 },
    ]);
    expect(fit?.slope).toBeCloseTo(0, 6);
  });

  test.each([
    ["no point", []],
    ["one point", [{ x: 1, y: 3, u: 0.1 }]],
    ["equal x that rounding could tell apart", [0.1, 0.1, 0.1].map((x) => ({ x, y: x, u: 0.1 }))],
    ["a point with no uncertainty", [0, 1].map((x) => ({ x, y: x, u: 0 }))],
    ["a point that is not a number", [0, Number.NaN].map((x) => ({ x, y: 1, u: 1 }))],
    ["x too close for doubles", [0, Number.MIN_VALUE].map((x) => ({ x, y: x, u: 1 }))],
  ])("answers null for %s", (_, points: PointWithUncertainty[]) => {
    expect(fitLine(points)).toBeNull();
  });

  test("holds only finite numbers, whatever the points, and leaves them as they were", () => {
    fc.assert(
      fc.property(fc.array(point, { maxLength: 12 }), (points) => {
        const before = structuredClone(points);
        const fit = fitLine(points);
        expect(points).toEqual(before);
        if (fit) expect(Object.values(fit).every(Number.isFinite)).toBe(true);
      }),
    );
  });

  test("keeps its digits when the hours are counted from far away", () => {
    fc.assert(
      fc.property(hourly, fc.integer({ min: 0, max: 100_000 }), (points, shift) => {
        const fit = fitLine(points);
        const moved = fitLine(points.map((p) => ({ ...p, x: p.x + shift })));
        fc.pre(fit !== null && moved !== null);
        expect(Math.abs(moved.slope - fit.slope)).toBeLessThan(1e-9 * fit.uSlope);
        expect(Math.abs(moved.uSlope - fit.uSlope)).toBeLessThan(1e-9 * fit.uSlope);
      }),
    );
  });

  test("scales with the volumes and keeps its χ²", () => {
    fc.assert(
      fc.property(hourly, fc.constantFrom(0.25, 2, 8), (points, factor) => {
        const fit = fitLine(points);
        const scaled = fitLine(points.map((p) => ({ ...p, y: p.y * factor, u: p.u * factor })));
        fc.pre(fit !== null && scaled !== null);
        expect(scaled.slope).toBe(fit.slope * factor);
        expect(scaled.uSlope).toBe(fit.uSlope * factor);
        expect(scaled.chiSquared).toBe(fit.chiSquared);
      }),
    );
  });
});
