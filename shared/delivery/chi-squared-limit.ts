/** Upper 5 % points of χ² for 1 to 9 degrees of freedom (any published table). */
const UPPER_5_PERCENT = [3.841, 5.991, 7.815, 9.488, 11.07, 12.592, 14.067, 15.507, 16.919];

/**
 * How large χ² divided by its degrees of freedom may grow before chance (5 %) no longer explains it.
 *
 * Source: χ² tables, 95 % points. Edge: beyond 9 degrees of freedom the value for 9 is kept, which
 * is larger than the true one and so cries scatter less often, never more.
 *
 * @example chiSquaredLimitPerDegree(1) // 3.841
 */
export function chiSquaredLimitPerDegree(degreesOfFreedom: number): number {
  const tabled = Math.min(degreesOfFreedom, UPPER_5_PERCENT.length);
  const limit = UPPER_5_PERCENT[tabled - 1];
  if (limit === undefined) throw new RangeError("χ² needs at least one degree of freedom.");
  return limit / tabled;
}
