import type { Summary } from "../../shared/schemas/summary.ts";
import { usualScale, type Scale } from "./column-scale.ts";
import type { ColumnReading } from "./column-sentence.ts";

/**
 * The Column of a bike as it stands: the session last judged in the present series, against the
 * baseline it was held to. Its uncertainty is that of the comparison, so that the band and the
 * limit tell how sure the verdict is.
 */
export function columnOfSummary(
  { series, checks }: Summary,
  actDrop: number,
): ColumnReading & { scale: Scale } {
  const present = series.length - 1;
  const check = checks.findLast((candidate) => candidate.series === present);
  // A check with nothing to compare with is the baseline itself.
  const baselineMl = check?.baselineMl ?? series[present]?.baseline?.perRunMl ?? null;
  if (baselineMl === null || !check) return { scale: usualScale(null), readingMl: null };
  const compared = check.ratio !== null && check.uRatio !== null;
  const readingMl = compared ? check.ratio! * baselineMl : check.perRunMl;
  return {
    scale: usualScale(readingMl, baselineMl),
    readingMl,
    uMl: compared ? check.uRatio! * baselineMl : check.uMl,
    baselineMl,
    limitMl: baselineMl * (1 - actDrop),
  };
}
