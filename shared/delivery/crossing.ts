import type { LineFit } from "./fit-line.ts";

export interface Crossing {
  /** The x at which the fitted line meets the level. */
  at: number;
  /** The limits around it; null where the slope cannot be told from zero. */
  low: number | null;
  high: number | null;
}

type Line = Pick<LineFit, "intercept" | "slope" | "uIntercept" | "uSlope" | "covariance">;

/** The limits' offsets from `at`: one root at or below zero, one at or above. */
function offsets(fit: Line, at: number, k: number): [number, number] {
  const t = (k * fit.uSlope) / fit.slope;
  // The line is surest at `centre`, where its variance is least.
  const centre = fit.uSlope > 0 ? -fit.covariance / fit.uSlope / fit.uSlope : at;
  const lean = Math.abs(centre * fit.uSlope);
  const uLeast = Math.sqrt(Math.max(0, (fit.uIntercept - lean) * (fit.uIntercept + lean)));
  const arm = at - centre;
  // (1 − t²)d² − 2·t²·arm·d − reach² = 0, solved so that no digits cancel.
  const narrowing = (1 - t) * (1 + t);
  const half = t * t * arm;
  const reach = Math.hypot(t * arm, (k * uLeast) / fit.slope);
  const root = Math.hypot(half, Math.sqrt(narrowing) * reach);
  const farther = (half + (half < 0 ? -root : root)) / narrowing;
  const nearer = farther === 0 ? 0 : -(reach / narrowing) * (reach / farther);
  return farther < 0 ? [farther, nearer] : [nearer, farther];
}

/**
 * Where a fitted line meets a fixed level, with limits (k = 1.645: 95 % sure on each side).
 *
 * Formula: at = (level − a)/b; the limits are the roots of
 * (a + bx − level)² = k²(u²(a) + 2x·cov + x²·u²(b)), solved for the offset from `at`.
 * Units: x's unit of the fit; `level` in y's unit.
 * Source: Fieller's theorem for the mean response; worked in Graybill & Iyer, Regression Analysis,
 * p. 433.
 * Edges: a slope of zero, or a crossing beyond what doubles hold → null. A slope that cannot be
 * told from zero at k (|b| ≤ k·u(b)) → limits null: the line may never meet the level.
 *
 * @example crossing({ intercept: 3, slope: -0.1, uIntercept: 0.1, uSlope: 0, covariance: 0 }, 2, 2)
 * // { at: 10, low: 8, high: 12 }
 */
export function crossing(fit: Line, level: number, k: number): Crossing | null {
  const at = (level - fit.intercept) / fit.slope;
  if (!Number.isFinite(at)) return null;
  const limits = offsets(fit, at, k).map((offset) => at + offset);
  const [low, high] = limits.every(Number.isFinite) ? limits : [];
  return { at, low: low ?? null, high: high ?? null };
}
