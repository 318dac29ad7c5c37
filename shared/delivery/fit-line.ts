export interface PointWithUncertainty {
  x: number;
  y: number;
  /** Standard uncertainty of y, in y's unit, above zero. */
  u: number;
}

export interface LineFit {
  intercept: number;
  slope: number;
  uIntercept: number;
  uSlope: number;
  covariance: number;
  chiSquared: number;
  degreesOfFreedom: number;
}

const sum = (values: number[]) => values.reduce((total, value) => total + value, 0);

/**
 * The straight line y = intercept + slope·x through points whose y are uncertain by a known amount,
 * and how sure it is: weighted least squares.
 *
 * Formula: with w = 1/u², x̄ = Σwx/Σw, ȳ = Σwy/Σw and S = Σw(x − x̄)²:
 * slope = Σw(x − x̄)(y − ȳ)/S, intercept = ȳ − slope·x̄, u²(slope) = 1/S,
 * u²(intercept) = 1/Σw + x̄²/S, covariance = −x̄/S, χ² = Σw·residual², ν = points − 2.
 * Computed about the weighted mean, with weights relative to the finest point: no digits are lost to
 * a far origin and no weight overflows.
 * Units: slope in y's unit per x's unit; the covariance in y's unit squared per x's unit.
 * Source: ISO/TS 28037:2010, clause 6.
 * Edges: fewer than two different x, a u that is not above zero, or numbers that doubles cannot
 * hold → null. The points are not changed.
 *
 * @example fitLine([{ x: 0, y: 3, u: 0.1 }, { x: 10, y: 2, u: 0.1 }])
 * // intercept 3, slope −0.1, uIntercept 0.1, uSlope 0.0141, covariance −0.001, χ² 0, ν 0
 */
export function fitLine(points: readonly PointWithUncertainty[]): LineFit | null {
  const [first] = points;
  if (!first || !points.every(({ u }) => u > 0)) return null;
  const finest = Math.min(...points.map(({ u }) => u));
  const weights = points.map(({ u }) => (finest / u) ** 2);
  const totalWeight = sum(weights);
  const weighted = (values: number[]) => sum(values.map((value, i) => value * weights[i]!));

  // Counted from the first x, equal x give a spread of exactly zero, which rounding could not.
  const fromFirst = points.map(({ x }) => x - first.x);
  const meanFromFirst = weighted(fromFirst) / totalWeight;
  const yMean = weighted(points.map(({ y }) => y)) / totalWeight;
  const dx = fromFirst.map((x) => x - meanFromFirst);
  const dy = points.map(({ y }) => y - yMean);

  const spread = weighted(dx.map((d) => d * d));
  const slope = weighted(dx.map((d, i) => d * dy[i]!)) / spread;
  const xMean = first.x + meanFromFirst;
  const uSlope = finest / Math.sqrt(spread);
  const fit = {
    intercept: yMean - slope * xMean,
    slope,
    uIntercept: Math.hypot(finest / Math.sqrt(totalWeight), xMean * uSlope),
    uSlope,
    covariance: -xMean * uSlope * uSlope,
    chiSquared: sum(points.map(({ u }, i) => ((dy[i]! - slope * dx[i]!) / u) ** 2)),
    degreesOfFreedom: points.length - 2,
  };
  return Object.values(fit).every(Number.isFinite) ? fit : null;
}
