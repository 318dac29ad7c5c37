import { describe, expect, test } from "vitest";
import { crossing } from "../../shared/delivery/crossing.ts";
import { fitLine, type LineFit } from "../../shared/delivery/fit-line.ts";

/** Fits y over x, every point as uncertain as the others. */
function fitted(x: number[], y: number[], u: number): LineFit {
  const fit = fitLine(x.map((value, i) => ({ x: value, y: y[i] ?? Number.NaN, u })));
  if (!fit) throw new Error("These points make a line.");
  return fit;
}

const residualSd = ({ chiSquared, degreesOfFreedom }: LineFit) =>
  Math.sqrt(chiSquared / degreesOfFreedom);

/** In how many leading digits a value agrees with a certified one. */
function expectDigits(value: number, certified: number, digits: number) {
  const agreed = -Math.log10(Math.abs(value - certified) / Math.abs(certified));
  expect(agreed).toBeGreaterThan(digits);
}

describe("a line through points of known uncertainty: ISO/TS 28037:2010, 6.3", () => {
  const fit = fitted([1, 2, 3, 4, 5, 6], [3.3, 5.6, 7.1, 9.3, 10.7, 12.1], 0.5);

  test("has the printed parameters, uncertainties, covariance and χ²", () => {
    expect(fit.intercept).toBeCloseTo(1.866667, 6);
    expect(fit.uIntercept).toBeCloseTo(0.465475, 6);
    expect(fit.slope).toBeCloseTo(1.757143, 6);
    expect(fit.uSlope).toBeCloseTo(0.119523, 6);
    expect(fit.covariance).toBeCloseTo(-0.05, 12);
    expect(fit.chiSquared).toBeCloseTo(1.664762, 6);
    expect(fit.degreesOfFreedom).toBe(4);
  });

  test("meets y = 10.5 where the printed line does (u of x recomputed with scipy: 0.150787)", () => {
    // With a small k the limits lie k·u either side, as the law of propagation has them.
    const k = 1e-4;
    const { at, low, high } = crossing(fit, 10.5, k)!;
    expect(at).toBeCloseTo(4.913279, 6);
    expect((high! - low!) / (2 * k)).toBeCloseTo(0.150787, 6);
  });
});

describe("the line through NIST StRD's data set Norris", () => {
  const x = [
    0.2, 337.4, 118.2, 884.6, 10.1, 226.5, 666.3, 996.3, 448.6, 777.0, 558.2, 0.4, 0.6, 775.5,
    666.9, 338.0, 447.5, 11.6, 556.0, 228.1, 995.8, 887.6, 120.2, 0.3, 0.3, 556.8, 339.1, 887.2,
    999.0, 779.0, 11.1, 118.3, 229.2, 669.1, 448.9, 0.5,
  ];
  const y = [
    0.1, 338.8, 118.1, 888.0, 9.2, 228.1, 668.5, 998.5, 449.1, 778.9, 559.2, 0.3, 0.1, 778.1, 668.8,
    339.3, 448.9, 10.8, 557.7, 228.3, 998.0, 888.8, 119.6, 0.3, 0.6, 557.6, 339.3, 888.0, 998.5,
    778.9, 10.2, 117.6, 228.9, 668.4, 449.2, 0.2,
  ];
  const fit = fitted(x, y, 1);

  test("has the certified parameters and residual standard deviation to 10 digits and more", () => {
    expectDigits(fit.intercept, -0.262323073774029, 10);
    expectDigits(fit.slope, 1.00211681802045, 10);
    expectDigits(residualSd(fit), 0.884796396144373, 10);
  });

  test("has the variances and the covariance that belong to a sigma of 1", () => {
    expectDigits(fit.uIntercept ** 2, 0.0692384428759429, 10);
    expectDigits(fit.uSlope ** 2, 2.35960747164148e-7, 10);
    expectDigits(fit.covariance, -9.89095016390515e-5, 10);
  });
});

describe("where a line meets a level: Graybill & Iyer, Regression Analysis, p. 433", () => {
  test("is 66.5 with 99 % limits 65.07 and 68.03 (further digits recomputed with scipy)", () => {
    const x = [0, 10, 20, 30, 40, 50, 60, 70, 80, 90, 100];
    const y = [
      206.36, 225.52, 252.18, 289.33, 318.11, 349.49, 383.03, 410.7, 444.4, 469.14, 501.16,
    ];
    const t995With9 = 3.24983554159; // Student's t, 0.995, 9 degrees of freedom (any table)
    const { at, low, high } = crossing(fitted(x, y, residualSd(fitted(x, y, 1))), 400, t995With9)!;
    expect(at).toBeCloseTo(66.520043, 6);
    expect(low).toBeCloseTo(65.070894, 6);
    expect(high).toBeCloseTo(68.025832, 6);
  });
});
