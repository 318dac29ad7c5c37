import type { Summary } from "../../shared/schemas/summary.ts";
import { usualScale, type Scale } from "./column-scale.ts";
import type { ColumnReading } from "./column-sentence.ts";

/**
 * The Column of a bike as it stands: the session last judged in the present series, against its
 * baseline. Its uncertainty is that of the comparison, so that the band and the limit tell how
 * sure the verdict is.
 */
export function columnOfSummary(
  { series, checks }: Summary,
  actDrop: number,
): ColumnReading & { scale: Scale } {
  const present = series.length - 1;
  const baseline = series[present]?.baseline ?? null;
  const check = checks.findLast((candidate) => candidate.series === present);
  if (!baseline || !check) return { scale: usualScale(null), readingMl: null };
  const compared = check.ratio !== null && check.uRatio !== null;
  const readingMl = compared ? check.ratio! * baseline.perRunMl : check.perRunMl;
  return {
    scale: usualScale(readingMl, baseline.perRunMl),
    readingMl,
    uMl: compared ? check.uRatio! * baseline.perRunMl : check.uMl,
    baselineMl: baseline.perRunMl,
    limitMl: baseline.perRunMl * (1 - actDrop),
  };
}
