import { crossing } from "../delivery/crossing.ts";
import { fitLine, type LineFit } from "../delivery/fit-line.ts";
import { Z_95 } from "../delivery/judge.ts";
import { rootSumOfSquares } from "../delivery/root-sum-of-squares.ts";
import type { Trend } from "../schemas/summary.ts";
import type { JudgedSeries } from "./judge-series.ts";

/** Fewer sessions, or less riding between them, say nothing about a trend. */
const LEAST_SESSIONS = 3;
const LEAST_SPAN_HOURS = 10;

/** Uncertainties enlarged until they explain the scatter about the line (Birge). */
function birgeScaled(fit: LineFit): { fit: LineFit; scatters: boolean } {
  const excess = fit.degreesOfFreedom > 0 ? fit.chiSquared / fit.degreesOfFreedom : 0;
  if (excess <= 1) return { fit, scatters: false };
  const scale = Math.sqrt(excess);
  return {
    fit: {
      ...fit,
      uIntercept: fit.uIntercept * scale,
      uSlope: fit.uSlope * scale,
      covariance: fit.covariance * excess,
    },
    scatters: true,
  };
}

/**
 * How a series' delivery changes with engine hours, and when it may reach the limit.
 *
 * Formula: `fitLine` through the sessions, x = hours since the series' first session, with their
 * scale parts where more than one syringe was used; uncertainties × √(χ²/ν) where χ²/ν > 1. The
 * delivery is *declining* if slope + 1.645·u(slope) < 0; only then does `crossing` (k = 1.645) say
 * where the line meets the limit, (1 − actDrop) of the reference baseline. Units: mL a run, lifetime hours.
 * Source: ISO/TS 28037:2010 clause 6; Birge 1932; Fieller's limits.
 * Edges: null for fewer than 3 sessions or under 10 h; doubted hours are left out.
 *
 * @example deliveryTrend({ sessions: [3 mL at 10 h, 2.94 at 30, 2.88 at 50, 2.82 at 70], … }, 0.15)
 * // four runs each: trend: { perHour: -0.00299, …, reachesLimitAtHours: 160, range: { low: 112, high: 367 } }
 */
export function deliveryTrend(
  { sessions, reference }: Pick<JudgedSeries, "sessions" | "reference">,
  actDrop: number,
): { trend: Trend; scatters: boolean } | null {
  const limitMl = (1 - actDrop) * (reference?.perRunMl ?? 0);
  const counted = sessions.filter((session) => session.hoursCount);
  const start = counted[0]?.atHours ?? 0;
  const hours = counted.map((session) => session.atHours);
  if (counted.length < LEAST_SESSIONS || Math.max(...hours) - Math.min(...hours) < LEAST_SPAN_HOURS)
    return null;

  const syringes = new Set(counted.map(({ pooled }) => pooled.syringeId));
  const oneSyringe = syringes.size === 1 && !syringes.has(null);
  const raw = fitLine(
    counted.map(({ atHours, pooled }) => ({
      x: atHours - start,
      y: pooled.perRunMl,
      u: oneSyringe ? pooled.uMl : rootSumOfSquares(pooled.uMl, pooled.uScaleMl),
    })),
  );
  if (!raw) return null;
  const { fit, scatters } = birgeScaled(raw);
  const declining = fit.slope + Z_95 * fit.uSlope < 0;
  const meets = declining ? crossing(fit, limitMl, Z_95) : null;
  const ranged = meets && meets.low !== null && meets.high !== null;
  const trend: Trend = {
    perHour: fit.slope,
    uPerHour: fit.uSlope,
    reachesLimitAtHours: meets ? start + meets.at : null,
    range: ranged ? { low: start + meets.low!, high: start + meets.high! } : null,
  };
  return { trend, scatters };
}
