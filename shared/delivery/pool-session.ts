import { chiSquaredLimitPerDegree } from "./chi-squared-limit.ts";
import type { Volume } from "./compare-to-baseline.ts";
import { rootSumOfSquares } from "./root-sum-of-squares.ts";

/**
 * The checks of one session as one delivery.
 *
 * Formula: the 1/u²-weighted mean, u = 1/√Σ(1/u²). Read from one syringe, the scale's error is
 * common to all and stays apart (its weighted mean); read from several, each check's own is counted
 * in its u. The session disagrees with itself if Σ((V − mean)/u)² passes χ²'s 95 % point.
 * Source: GUM (JCGM 100); weighted mean of independent results.
 * Edge: one check is its own session, unchanged.
 *
 * @example poolSession([
 *   { perRunMl: 2.6, uMl: 0.1, uScaleMl: 0, syringeId: "a" },
 *   { perRunMl: 2.8, uMl: 0.1, uScaleMl: 0, syringeId: "a" },
 * ]) // perRunMl 2.7, uMl 0.0707, disagrees false
 */
export function poolSession(checks: readonly Volume[]): Volume & { disagrees: boolean } {
  const [first] = checks;
  if (!first) throw new RangeError("A session holds at least one check.");
  if (checks.length === 1) return { ...first, disagrees: false };

  const oneSyringe =
    first.syringeId !== null && checks.every((check) => check.syringeId === first.syringeId);
  const u = (check: Volume) =>
    oneSyringe ? check.uMl : rootSumOfSquares(check.uMl, check.uScaleMl);
  // Weights relative to the surest check's, so that none overflows; a check of u = 0 decides alone.
  const least = Math.min(...checks.map(u));
  const weights = checks.map((check) => (u(check) === least ? 1 : (least / u(check)) ** 2));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const mean = (value: (check: Volume) => number) =>
    checks.reduce((sum, check, i) => sum + value(check) * (weights[i] ?? 0), 0) / total;

  const perRunMl = mean((check) => check.perRunMl);
  const chiSquared = checks.reduce((sum, check) => {
    const distance = check.perRunMl - perRunMl;
    return distance === 0 ? sum : sum + (distance / u(check)) ** 2;
  }, 0);
  const degrees = checks.length - 1;
  return {
    perRunMl,
    uMl: least / Math.sqrt(total),
    uScaleMl: oneSyringe ? mean((check) => check.uScaleMl) : 0,
    syringeId: oneSyringe ? first.syringeId : null,
    disagrees: chiSquared / degrees > chiSquaredLimitPerDegree(degrees),
  };
}
