import { Z_95 } from "./judge.ts";
import { REPEATABILITY } from "./measure-delivery.ts";
import { readingUncertaintyMl } from "./reading-uncertainty-ml.ts";
import { rootSumOfSquares } from "./root-sum-of-squares.ts";
import { runsPerFill } from "./runs-per-fill.ts";

/** No one catches more runs than this for one check. */
const MOST_RUNS = 10;
/** A first check, which makes the baseline, is asked for this many times the runs of a later one. */
export const BASELINE_RUNS_FACTOR = 2;

export interface RunPlan {
  expectedMl: number;
  syringe: { capacityMl: number; graduationMl: number };
  /** u(B)/B of the baseline to compare with; null where it is still to be made. */
  uBaselineRelative: number | null;
  /** The stop limit as a drop from the baseline, a fraction (0.15). */
  actDrop: number;
}

export type PlannedRuns =
  | { runs: number; fills: number; uRatio: number }
  | { runs: null; reason: "barrel-too-small" | "marks-too-coarse" };

/**
 * How many runs a check needs, so that a pump on its baseline and one at the stop limit are told
 * apart with 5 % error either way.
 *
 * Formula: the fewest n ≤ 10 for which u(r) = √(u²(V)/V² + u²(B)/B²) ≤ actDrop/(2·1.645) at r = 1,
 * where u(V)/V holds only the reading of the marks and the repeatability, 2 %/√n. With no baseline
 * yet it is taken as made with 2n runs, which is what a first check is asked for.
 * Units: mL; uncertainties and drops as fractions. `fills` are those of the n runs.
 * Source: two one-sided 5 % errors; the 2 % is common practice, no published source.
 * Edges: the barrel cannot take one run → "barrel-too-small"; no n will do, because of this
 * syringe's marks or those the baseline was read from, or nothing is expected → "marks-too-coarse".
 *
 * @example planRuns({ expectedMl: 1, syringe: { capacityMl: 5, graduationMl: 0.2 },
 *   uBaselineRelative: null, actDrop: 0.15 }) // { runs: 3, fills: 1, uRatio: 0.0362 }
 */
export function planRuns(plan: RunPlan): PlannedRuns {
  const { expectedMl, syringe, uBaselineRelative, actDrop } = plan;
  const perFill = runsPerFill(syringe.capacityMl, expectedMl);
  if (perFill === 0) return { runs: null, reason: "barrel-too-small" };
  const relativeU = (runs: number) => {
    const fills = Math.ceil(runs / perFill);
    const readingMl = readingUncertaintyMl({ fills, graduationMl: syringe.graduationMl, runs });
    return rootSumOfSquares(readingMl / expectedMl, REPEATABILITY / Math.sqrt(runs));
  };
  for (let runs = 1; runs <= MOST_RUNS; runs++) {
    const uBaseline = uBaselineRelative ?? relativeU(BASELINE_RUNS_FACTOR * runs);
    const uRatio = rootSumOfSquares(relativeU(runs), uBaseline);
    if (uRatio <= actDrop / (2 * Z_95)) return { runs, fills: Math.ceil(runs / perFill), uRatio };
  }
  return { runs: null, reason: "marks-too-coarse" };
}
