import type { Syringe } from "../../../../shared/schemas/entry.ts";
import type { CheckSummary } from "../../../../shared/schemas/summary.ts";
import { usualScale, type Scale } from "../../../ui/column-scale.ts";
import type { ColumnReading } from "../../../ui/column-sentence.ts";

/**
 * The Column of one check, in the syringe it was read from. Its band is the uncertainty of the
 * comparison, so that band and limit tell how sure the verdict is.
 */
export function columnOfCheck(
  check: CheckSummary,
  actDrop: number,
  syringe: Syringe | null,
): ColumnReading & { scale: Scale } {
  const { baselineMl } = check;
  const readingMl = baselineMl ? check.ratio! * baselineMl : check.perRunMl;
  return {
    scale: syringe
      ? { maxMl: syringe.capacityMl, graduationMl: syringe.graduationMl }
      : usualScale(readingMl, baselineMl),
    readingMl,
    uMl: baselineMl ? check.uRatio! * baselineMl : check.uMl,
    baselineMl,
    limitMl: baselineMl && (1 - actDrop) * baselineMl,
  };
}
