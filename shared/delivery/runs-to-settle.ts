import { compareToBaseline, type Volume } from "./compare-to-baseline.ts";
import { judge, RIDE_RISK, type Limits } from "./judge.ts";
import { readingUncertaintyMl } from "./reading-uncertainty-ml.ts";
import { rootSumOfSquares } from "./root-sum-of-squares.ts";
import { runsPerFill } from "./runs-per-fill.ts";

/** No rider does more runs than this in one go. */
const MOST_RUNS = 10;

export interface FurtherRuns {
  session: Volume;
  baseline: Volume;
  limits: Limits;
  /** The barrel the further runs are read from, mL. */
  capacityMl: number;
  graduationMl: number;
  /** Standard deviation of one run, as a fraction of the delivery. */
  repeatability: number;
  /** Standard uncertainty that the oil's temperature gives, mL: the same for every run. */
  temperatureMl: number;
}

/**
 * The fewest further runs with the same syringe after which the verdict would be settled: pLow at
 * most 0.05 or at least 0.95, were the ratio to stay as it is.
 *
 * Formula: n further runs, as many a fill as the barrel holds, are a further check with
 * u = √(marks² + s²/n + temperature²), pooled with the session by 1/u² as the logbook pools them.
 * Units: mL; limits and repeatability as fractions. Source: GUM (JCGM 100), 5.1.2; JCGM 106:2012.
 * Edges: `runs` is 0 where it is settled already, null beyond 10; `baselineForbids` where even
 * perfect runs would not settle it, because the baseline (or the two scales) is too uncertain.
 *
 * @example runsToSettle({ session: 2.7 mL, u 0.0986; baseline: 3 mL, u 0.04; capacityMl: 5,
 *   graduationMl: 0.2, repeatability: 0.02, temperatureMl: 0.0112, … }) // { runs: 1, baselineForbids: false }
 */
export function runsToSettle(further: FurtherRuns): {
  runs: number | null;
  baselineForbids: boolean;
} {
  const settledWith = (uMl: number) => isSettled({ ...further.session, uMl }, further);
  if (settledWith(further.session.uMl)) return { runs: 0, baselineForbids: false };
  for (let runs = 1; runs <= MOST_RUNS; runs++) {
    if (settledWith(pooledUncertaintyMl(further, runs))) return { runs, baselineForbids: false };
  }
  return { runs: null, baselineForbids: !settledWith(0) };
}

function isSettled(session: Volume, { baseline, limits }: FurtherRuns): boolean {
  const { ratio, uRatio } = compareToBaseline(session, baseline);
  const { pLow } = judge(ratio, uRatio, limits);
  return pLow <= RIDE_RISK || pLow >= 1 - RIDE_RISK;
}

function pooledUncertaintyMl(further: FurtherRuns, runs: number): number {
  const { session, capacityMl, graduationMl, repeatability, temperatureMl } = further;
  const aFill = Math.max(1, runsPerFill(capacityMl, session.perRunMl));
  const furtherMl = rootSumOfSquares(
    readingUncertaintyMl({ fills: Math.ceil(runs / aFill), graduationMl, runs }),
    (repeatability * session.perRunMl) / Math.sqrt(runs),
    temperatureMl,
  );
  return (session.uMl * furtherMl) / rootSumOfSquares(session.uMl, furtherMl);
}
