import { describe, expect, test } from "vitest";
import {
  rectangularUncertainty,
  rootSumOfSquares,
} from "../../shared/delivery/root-sum-of-squares.ts";
import { syringeToleranceMl } from "../../shared/delivery/syringe-tolerance-ml.ts";
import { OIL_EXPANSION_PER_K, volumeAt15C } from "../../shared/delivery/volume-at-15c.ts";

describe("the uncertainty of a volume: EURACHEM/CITAC QUAM:2012, example A1", () => {
  // A triangular distribution of ±0.1 mL is the sum of two rectangular ones of ±0.05 mL.
  const flask = rootSumOfSquares(rectangularUncertainty(0.05), rectangularUncertainty(0.05));
  const temperature = rectangularUncertainty(100 * 4 * 2.1e-4);

  test("has the printed parts", () => {
    expect(flask).toBeCloseTo(0.0408, 4);
    expect(temperature).toBeCloseTo(0.0485, 4);
  });

  test("combines them with the repeatability of 0.02 mL to 0.0664731 mL", () => {
    expect(rootSumOfSquares(flask, 0.02, temperature)).toBeCloseTo(0.0664731, 7);
  });
});

describe("the tolerance of a syringe: ISO 7886-1", () => {
  test("is 0.19 mL for 4 mL from a 10 mL syringe (a test laboratory's worked case)", () => {
    expect(syringeToleranceMl(10, 4)).toBeCloseTo(0.19, 12);
  });

  test.each([
    ["1 mL rule, below half", 1, 0.4, 0.015 + 0.008],
    ["1 mL rule, from half on", 1, 0.5, 0.025],
  ])("%s", (_, capacity, expelled, tolerance) => {
    expect(syringeToleranceMl(capacity, expelled)).toBeCloseTo(tolerance, 12);
  });

  // The cells of the table for larger syringes, from memory; derived by hand.
  test.each([
    [2.5, 1, 0.0575],
    [2.5, 1.25, 0.0625],
    [5, 2, 0.095],
    [5, 2.5, 0.1],
    [5, 5, 0.2],
    [10, 5, 0.2],
    [10, 10, 0.4],
  ])("is, for a %f mL syringe at %f mL, %f mL (from memory)", (capacity, expelled, tolerance) => {
    expect(syringeToleranceMl(capacity, expelled)).toBeCloseTo(tolerance, 12);
  });
});

describe("the thermal expansion of lubricating oil: API MPMS 11.1 / ASTM D1250", () => {
  test("is 7.216e-4 per K at a density of 870 kg/m³", () => {
    expect(OIL_EXPANSION_PER_K).toBeCloseTo(7.216e-4, 7);
  });

  test.each([
    [0, 1.01079],
    [15, 1],
    [20, 0.99639],
    [30, 0.98914],
    [40, 0.98187],
  ])("brings a volume at %f °C to 15 °C by the factor %f (recomputed with scipy)", (t, factor) => {
    expect(volumeAt15C(1, t)).toBeCloseTo(factor, 5);
  });

  test("agrees with an oil laboratory's rule of thumb: 200 L warmed by 50 K grow by about 7 L", () => {
    const grownL = 200 * (volumeAt15C(1, 15) / volumeAt15C(1, 65) - 1);
    expect(Math.abs(grownL - 7)).toBeLessThan(0.7);
  });
});
