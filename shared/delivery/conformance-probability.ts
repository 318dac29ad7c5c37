import normalCdf from "@stdlib/stats-base-dists-normal-cdf";

/**
 * How probable it is that the true value is at or above a lower limit, given a measured value and
 * its standard uncertainty (all in one unit).
 *
 * Formula: Φ((value − lowerLimit)/u). Source: JCGM 106:2012, 7.2 (normal distribution, one limit).
 * Edge: with u = 0 the answer is 1 above the limit, ½ on it and 0 below.
 *
 * @example conformanceProbability(509.7, 8.6, 490) // 0.989
 */
export function conformanceProbability(value: number, u: number, lowerLimit: number): number {
  const distance = value - lowerLimit;
  if (u === 0) return distance === 0 ? 0.5 : distance > 0 ? 1 : 0;
  return normalCdf(distance / u, 0, 1);
}
