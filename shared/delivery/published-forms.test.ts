import { describe, expect, it } from "vitest";
import { chiSquaredLimitPerDegree } from "./chi-squared-limit.ts";
import { conformanceProbability } from "./conformance-probability.ts";
import { readingUncertaintyMl } from "./reading-uncertainty-ml.ts";
import { rectangularUncertainty, rootSumOfSquares } from "./root-sum-of-squares.ts";
import { syringeToleranceMl } from "./syringe-tolerance-ml.ts";
import { volumeAt15C } from "./volume-at-15c.ts";

/** The examples that the doc comments give; the published values stand in tests/reference. */
describe("the small formulas answer as their examples say", () => {
  it.each([
    ["syringeToleranceMl", syringeToleranceMl(10, 4), 0.19],
    ["volumeAt15C", volumeAt15C(3, 20), 2.989],
    ["conformanceProbability", conformanceProbability(509.7, 8.6, 490), 0.989],
    ["chiSquaredLimitPerDegree", chiSquaredLimitPerDegree(1), 3.841],
    [
      "readingUncertaintyMl",
      readingUncertaintyMl({ fills: 1, graduationMl: 0.2, runs: 1 }),
      0.0816,
    ],
    ["rootSumOfSquares", rootSumOfSquares(3, 4), 5],
    ["rectangularUncertainty", rectangularUncertainty(1), 0.577],
  ])("%s", (_name, value, expected) => expect(Math.abs(value - expected)).toBeLessThan(0.0005));

  it("conformanceProbability steps at the limit where nothing is uncertain", () => {
    expect([489, 490, 491].map((value) => conformanceProbability(value, 0, 490))).toEqual([
      0, 0.5, 1,
    ]);
  });

  it("chiSquaredLimitPerDegree keeps the ninth value beyond, and refuses none", () => {
    expect(chiSquaredLimitPerDegree(20)).toBe(chiSquaredLimitPerDegree(9));
    expect(() => chiSquaredLimitPerDegree(0)).toThrow(RangeError);
  });
});
