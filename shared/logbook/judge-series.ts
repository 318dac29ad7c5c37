import type { Volume } from "../delivery/compare-to-baseline.ts";
import type { Limits } from "../delivery/judge.ts";
import type { Baseline } from "../schemas/summary.ts";
import { baselineIndex, baselineOf, lastOf, poolSessions } from "./baseline-of.ts";
import type { Series, Session } from "./baseline-series.ts";
import {
  isFaulty,
  judgeAgainst,
  judgeFirst,
  nothingDelivered,
  worse,
  type Judged,
} from "./judge-session.ts";

export interface JudgedSession {
  checks: Session;
  atHours: number;
  hoursCount: boolean;
  pooled: Volume;
  judged: Judged;
}

export interface JudgedSeries {
  series: Series;
  baseline: Baseline | null;
  /** What the series is held to: its own baseline, or an earlier one that it could not replace. */
  reference: Baseline | null;
  sessions: JudgedSession[];
}

/**
 * Judges every session of every series. A series' first session is its baseline; unless the pump or
 * controller was renewed or the sequence changed, it is also held to the baseline before, and the
 * worse verdict stands. While that finds it dropping or low, the earlier baseline stays the
 * reference for the series' later sessions and for the next series: a fault cannot be hidden by
 * starting anew, once or repeatedly.
 */
export function judgeSeries(allSeries: readonly Series[], limits: Limits): JudgedSeries[] {
  let earlier: Baseline | null = null;
  return allSeries.map((series) => {
    if (series.resets) earlier = null;
    const judged = judgeOneSeries(series, earlier, limits);
    earlier = judged.reference ?? earlier;
    return judged;
  });
}

function judgeOneSeries(series: Series, earlier: Baseline | null, limits: Limits): JudgedSeries {
  const baseline = baselineOf(series);
  const pooled = poolSessions(series.sessions);
  const first = baselineIndex(pooled);
  const against = (held: Baseline, index: number) =>
    judgeAgainst(held, series.sessions[index]!, pooled[index]!, limits);
  const cannotReplace = earlier !== null && (first < 0 || isFaulty(against(earlier, first)));

  const sessions = series.sessions.map((checks, index): JudgedSession => {
    const volume = pooled[index]!;
    let judged: Judged;
    if (baseline && index > first) judged = against(baseline, index);
    else judged = volume.perRunMl > 0 ? judgeFirst(checks, volume) : nothingDelivered();
    if (earlier && (index <= first || cannotReplace)) {
      const held = against(earlier, index);
      judged = worse(judged, { ...held, flags: [...held.flags, "against-previous-baseline"] });
    }
    if (volume.disagrees) judged.flags.push("session-disagrees");
    return {
      checks,
      atHours: lastOf(checks).atHours,
      hoursCount: checks.some((check) => check.hoursCount),
      pooled: volume,
      judged,
    };
  });
  return { series, baseline, reference: cannotReplace ? earlier : baseline, sessions };
}
