/** The plunger stays clear of the barrel's end: this share of the capacity is used. */
const USABLE_SHARE = 0.95;
/** More runs than any check holds, for deliveries so small that the barrel never fills. */
const MOST = 30;

/**
 * How many runs go on in one barrel before it must be emptied.
 *
 * Formula: ⌊0.95·capacity/expected⌋, at most 30.
 * Units: both in mL.
 * Source: common practice, no published source.
 * Edges: 0 where the barrel cannot take one run; an expected delivery of nothing fills no
 * barrel (30).
 *
 * @example runsPerFill(5, 1) // 4
 */
export function runsPerFill(capacityMl: number, expectedMl: number): number {
  if (!(expectedMl > 0)) return MOST;
  // The hair is for quotients that rounding left just under a whole number.
  return Math.min(MOST, Math.floor((USABLE_SHARE * capacityMl) / expectedMl + 1e-9));
}
