import { compareToBaseline, sameSyringe, type Volume } from "../delivery/compare-to-baseline.ts";
import type { FlagCode } from "../delivery/flags.ts";
import { judge, readsHigh, type Limits } from "../delivery/judge.ts";
import { ASSUMED_GRADUATION_ML } from "../delivery/measure-delivery.ts";
import { poolSession } from "../delivery/pool-session.ts";
import { runsToSettle } from "../delivery/runs-to-settle.ts";
import { usualSequences } from "../delivery/usual-sequences.ts";
import type { Action, Sequence } from "../schemas/entry.ts";
import type { Baseline, CheckSummary } from "../schemas/summary.ts";
import type { MeasuredCheck, Series, Session } from "./baseline-series.ts";

/** A first check further than this under the sequence's usual delivery may be of a tired pump. */
const BELOW_USUAL = 0.15;
/** Oil that much warmer or colder than at the baseline is pointed out, K. */
const TEMP_DIFFERENCE_K = 10;

type Judged = Pick<
  CheckSummary,
  "ratio" | "uRatio" | "baselineMl" | "verdict" | "action" | "pLow" | "pDropping" | "runsToSettle"
> & { flags: FlagCode[] };

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

const VERDICT_RANK = { settling: 0, holding: 1, dropping: 2, low: 3 } as const;
const ACTION_RANK: Record<Action, number> = { ride: 0, repeat: 1, stop: 2 };

/** The worse verdict stands, with the worse action of the two. */
function worse(a: Judged, b: Judged): Judged {
  // Settling is no better than holding: there is nothing yet to be better than.
  const rank = (judged: Judged) => Math.max(VERDICT_RANK.holding, VERDICT_RANK[judged.verdict]);
  const verdict = rank(b) > rank(a) ? b : a;
  const action = ACTION_RANK[b.action] > ACTION_RANK[a.action] ? b.action : a.action;
  return { ...verdict, action, flags: [...new Set([...a.flags, ...b.flags])] };
}

const isFaulty = ({ verdict }: Judged) => VERDICT_RANK[verdict] > VERDICT_RANK.holding;

export const volumeOf = (check: MeasuredCheck): Volume => ({
  perRunMl: check.delivery.perRunMl,
  uMl: check.delivery.uMl,
  uScaleMl: check.delivery.uScaleMl,
  syringeId: check.entry.body.syringe?.id ?? null,
});

const lastOf = (checks: Session) => checks[checks.length - 1] ?? checks[0];

function meanOilTempC(checks: Session): number | null {
  const temps = checks.flatMap((check) => check.entry.body.oilTempC ?? []);
  return temps.length > 0 ? temps.reduce((sum, temp) => sum + temp, 0) / temps.length : null;
}

/** The first session that delivered anything: nothing can be compared with nothing. */
const baselineIndex = (pooled: readonly Volume[]) => pooled.findIndex((one) => one.perRunMl > 0);

function poolSessions(sessions: readonly Session[]) {
  return sessions.map((session) => poolSession(session.map(volumeOf)));
}

/**
 * The baseline of a series: its first session that delivered anything, as a volume with its
 * uncertainty (mL a run at 15 °C). Edge: null until there is one.
 */
export function baselineOf({ sessions }: Pick<Series, "sessions">): Baseline | null {
  const pooled = poolSessions(sessions);
  const index = baselineIndex(pooled);
  const [session, volume] = [sessions[index], pooled[index]];
  if (!session || !volume) return null;
  const { disagrees: _, ...baseline } = volume;
  return { ...baseline, oilTempC: meanOilTempC(session), atHours: lastOf(session).atHours };
}

/** What the sequence usually delivers, mL; null where it is not one of the usual kinds. */
export function usualDeliveryMl(sequence: Sequence | null): number | null {
  if (!sequence) return null;
  const usual = usualSequences.find(
    (one) => one.seconds === sequence.seconds && one.rhythm === sequence.rhythm,
  );
  return sequence.nominalMl ?? usual?.nominalMl ?? null;
}

/** A session that becomes the baseline: nothing to compare with yet. */
function judgeFirst(session: Session, pooled: Volume): Judged {
  const usualMl = usualDeliveryMl(session[0].sequence);
  const belowUsual = usualMl !== null && pooled.perRunMl < (1 - BELOW_USUAL) * usualMl;
  return {
    ratio: null,
    uRatio: null,
    baselineMl: null,
    verdict: "settling",
    action: belowUsual ? "repeat" : "ride",
    pLow: null,
    pDropping: null,
    runsToSettle: null,
    flags: belowUsual ? ["below-usual"] : [],
  };
}

/** A pump that gives nothing is low whatever it gave before. */
const nothingDelivered = (): Judged => ({
  ratio: 0,
  uRatio: 0,
  baselineMl: null,
  verdict: "low",
  action: "stop",
  pLow: 1,
  pDropping: 1,
  runsToSettle: 0,
  flags: ["no-delivery"],
});

function judgeAgainst(
  baseline: Baseline,
  session: Session,
  pooled: Volume,
  limits: Limits,
): Judged {
  const { ratio, uRatio } = compareToBaseline(pooled, baseline);
  const { entry, delivery } = lastOf(session);
  const settle = runsToSettle({
    session: pooled,
    baseline,
    limits,
    capacityMl: entry.body.syringe?.capacityMl ?? pooled.perRunMl,
    graduationMl: entry.body.syringe?.graduationMl ?? ASSUMED_GRADUATION_ML,
    repeatability: delivery.repeatability,
    temperatureMl: delivery.components.temperatureMl,
  });
  const oilTempC = meanOilTempC(session);
  const flags: FlagCode[] = [];
  if (pooled.perRunMl === 0) flags.push("no-delivery");
  if (readsHigh(ratio, uRatio)) flags.push("reads-high");
  if (settle.baselineForbids) flags.push("baseline-cannot-settle");
  if (!sameSyringe(pooled, baseline)) flags.push("syringe-differs");
  if (
    oilTempC !== null &&
    baseline.oilTempC !== null &&
    Math.abs(oilTempC - baseline.oilTempC) > TEMP_DIFFERENCE_K
  )
    flags.push("temperature-differs");
  return {
    ...judge(ratio, uRatio, limits),
    ratio,
    uRatio,
    baselineMl: baseline.perRunMl,
    runsToSettle: settle.runs,
    flags,
  };
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
