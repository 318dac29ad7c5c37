/**
 * The largest error, ± mL, that a syringe's scale may have at an expelled volume.
 *
 * Formula (V nominal capacity, v expelled volume, both mL):
 *   V < 5: 1.5 % V + 2 % v below V/2, 5 % v from V/2 on;
 *   V ≥ 5: 1.5 % V + 1 % v below V/2, 4 % v from V/2 on.
 * Source: ISO 7886-1 (sterile hypodermic syringes), graduated capacity.
 * Edge: nothing expelled leaves the part that comes from the capacity.
 *
 * @example syringeToleranceMl(10, 4) // 0.19
 */
export function syringeToleranceMl(capacityMl: number, expelledMl: number): number {
  const small = capacityMl < 5;
  if (expelledMl >= capacityMl / 2) return (small ? 0.05 : 0.04) * expelledMl;
  return 0.015 * capacityMl + (small ? 0.02 : 0.01) * expelledMl;
}
