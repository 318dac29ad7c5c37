import { describe, expect, test } from "vitest";
import { chiSquaredLimitPerDegree } from "../../shared/delivery/chi-squared-limit.ts";
import { conformanceProbability } from "../../shared/delivery/conformance-probability.ts";
import { judge } from "../../shared/delivery/judge.ts";

describe("a decision against a lower limit: JCGM 106:2012 (from memory, arithmetic recomputed)", () => {
  test("finds a container of 509.7 ± 8.6 kPa, 490 required, conforming with 0.9890", () => {
    expect(conformanceProbability(509.7, 8.6, 490)).toBeCloseTo(0.989, 4);
  });

  test.each([
    [0.8, 0.84],
    [0.9, 1.28],
    [0.95, 1.64],
    [0.99, 2.33],
    [0.999, 3.09],
  ])("reaches %f at the one-sided z of %f, as printed to two decimals", (probability, z) => {
    // 1.645 is printed as 1.64 or 1.65, hence the hair.
    expect(conformanceProbability(z - 0.0051, 1, 0)).toBeLessThan(probability);
    expect(conformanceProbability(z + 0.0051, 1, 0)).toBeGreaterThan(probability);
  });
});

describe("a guard band of the expanded uncertainty, k = 2: ILAC-G8:09/2019", () => {
  test("leaves a risk of 2.275 % at the acceptance limit", () => {
    const [limit, u] = [0.85, 0.03];
    expect(1 - conformanceProbability(limit + 2 * u, u, limit)).toBeCloseTo(0.02275, 5);
    expect(judge(limit + 2 * u, u, { watchDrop: 0.08, actDrop: 0.15 }).pLow).toBeCloseTo(
      0.02275,
      5,
    );
  });
});

describe("the upper 5 % points of χ² (any published table; recomputed with scipy)", () => {
  test.each([
    [1, 3.841],
    [2, 5.991],
    [3, 7.815],
    [4, 9.488],
    [5, 11.07],
    [6, 12.592],
    [7, 14.067],
    [8, 15.507],
    [9, 16.919],
  ])("are, for %i degrees of freedom, %f", (degreesOfFreedom, limit) => {
    expect(degreesOfFreedom * chiSquaredLimitPerDegree(degreesOfFreedom)).toBeCloseTo(limit, 9);
  });
});
