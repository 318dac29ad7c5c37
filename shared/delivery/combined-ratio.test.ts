import { describe, expect, test } from "vitest";
import { combinedRatio } from "./combined-ratio.ts";

describe("combinedRatio", () => {
  test("halves the ratio of two equal sources (the documented example)", () => {
    expect(combinedRatio(100, 100)).toBe(50);
  });

  test("is richer than either source, in any order (by hand: 80 and 50 → 30.77)", () => {
    expect(combinedRatio(80, 50)).toBeCloseTo(400 / 13, 12);
    expect(combinedRatio(50, 80)).toBe(combinedRatio(80, 50));
  });

  test("is the other's ratio where one source gives no oil", () => {
    expect(combinedRatio(Infinity, 80)).toBe(80);
  });

  test.each([
    [Infinity, Infinity],
    [0, 50],
    [50, -1],
    [Number.NaN, 50],
  ])("answers null for %f and %f", (a, b) => {
    expect(combinedRatio(a, b)).toBeNull();
  });
});
