/**
 * The fuel:oil ratio an engine gets from two sources at once: the pump, and oil mixed into the fuel.
 * It says how much oil there is, not where it goes: oil in the fuel may hardly reach the crank
 * bearings, so it never lifts a *stop*.
 *
 * Formula: 1/R = 1/a + 1/b.
 * Units: fuel to oil by volume (50 for 50:1), in any order.
 * Source: arithmetic.
 * Edges: Infinity is a source that gives no oil; a ratio that is not above zero, or no oil from
 * either → null.
 *
 * @example combinedRatio(100, 100) // 50
 */
export function combinedRatio(a: number, b: number): number | null {
  if (!(a > 0 && b > 0)) return null;
  const [richer, leaner] = a < b ? [a, b] : [b, a];
  const ratio = richer / (1 + richer / leaner);
  return Number.isFinite(ratio) ? ratio : null;
}
