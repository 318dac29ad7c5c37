/** Density of the oil at 15 °C, kg/m³: a usual two-stroke lubricating oil. */
const DENSITY_15 = 870;
/** Thermal expansion of lubricating oil at 15 °C, per K: K₁/ρ₁₅ with K₁ = 0.6278 (API MPMS 11.1). */
export const OIL_EXPANSION_PER_K = 0.6278 / DENSITY_15;
/** What the oil is taken to be where no temperature was written down, °C. */
export const ASSUMED_OIL_TEMP_C = 20;

/**
 * The volume, mL, that oil measured at `oilTempC` °C would take up at 15 °C.
 *
 * Formula: V·exp[−α·ΔT·(1 + 0.8·α·ΔT)], α = OIL_EXPANSION_PER_K, ΔT = temperature − 15 K.
 * Source: API MPMS chapter 11.1 / ASTM D1250, lubricating oils.
 * Edge: for thermal expansion only; what viscosity does to a pump is not corrected for.
 *
 * @example volumeAt15C(3, 20) // 2.989
 */
export function volumeAt15C(volumeMl: number, oilTempC: number): number {
  const expansion = OIL_EXPANSION_PER_K * (oilTempC - 15);
  return volumeMl * Math.exp(-expansion * (1 + 0.8 * expansion));
}
