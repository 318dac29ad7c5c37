import type { Baseline, CheckSummary, Summary } from "../../../../shared/schemas/summary.ts";

/**
 * The baseline that a check's ratio was taken to: that of its series, or of an earlier one which its
 * series could not replace. Null while there is nothing to compare with.
 */
export function heldBaseline(
  { series }: Pick<Summary, "series">,
  check: Pick<CheckSummary, "series" | "perRunMl" | "ratio" | "flags">,
): Baseline | null {
  const own = series[check.series]?.baseline ?? null;
  const { ratio } = check;
  if (!ratio || !check.flags.includes("against-previous-baseline")) return own;
  const distance = (baseline: Baseline) => Math.abs(ratio * baseline.perRunMl - check.perRunMl);
  const earlier = series.slice(0, check.series + 1).flatMap(({ baseline }) => baseline ?? []);
  return earlier.sort((a, b) => distance(a) - distance(b))[0] ?? own;
}
