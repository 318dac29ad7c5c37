import type { Volume } from "../delivery/compare-to-baseline.ts";
import type { Limits } from "../delivery/judge.ts";
import type { Baseline } from "../schemas/summary.ts";
import { baselineIndex, baselineOf, delivers, lastOf, poolSessions } from "./baseline-of.ts";
import type { Series, Session } from "./baseline-series.ts";
import { evidenceStart } from "./evidence-start.ts";
import {
  isFaulty,
  isMilder,
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
 * starting anew, once or repeatedly. Nor by repeating a check at odd hours: a session is judged
 * alone and together with those before that it may truly be one with, and the worst stands.
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
  const cannotReplace =
    earlier !== null &&
    (first < 0 || isFaulty(judgeAgainst(earlier, series.sessions[first]!, pooled[first]!, limits)));

  /** What the sessions from `start` to `index` say together of the last of them. */
  const judgeTogether = (start: number, index: number): Judged => {
    const checks = joined(series.sessions.slice(start, index + 1));
    const volume = poolSessions([checks])[0]!;
    const asFirst = () => (delivers(volume) ? judgeFirst(checks, volume) : nothingDelivered());
    const reachesFirst = start <= first;
    let judged =
      baseline && index > first ? judgeAgainst(baseline, checks, volume, limits) : asFirst();
    if (reachesFirst && index > first) judged = worse(judged, asFirst());
    if (earlier && (reachesFirst || cannotReplace)) {
      const held = judgeAgainst(earlier, checks, volume, limits);
      judged = worse(judged, { ...held, flags: [...held.flags, "against-previous-baseline"] });
    }
    if (volume.disagrees) judged.flags.push("session-disagrees");
    return judged;
  };

  /** Alone, and with every earlier session that it may truly be one with: the worst stands. */
  const judgeSession = (index: number): Judged => {
    let judged = judgeTogether(index, index);
    const furthest = evidenceStart(series.sessions, index);
    for (let start = index - 1; start >= furthest; start--) {
      const together = judgeTogether(start, index);
      if (isMilder(judged, together)) {
        together.flags.push("judged-with-earlier");
        judged = worse(together, judged);
      }
    }
    return judged;
  };

  const sessions = series.sessions.map((checks, index): JudgedSession => ({
    checks,
    atHours: lastOf(checks).atHours,
    hoursCount: checks.some((check) => check.hoursCount),
    pooled: pooled[index]!,
    judged: judgeSession(index),
  }));
  return { series, baseline, reference: cannotReplace ? earlier : baseline, sessions };
}

function joined(sessions: readonly Session[]): Session {
  const [first, ...more] = sessions.flat();
  return [first!, ...more];
}
