/**
 * How much oil goes into a can of fuel for a fuel:oil ratio.
 *
 * Formula: litres × 1000/ratio.
 * Units: litres of fuel → mL of oil; the ratio is fuel to oil by volume (50 for 50:1).
 * Source: arithmetic.
 * Edges: a ratio that is not above zero, or fuel below zero, mixes nothing → null.
 *
 * @example premixMl(5, 50) // 100
 */
export function premixMl(litres: number, ratio: number): number | null {
  const oilMl = (litres * 1000) / ratio;
  return litres >= 0 && ratio > 0 && Number.isFinite(oilMl) ? oilMl : null;
}
