/**
 * Independent standard uncertainties of one unit, combined: √Σuᵢ².
 * Source: GUM (JCGM 100), 5.1.2. Edge: of nothing, 0.
 *
 * @example rootSumOfSquares(3, 4) // 5
 */
export function rootSumOfSquares(...uncertainties: number[]): number {
  return Math.hypot(...uncertainties);
}

/**
 * Standard uncertainty of a value known to lie anywhere within ±`halfWidth`: halfWidth/√3.
 * Source: GUM (JCGM 100), 4.3.7.
 *
 * @example rectangularUncertainty(1) // 0.577
 */
export function rectangularUncertainty(halfWidth: number): number {
  return halfWidth / Math.sqrt(3);
}
