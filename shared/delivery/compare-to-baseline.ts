import { rootSumOfSquares } from "./root-sum-of-squares.ts";

/** A delivery with its uncertainty, as it is compared: mL a run at 15 °C. */
export interface Volume {
  perRunMl: number;
  uMl: number;
  uScaleMl: number;
  /** The one syringe it was measured with; null where unknown or more than one. */
  syringeId: string | null;
}

/** Whether two deliveries were read from one and the same scale. */
export function sameSyringe(a: Volume, b: Volume): boolean {
  return a.syringeId !== null && a.syringeId === b.syringeId;
}

/**
 * A delivery as a fraction of the baseline's.
 *
 * Formula: r = V/B; u(r) = √[(u_V/B)² + (r·u_B/B)²], which is r·√[(u_V/V)² + (u_B/B)²] and holds at
 * V = 0 too. Where the syringes differ each side's scale part is added to its u; read from one
 * syringe, the scale's error cancels in the ratio.
 * Units: a fraction. Source: GUM (JCGM 100), 5.1.6. Edge: a baseline of 0 mL is none; the caller
 * never keeps one.
 *
 * @example compareToBaseline(
 *   { perRunMl: 2.7, uMl: 0.1, uScaleMl: 0, syringeId: "a" },
 *   { perRunMl: 3, uMl: 0.1, uScaleMl: 0, syringeId: "a" },
 * ) // { ratio: 0.9, uRatio: 0.0448 }
 */
export function compareToBaseline(
  delivery: Volume,
  baseline: Volume,
): { ratio: number; uRatio: number } {
  const ratio = delivery.perRunMl / baseline.perRunMl;
  const same = sameSyringe(delivery, baseline);
  const uOf = (volume: Volume) =>
    same ? volume.uMl : rootSumOfSquares(volume.uMl, volume.uScaleMl);
  const uRatio = rootSumOfSquares(uOf(delivery), ratio * uOf(baseline)) / baseline.perRunMl;
  return { ratio, uRatio };
}
